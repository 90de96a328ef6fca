using System.CommandLine;
using LoadWatch.Decoding;
using LoadWatch.Decoding.Csv.Drafts;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Export;
using LoadWatch.Storage.Files;

namespace LoadWatch.Service.Commands;

/// <summary><c>loadwatch layout</c>: drafts a layout for a CSV, for a person to finish; nothing is taken in or written.</summary>
public static class LayoutCommand
{
    public static Command Create()
    {
        var file = new Argument<string>("file") { Description = "A CSV file." };
        var name = new Option<string?>("--name") { Description = "What to call the layout; else as the file.", HelpName = "NAME" };
        var json = CommonOptions.Json();
        var command = new Command("layout", "Look at a CSV and draft a layout for it, with what was found and what is unsure.") { file, name, json };
        command.SetAction(parsed => Run(parsed.GetValue(file)!, parsed.GetValue(name), parsed.GetValue(json)));
        return command;
    }

    private static int Run(string path, string? name, bool json)
    {
        if (Trouble(path) is var (code, trouble))
        {
            Console.Error.WriteLine($"{OneLine.Of(path)}: {trouble}");
            return code;
        }

        var draft = LayoutDrafting.Of(() => SafeFile.Reopen(path), name ?? Path.GetFileNameWithoutExtension(path));
        if (draft.Problem is { } problem)
        {
            Console.Error.WriteLine($"{OneLine.Of(path)}: {OneLine.Of(problem.ToString())}");
            return ExitCode.Data;
        }

        Console.Out.Write(json ? $"{Words.Line(new { Layout = LayoutText.Of(draft.Layout!), draft.Found, Unsure = draft.Doubts })}\n" : Text(OneLine.Of(path), draft));
        return ExitCode.Ok;
    }

    /// <summary>Why there is no CSV to look at, with its exit code; or null.</summary>
    private static (int Code, string Reason)? Trouble(string path)
    {
        if (SafeFile.Open(path) is not OpenedFile opened)
        {
            return (ExitCode.InputOutput, "it cannot be opened, or is no file");
        }

        using (opened)
        {
            var head = new byte[DecoderSet.HeadLength];
            return DecoderSet.Recognise(head.AsSpan(0, opened.Stream.ReadAtLeast(head, head.Length, throwOnEndOfStream: false))) switch
            {
                ContentKind.Text => null,
                ContentKind.Gzip or ContentKind.Zip => (ExitCode.Data, "packed: unpack it first"),
                ContentKind.Fit => (ExitCode.Data, "a FIT file: it needs no layout"),
                _ => (ExitCode.Data, "no text, or empty"),
            };
        }
    }

    /// <summary>JSON with comments, as the configuration takes it.</summary>
    private static string Text(string path, LayoutDraft draft) =>
        $"""
        // A draft, made from {path}. It goes into "layouts" of loadwatch.json once what is unsure is settled.
        // Found:
        {string.Concat(draft.Found.Select(found => $"//   {OneLine.Of(found)}\n"))}// Unsure{(draft.Doubts.Count == 0 ? ": nothing." : $" (a \"{LayoutDraft.Open}\" is to be filled in, the rest to be looked at):")}
        {string.Concat(draft.Doubts.Select((doubt, index) => $"//   {index + 1}. {OneLine.Of(doubt)}\n"))}// Then try it: loadwatch inspect --config loadwatch.json {path}
        {Words.Lines(LayoutText.Of(draft.Layout!))}

        """.ReplaceLineEndings("\n");
}
