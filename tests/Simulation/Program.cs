using System.Globalization;

namespace LoadWatch.Simulation;

/// <summary><c>simulation [--seed N|N-M] [--people N] [--days N] [--quick] [--only healthy|episodes|courses|disturbances|clinic]</c> prints the tables of <c>tests/README.md</c>; of several seeds together, and with <c>--quick</c> of the built-in limits alone.</summary>
public static class Program
{
    private const int Members = 500;

    public static int Main(string[] args)
    {
        var report = new Report(Seeds(Value(args, "--seed") ?? "1"), Number(args, "--people") ?? 40, Number(args, "--days") ?? 84, args.Contains("--quick"), Console.Out);
        var tables = new (string Name, Action Print)[]
        {
            ("healthy", report.Healthy), ("episodes", report.Episodes), ("courses", report.Courses), ("disturbances", report.Disturbances), ("clinic", () => report.Clinic(Members)),
        };
        foreach (var (name, print) in tables.Where(table => Value(args, "--only") is not { } only || only == table.Name))
        {
            print();
            Console.WriteLine();
        }

        return 0;
    }

    private static IReadOnlyList<int> Seeds(string text)
    {
        var ends = text.Split('-').Select(end => int.Parse(end, CultureInfo.InvariantCulture)).ToList();
        return [.. Enumerable.Range(ends[0], ends[^1] - ends[0] + 1)];
    }

    private static int? Number(string[] args, string name) => Value(args, name) is { } text ? int.Parse(text, CultureInfo.InvariantCulture) : null;

    private static string? Value(string[] args, string name) => args.SkipWhile(word => word != name).Skip(1).FirstOrDefault();
}
