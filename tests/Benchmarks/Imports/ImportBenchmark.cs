using System.CommandLine;
using System.Globalization;
using NodaTime;

namespace LoadWatch.Benchmarks.Imports;

/// <summary>
/// A large import against the least it has to do, the rebuild, one new file after one and after ten years, and a sweep with nothing new: figures of one run,
/// beside what they should be.
/// </summary>
internal static class ImportBenchmark
{
    public const string Name = "import";

    private const int KnownPeople = 40;
    private static readonly LocalDate LastDate = new(2026, 5, 31);

    public static int Run(string[] args)
    {
        var files = new Option<int>("--files") { DefaultValueFactory = _ => 10_000, Description = "Recordings to import." };
        var known = new Option<int>("--known") { DefaultValueFactory = _ => 1_000_000, Description = "Files that are known already." };
        var folder = new Option<string>("--folder")
        {
            DefaultValueFactory = _ => Path.Combine(Path.GetTempPath(), "loadwatch-import"), Description = "Where the files are made and kept; three times their size is needed.",
        };
        var only = new Option<string[]>("--only") { AllowMultipleArgumentsPerToken = true, Description = "Some of: import, rebuild, one, known." };
        var part = new Option<string?>("--part") { Hidden = true };
        var root = new RootCommand("What a large import takes.") { files, known, folder, only, part };
        root.SetAction(parsed =>
        {
            var run = new ImportRun(Path.GetFullPath(parsed.GetValue(folder)!), parsed.GetValue(files), parsed.GetValue(known));
            return parsed.GetValue(part) is { } one ? RunPart(run, one) : run.Run(parsed.GetValue(only) is { Length: > 0 } some ? some : ["import", "rebuild", "one", "known"]);
        });
        return root.Parse(args).Invoke();
    }

    public static Squad Large(string folder, int files) => new(Path.Combine(folder, "large"), 40, files, 3, LastDate, 52);

    /// <summary>Two people with four short recordings a week.</summary>
    public static Squad Long(string folder, int years) =>
        new(Path.Combine(folder, string.Create(CultureInfo.InvariantCulture, $"{years} years")), 2, 2 * 200 * years, years, LastDate, 15);

    public static Squad Known(string folder) => new(Path.Combine(folder, "known"), KnownPeople, 0, 1, LastDate, 52);

    private static int RunPart(ImportRun run, string part) => part switch
    {
        "known" => NothingNew.Run(Known(run.Folder)),
        "one-1" => OneNewFile.Run(Long(run.Folder, 1)),
        "one-10" => OneNewFile.Run(Long(run.Folder, 10)),
        _ => throw new ArgumentException($"no part {part}", nameof(part)),
    };
}
