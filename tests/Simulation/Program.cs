using System.Globalization;

namespace LoadWatch.Simulation;

/// <summary><c>simulation [--seed N] [--people N] [--days N] [--only healthy|episodes|courses|disturbances|clinic]</c> prints the tables of <c>tests/README.md</c>.</summary>
public static class Program
{
    private const int Members = 500;

    public static int Main(string[] args)
    {
        var report = new Report(Number(args, "--seed") ?? 1, Number(args, "--people") ?? 30, Number(args, "--days") ?? 100, Console.Out);
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

    private static int? Number(string[] args, string name) => Value(args, name) is { } text ? int.Parse(text, CultureInfo.InvariantCulture) : null;

    private static string? Value(string[] args, string name) => args.SkipWhile(word => word != name).Skip(1).FirstOrDefault();
}
