using System.Globalization;

namespace LoadWatch.Benchmarks.Imports;

/// <summary>Makes the files, measures, and prints a table as it stands in the README.</summary>
internal sealed class ImportRun(string folder, int files, int known)
{
    private const int FloorRuns = 3;

    /// <summary>What <c>LOADWATCH_PUBLISHED</c> names, which is compiled ahead as it is shipped, else what was built beside this.</summary>
    private static readonly string[] Loadwatch = Environment.GetEnvironmentVariable("LOADWATCH_PUBLISHED") is { Length: > 0 } published
        ? [Path.GetFullPath(published)]
        : ["dotnet", Path.Combine(AppContext.BaseDirectory, "loadwatch.dll")];

    private static readonly string[] Self = ["dotnet", Path.Combine(AppContext.BaseDirectory, "Benchmarks.dll"), ImportBenchmark.Name, "--part"];

    public string Folder => folder;

    public int Run(IReadOnlyList<string> parts)
    {
        Console.Out.WriteLine("| what | measured | should be |");
        Console.Out.WriteLine("| --- | --- | --- |");
        if (parts.Contains("import", StringComparer.Ordinal))
        {
            Import();
        }

        if (parts.Contains("rebuild", StringComparer.Ordinal))
        {
            Rebuild();
        }

        if (parts.Contains("one", StringComparer.Ordinal))
        {
            OneFile(1);
            OneFile(10);
        }

        if (parts.Contains("known", StringComparer.Ordinal))
        {
            Known();
        }

        return 0;
    }

    private static void Line(string what, string measured, string wanted = "") => Console.Out.WriteLine($"| {what} | {measured} | {wanted} |");

    private static string Text(FormattableString text) => FormattableString.Invariant(text);

    private void Import()
    {
        var squad = ImportBenchmark.Large(folder, files);
        squad.Make();
        squad.ForgetImport();
        var paths = squad.Recordings();
        var (floor, megabytes, records) = FloorOf(paths);
        Line("files", Text($"{paths.Count}, {megabytes:0} MB, {records / 1e6:0.0} million records"));
        Line("floor on one core", Rate(floor, paths.Count, megabytes));
        var import = Sweep(squad);
        Line("import from an empty store", Rate(import, paths.Count, megabytes));
        Line("its rate to the floor's", Text($"{floor.Seconds / import.Seconds:0.000}"), "at least 0.30");
        Line("the same by processor time, both of two cores busy", Text($"{2 * floor.CpuSeconds / import.CpuSeconds:0.000}"));
        Line("its peak resident memory", Text($"{import.PeakMegabytes:0} MB"), "under 400 MB");
        File.WriteAllText(Path.Combine(squad.Root, "import.txt"), Text($"{import.Seconds} {import.CpuSeconds}"));
    }

    /// <summary>The first run brings the files into the page cache and the code to speed; the best of the others counts.</summary>
    private static (Cost Cost, double Megabytes, long Records) FloorOf(IReadOnlyList<string> paths)
    {
        var runs = Enumerable.Range(0, FloorRuns).Select(_ =>
        {
            var floor = new Floor();
            return (Cost: Cost.Of(() => floor.Read(paths)), Megabytes: floor.Bytes / 1e6, floor.Records);
        }).ToList();
        return runs.Skip(1).MinBy(run => run.Cost.Seconds);
    }

    private void Rebuild()
    {
        var squad = ImportBenchmark.Large(folder, files);
        var import = Numbers(File.ReadAllText(Path.Combine(squad.Root, "import.txt")));
        var (rebuild, _) = Cost.OfProcess([.. Loadwatch, "rebuild", "--config", squad.ConfigPath]);
        Line("rebuild", Text($"{rebuild.Seconds:0.0} s, {rebuild.CpuSeconds:0.0} s of processor, {rebuild.PeakMegabytes:0} MB"));
        Line("its time to the import's", Text($"{rebuild.Seconds / import[0]:0.00} (processor {rebuild.CpuSeconds / import[1]:0.00})"), "at most 1");
    }

    private static Cost Sweep(Squad squad) => Cost.OfProcess([.. Loadwatch, "sweep", "--config", squad.ConfigPath, "--as-of", MorningOf(squad)]).Cost;

    private static string MorningOf(Squad squad) => NodaTime.Text.InstantPattern.General.Format(squad.Morning);

    private static string Rate(Cost cost, int count, double megabytes) => Text(
        $"{cost.Seconds:0.0} s, {cost.CpuSeconds:0.0} s of processor, {count / cost.Seconds:0} files/s, {megabytes / cost.Seconds:0} MB/s");

    private void OneFile(int years)
    {
        var squad = ImportBenchmark.Long(folder, years);
        Fresh(squad);
        string[] part = [.. Self, Text($"one-{years}"), "--folder", folder];
        var mornings = Lines(Cost.OfProcess(part).Output);
        var cpu = Median(mornings.Select(morning => morning[0])) - Median(mornings.Select(morning => morning[1]));
        var after = years == 1 ? "after 1 year" : Text($"after {years} years");
        Line($"one new file {after}, processor", Text($"{cpu:0.0} ms beyond {Median(mornings.Select(morning => morning[1])):0.0} ms of an empty sweep"), "at most 30 ms");
        Line($"one new file {after}, rows read", Text($"{Median(mornings.Select(morning => morning[2] - morning[3])):0} beyond {Median(mornings.Select(morning => morning[3])):0}"), "at most 1000");
        Fresh(squad);
        Line($"one new file {after}, syncs", Syncs(squad, part), "at most 6");
    }

    private static void Fresh(Squad squad)
    {
        squad.Make();
        foreach (var added in squad.Recordings().Where(path => path.EndsWith("added.fit", StringComparison.Ordinal)))
        {
            File.Delete(added);
        }

        squad.ForgetImport();
        Sweep(squad);
    }

    /// <summary>The syncs between the marks that <see cref="OneNewFile"/> sets, by strace.</summary>
    private static string Syncs(Squad squad, string[] part)
    {
        if (!File.Exists("/usr/bin/strace"))
        {
            return "no strace here";
        }

        var trace = Path.Combine(squad.Root, "trace.txt");
        Cost.OfProcess(["strace", "-f", "-qq", "-o", trace, "-e", "trace=fsync,fdatasync,msync,syncfs,?lstat,?newfstatat", .. part]);
        var counts = new List<double>();
        var isInside = false;
        foreach (var line in File.ReadLines(trace))
        {
            if (line.Contains(OneNewFile.Begin, StringComparison.Ordinal))
            {
                isInside = true;
                counts.Add(0);
            }
            else if (line.Contains(OneNewFile.End, StringComparison.Ordinal))
            {
                isInside = false;
            }
            else if (isInside && line.Contains("sync(", StringComparison.Ordinal))
            {
                counts[^1]++;
            }
        }

        return Text($"{Median(counts):0}, at most {counts.Max():0}");
    }

    private void Known()
    {
        var squad = ImportBenchmark.Known(folder);
        KnownFiles.Make(squad, known);
        var sweep = Sweep(squad);
        Line(Text($"sweep with nothing new over {known} known files, a process of its own"), Text($"{sweep.Seconds:0.0} s, {sweep.CpuSeconds:0.0} s of processor, {sweep.PeakMegabytes:0} MB"), "under 10 s");
        var again = Lines(Cost.OfProcess([.. Self, "known", "--folder", folder]).Output);
        Line("the same again in one process", Text($"{again.Skip(1).Min(run => run[0]):0.0} s, {again.Skip(1).Min(run => run[1]):0.0} s of processor, {again[^1][2]:0} MB"), "under 10 s");
    }

    private static List<double[]> Lines(string output) => [.. output.Split('\n', StringSplitOptions.RemoveEmptyEntries).Select(Numbers)];

    private static double[] Numbers(string line) => [.. line.Split(' ').Select(word => double.Parse(word, CultureInfo.InvariantCulture))];

    private static double Median(IEnumerable<double> values)
    {
        var sorted = values.Order().ToList();
        return sorted.Count == 0 ? double.NaN : (sorted[(sorted.Count - 1) / 2] + sorted[sorted.Count / 2]) / 2;
    }
}
