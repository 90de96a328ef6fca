using System.IO.Compression;
using System.Text;
using LoadWatch.Decoding.Csv;
using LoadWatch.Decoding.Fit;
using LoadWatch.Recordings;
using LoadWatch.Service.Demo;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>Small files for inboxes: two minutes of training, different by their start.</summary>
internal static class Some
{
    public const int Seconds = 120;

    public static readonly LocalDate Yesterday = new(2026, 6, 14);

    private static readonly DateTimeOffset Written = new(2026, 6, 14, 20, 0, 0, TimeSpan.Zero);

    private static readonly LocalTime Noon = new(12, 0);

    /// <summary>Two minutes on a bicycle at noon, heart rate and power rising.</summary>
    public static FitActivity Ride(LocalDate date, int minutesAfterNoon = 0, int heartRate = 140, int product = 1)
    {
        var start = (date + Noon).InUtc().ToInstant() + Duration.FromMinutes(minutesAfterNoon);
        return new FitActivity
        {
            Start = start,
            Sport = new Sport("cycling"),
            Device = new Device(FitActivity.Development, product, 4711),
            Samples = [.. Enumerable.Range(0, Seconds + 1).Select(second => new FitSample(
                start + Duration.FromSeconds(second),
                HeartRate: heartRate + (second / 10),
                Power: 180 + second,
                Distance: 8.0 * second))],
        };
    }

    public static byte[] Fit(LocalDate date, int minutesAfterNoon = 0, int heartRate = 140, int product = 1) =>
        FitEncoder.Encode(Ride(date, minutesAfterNoon, heartRate, product));

    /// <summary>The same as a CSV of samples, which carries no device.</summary>
    public static byte[] Csv(LocalDate date, int minutesAfterNoon = 0, int heartRate = 140) =>
        CsvSamplesWriter.Write(DemoRecording.Of(Ride(date, minutesAfterNoon, heartRate)));

    public static byte[] Gzip(byte[] bytes)
    {
        using var packed = new MemoryStream();
        using (var gzip = new GZipStream(packed, CompressionLevel.Fastest))
        {
            gzip.Write(bytes);
        }

        return packed.ToArray();
    }

    public static byte[] Zip(params (string Name, byte[] Bytes)[] members)
    {
        using var packed = new MemoryStream();
        using (var zip = new ZipArchive(packed, ZipArchiveMode.Create, leaveOpen: true))
        {
            foreach (var (name, bytes) in members)
            {
                var entry = zip.CreateEntry(name);
                entry.LastWriteTime = Written;
                using var stream = entry.Open();
                stream.Write(bytes);
            }
        }

        return packed.ToArray();
    }

    public static byte[] Text(string text) => Encoding.UTF8.GetBytes(text);

    /// <summary>
    /// A fortnight of three people with all ways in: plain, packed, twice, of nobody, cut; one of them has been silent for four days by <see cref="Yesterday"/>, which raises an alert.
    /// </summary>
    public static IReadOnlyList<(string Path, byte[] Bytes)> Fortnight()
    {
        var days = Enumerable.Range(0, 16).Select(day => Yesterday.PlusDays(day - 15)).ToList();
        var files = new List<(string, byte[])>();
        files.AddRange(days.Skip(4).Take(8).Select(date => ($"anna/{date:MMdd}.fit", Fit(date, heartRate: 150))));
        files.AddRange(days.Where(date => date.Day % 3 == 0).Select(date => ($"bo/{date:MMdd}.fit.gz", Gzip(Fit(date, 10)))));
        files.AddRange(days.Where(date => date.Day % 4 == 0).Select(date => ($"cara/{date:MMdd}.csv", Csv(date, 20, 110))));
        return [.. files, .. LastNight()];
    }

    /// <summary>The part of the fortnight that has everything but plain files.</summary>
    public static IReadOnlyList<(string Path, byte[] Bytes)> LastNight()
    {
        var (early, late) = (Yesterday.PlusDays(-13), Yesterday.PlusDays(-9));
        return
        [
            ("bo/week.zip", Zip(("one.fit", Fit(early, 30)), ("two.csv", Csv(Yesterday.PlusDays(-12), 30)), ("three.fit.gz", Gzip(Fit(late, 30))))),
            ("bo/again.fit", Fit(early, 30)),
            ("bo/other device.fit", Fit(late, 30, product: 2)),
            ("nobody.fit", Fit(Yesterday.PlusDays(-10), 40)),
            ("anna/cut.fit", Fit(Yesterday.PlusDays(-11), 50)[..^9]),
            ("anna/notes.txt", Text("felt fine\n")),
        ];
    }
}
