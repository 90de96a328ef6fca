using System.CommandLine;
using System.Security.Cryptography;
using System.Text;
using LoadWatch.Decoding;
using LoadWatch.Decoding.Containers;
using LoadWatch.Decoding.Csv;
using LoadWatch.Recordings;
using LoadWatch.Service.Arrivals;
using LoadWatch.Service.Configuration;
using LoadWatch.Rows;
using LoadWatch.Service.Export;
using LoadWatch.Storage.Files;

namespace LoadWatch.Service.Commands;

/// <summary><c>loadwatch inspect</c>: what is in files; nothing is taken in.</summary>
public static class InspectCommand
{
    // Without a configuration: the most that one can set.
    private const long LargestFileBytes = 512L * 1024 * 1024;

    public static Command Create()
    {
        var files = new Argument<string[]>("files") { Description = "FIT or CSV files, also in gzip or zip.", Arity = ArgumentArity.ZeroOrMore };
        var list = new Option<string?>("--from-list") { Description = "Read the file names from a file, one a line; - is standard input.", HelpName = "LIST" };
        var json = CommonOptions.Json();
        var config = new Option<string?>("--config", "-c") { Description = "Take CSV layouts from this configuration.", HelpName = "FILE" };
        var command = new Command("inspect", "Say what is in files as a sweep would decode them; nothing is taken in, nothing is cut, and no owner is asked for.") { files, list, json, config };
        command.Validators.Add(parsed =>
        {
            if (parsed.GetValue(files) is not { Length: > 0 } && parsed.GetValue(list) is null)
            {
                parsed.AddError("Name a file, or a list of files with --from-list.");
            }
        });
        command.SetAction(parsed => Run(
            Names(parsed.GetValue(files) ?? [], parsed.GetValue(list)), parsed.GetValue(json), parsed.GetValue(config)));
        return command;
    }

    private static IEnumerable<string> Names(string[] files, string? list) => list switch
    {
        null => files,
        "-" => files.Concat(Lines(Console.In)),
        _ => files.Concat(File.ReadLines(list).Where(line => line.Length > 0)),
    };

    private static IEnumerable<string> Lines(TextReader reader)
    {
        while (reader.ReadLine() is { } line)
        {
            if (line.Length > 0)
            {
                yield return line;
            }
        }
    }

    private static int Run(IEnumerable<string> names, bool json, string? configPath)
    {
        var configuration = configPath is null ? null : ConfigurationReader.Read(configPath);
        var largest = configuration?.LargestFileBytes ?? LargestFileBytes;
        var decoders = new DecoderSet(configuration?.Layouts ?? Decoding.Csv.BuiltInLayouts.All, ContainerLimits.For(largest));
        var reading = new Reading(decoders, largest, configuration?.LargestCsvBytes, configuration?.Inboxes.Any(inbox => inbox.Salvage) ?? false);
        var lines = names.AsParallel().AsOrdered().SelectMany(name => Inspect(reading, name)).AsSequential();
        using var output = new StreamWriter(Console.OpenStandardOutput(), new UTF8Encoding(false), 1 << 16);
        if (json)
        {
            WriteJson(output, lines);
        }
        else
        {
            foreach (var line in lines)
            {
                WriteText(output, line);
            }
        }

        return ExitCode.Ok;
    }

    private static IEnumerable<InspectLine> Inspect(Reading reading, string name)
    {
        switch (SafeFile.Open(name))
        {
            case OpenedFile opened:
                return Inspect(reading, name, opened);
            case UnopenedFile unopened:
                return [InspectLine.Unreadable(name, unopened.Reason)];
            default:
                throw new InvalidOperationException("a file is opened or not");
        }
    }

    private static IEnumerable<InspectLine> Inspect(Reading reading, string name, OpenedFile opened)
    {
        using (opened)
        {
            if (opened.Stamp.Size > LargeText.HeldBytes && LargeText.KindOf(opened.Stream) == ContentKind.Text)
            {
                return opened.Stamp.Size <= reading.TakenTextBytes ? AsTakenIn(reading.Decoders, name) : Through(reading.Decoders, name);
            }

            if (opened.Stamp.Size > reading.LargestFileBytes)
            {
                return [InspectLine.Unreadable(name, $"larger than {reading.LargestFileBytes / (1024 * 1024)} MB")];
            }

            if (ReadAll(opened) is not { } bytes)
            {
                return [InspectLine.Unreadable(name, "it could not be read to its end")];
            }

            var sha = Convert.ToHexStringLower(SHA256.HashData(bytes));
            return ArrivalContent.Expand(reading.Decoders, sha, name, bytes).SelectMany(content => Of(reading, content)).ToList();
        }
    }

    /// <summary>A large CSV that a sweep would take in, read like there.</summary>
    private static IEnumerable<InspectLine> AsTakenIn(DecoderSet decoders, string name)
    {
        try
        {
            return Of(name, decoders.OpenText(() => SafeFile.Reopen(name)));
        }
        catch (IOException)
        {
            return [InspectLine.Unreadable(name, "it could not be read to its end")];
        }
    }

    /// <summary>A large CSV, of which no more is held than the sessions under way.</summary>
    private static IEnumerable<InspectLine> Through(DecoderSet decoders, string name)
    {
        var unknown = new DecodedFile("csv", FileType: null, SourceName: null, [], []);
        var lines = new List<InspectLine>();
        try
        {
            var (file, isRefused) = decoders.ReadText(() => SafeFile.Reopen(name), recording => lines.Add(InspectLine.Of(name, unknown, recording)));
            var problems = file.Problems.Select(ProblemLine.Of).ToList();
            return isRefused || lines.Count == 0
                ? [InspectLine.WithoutRecording(name, file.Kind, file.Problems) with { Table = TableText(file.Table) }]
                : lines.ConvertAll(line => line with { Problems = problems });
        }
        catch (IOException)
        {
            return [InspectLine.Unreadable(name, "it could not be read to its end")];
        }
    }

    private static byte[]? ReadAll(OpenedFile opened)
    {
        try
        {
            var bytes = new byte[opened.Stamp.Size];
            opened.Stream.ReadExactly(bytes);
            return bytes;
        }
        catch (IOException)
        {
            return null;
        }
    }

    private static IEnumerable<InspectLine> Of(Reading reading, ArrivalContent content)
    {
        if (content.Kind is ContentKind.Gzip or ContentKind.Zip)
        {
            return content.Problems.Count > 0 || content.Members == 0
                ? [InspectLine.WithoutRecording(content.Path, Words.Of(content.Kind), content.Problems)]
                : [];
        }

        return content.Kind == ContentKind.Text
            ? Of(content.Path, reading.Decoders.OpenText(content.Bytes))
            : Of(content.Path, reading.Decoders.Decode(content.Bytes, reading.Salvages));
    }

    private static IEnumerable<InspectLine> Of(string path, TextContent text) => text.IsLong
        ? text.Recordings().Select(recording => InspectLine.Of(path, text.File, recording)).ToList()
        : Of(path, text.File);

    private static IEnumerable<InspectLine> Of(string path, DecodedFile file) => file.Recordings.Count == 0
        ? [InspectLine.WithoutRecording(path, file.Kind, file.Problems) with { Table = TableText(file.Table) }]
        : file.Recordings.Select((recording, i) => InspectLine.Of(path, file, recording) with { Table = i == 0 ? TableText(file.Table) : null }).ToList();

    /// <summary><c>table of sets by layout gym: 120 rows of 12 people, 2026-03-01 to 2026-03-31</c>.</summary>
    private static string? TableText(DecodedTable? table)
    {
        if (table is null)
        {
            return null;
        }

        var people = table.Rows.Select(row => row.Subject).Distinct(StringComparer.OrdinalIgnoreCase).Count(subject => subject is not null);
        var dates = table.Rows.Count == 0 ? "" : $", {Words.Date(table.Rows.Min(row => row.Date))} to {Words.Date(table.Rows.Max(row => row.Date))}";
        return $"table of {Words.Of(table.Kind)} by layout {OneLine.Of(table.Layout)}: {table.Rows.Count} rows, people or groups named: {people}{dates}";
    }

    private static void WriteJson(StreamWriter output, IEnumerable<InspectLine> lines)
    {
        output.Write('[');
        var separator = "\n";
        foreach (var line in lines)
        {
            output.Write(separator);
            output.Write(Words.Line(line));
            separator = ",\n";
        }

        output.Write("\n]\n");
    }

    private static void WriteText(StreamWriter output, InspectLine line)
    {
        output.Write(line.Part is { } part
            ? FormattableString.Invariant($"{OneLine.Of(line.File)}  part {part}  {OneLine.Of(line.Sport ?? "")}  {line.FirstSample ?? "no date"}  {line.Samples} samples\n")
            : $"{OneLine.Of(line.File)}  {line.Table ?? $"{line.Kind}: no recording"}\n");
        if (line is { Part: not null, Table: { } beside })
        {
            output.Write($"    beside it a {beside}\n");
        }

        foreach (var (channel, numbers) in line.Channels)
        {
            output.Write(FormattableString.Invariant($"    {channel,-10} {numbers.N,7} readings, mean {numbers.Mean:0.##}, highest {numbers.Max:0.##}\n"));
        }

        if (line.Shadowed is { } shadowed)
        {
            WriteText(output, shadowed);
        }

        foreach (var problem in line.Problems)
        {
            output.Write($"    {problem.Severity}: {OneLine.Of(problem.Text)}\n");
        }
    }

    /// <summary>What does not count, since the device states the same itself.</summary>
    private static void WriteText(StreamWriter output, ShadowedLine shadowed)
    {
        foreach (var (channel, numbers) in shadowed.Channels)
        {
            output.Write(FormattableString.Invariant($"    {channel,-10} {numbers.N,7} readings by an app beside the device's own, not used: mean {numbers.Mean:0.##}, highest {numbers.Max:0.##}\n"));
        }

        (string Word, double? Value, string Unit)[] totals = [("elapsed", shadowed.ElapsedS, "s"), ("timer", shadowed.TimerS, "s"), ("distance", shadowed.DistanceM, "m")];
        foreach (var (word, value, unit) in totals.Where(total => total.Value is not null))
        {
            output.Write(FormattableString.Invariant($"    {word,-10} {value:0.##} {unit} by an app beside the device's own, not used\n"));
        }
    }

    /// <param name="LargestFileBytes">Larger ones are not read, but for text.</param>
    /// <param name="TakenTextBytes">Large text of no more bytes is read like a sweep does, other large text through in flat memory; null: all of it.</param>
    /// <param name="Salvages">Whether what lies before the end of a cut FIT file is used.</param>
    private sealed record Reading(DecoderSet Decoders, long LargestFileBytes, long? TakenTextBytes, bool Salvages);
}
