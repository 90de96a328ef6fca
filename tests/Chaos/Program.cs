using LoadWatch.Chaos.Processes;
using LoadWatch.Chaos.Scenarios;

namespace LoadWatch.Chaos;

/// <summary>
/// <c>chaos list</c>, <c>chaos run ID…</c>, <c>chaos all</c>, <c>chaos kills N</c>; with <c>--seed S</c>, <c>--long</c>, and <c>--binary FILE</c> for an executable
/// that was published before. Ends with 0 when every promise held.
/// </summary>
public static class Program
{
    private const int DefaultSeed = 20260615;

    public static int Main(string[] args)
    {
        var words = new Words(args);
        try
        {
            return words.Next() switch
            {
                "list" => List(),
                "all" => Run(Catalogue.All, words),
                "run" => Run([.. words.Rest().Select(Catalogue.Find)], words),
                "kills" => Run([RandomKills.Of(int.Parse(words.Next() ?? "200", System.Globalization.CultureInfo.InvariantCulture))], words),
                _ => Usage(),
            };
        }
        catch (Exception e) when (e is ArgumentException or FormatException or ChaosFailureException or FileNotFoundException)
        {
            Console.Error.WriteLine(e.Message);
            return 64;
        }
    }

    private static int List()
    {
        foreach (var scenario in Catalogue.All)
        {
            Console.WriteLine($"{scenario.Id,-24} {scenario.Faults,-10} {scenario.Sentence}{(scenario.Lacks is { } lacks ? $" [{lacks}]" : "")}");
        }

        Console.WriteLine();
        Console.WriteLine("| fault | what | scenarios | tests in process | left out |");
        Console.WriteLine("| --- | --- | --- | --- | --- |");
        foreach (var fault in Faults.All)
        {
            Console.WriteLine(fault.Row());
        }

        return 0;
    }

    private static int Run(IReadOnlyList<Scenario> scenarios, Words words)
    {
        var (seed, isLong) = (words.Number("--seed") ?? DefaultSeed, words.Has("--long"));
        using var published = new Published(words.Value("--binary"));
        var results = new List<Result>();
        foreach (var scenario in scenarios)
        {
            var result = Result.Of(scenario, published.Binary, seed, isLong);
            results.Add(result);
            Console.Error.WriteLine(result.Row());
            if (result.Failure is { } failure)
            {
                Console.Error.WriteLine(failure);
            }
        }

        Console.WriteLine("| scenario | faults | disturbed | bound 3/n | counted | took | outcome |");
        Console.WriteLine("| --- | --- | --- | --- | --- | --- | --- |");
        results.ForEach(result => Console.WriteLine(result.Row()));
        return results.Exists(result => result.Failure is not null) ? 1 : 0;
    }

    private static int Usage()
    {
        Console.Error.WriteLine("chaos list | run ID... | all | kills N   [--seed S] [--long] [--binary FILE]");
        return 64;
    }
}
