using System.Diagnostics;
using System.Globalization;
using System.Security.Cryptography;
using LoadWatch.Decoding.Tests.Limits;

namespace LoadWatch.Benchmarks;

/// <summary>How long the worst files take for their size, beside hashing the same bytes. Fails above the two seconds a megabyte that any file may take.</summary>
internal static class WorstFiles
{
    public const string Name = "worst";

    private const double SecondsAtMost = 2;
    private const int Rounds = 3;

    public static int Run()
    {
        var slowest = 0.0;
        foreach (var (name, make) in WorstInputs.All.Concat(WorstFits.All.Select(worst => ($"FIT: {worst.Name}", (Func<byte[]>)(() => worst.Make(WorstInputs.Bytes, WorstFits.Full))))))
        {
            var bytes = make();
            var megabytes = bytes.Length / 1048576.0;
            var seconds = Least(() => WorstInputs.Read(bytes));
            var hashing = Least(() => SHA256.HashData(bytes));
            slowest = Math.Max(slowest, seconds / megabytes);
            Console.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{name,-40} {megabytes,6:0.0} MB {1000 * seconds / megabytes,8:0.0} ms a MB {seconds / hashing,7:0} x hashing"));
        }

        return slowest <= SecondsAtMost ? 0 : 1;
    }

    private static double Least(Action action) => Enumerable.Range(0, Rounds).Min(_ =>
    {
        var start = Stopwatch.GetTimestamp();
        action();
        return Stopwatch.GetElapsedTime(start).TotalSeconds;
    });
}
