using System.Globalization;
using System.IO.Compression;
using System.Text;
using LoadWatch.Decoding.Fit;
using LoadWatch.Recordings;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Chaos.Inputs;

/// <summary>Sessions as files.</summary>
public static class Files
{
    private const double MetresPerSecond = 7;

    private static readonly DateTimeOffset Packed = new(2026, 6, 1, 0, 0, 0, TimeSpan.Zero);

    /// <param name="product">Tells devices apart.</param>
    public static byte[] Fit(TrueSession session, int product = 1)
    {
        ArgumentNullException.ThrowIfNull(session);
        return FitEncoder.Encode(new FitActivity
        {
            Start = session.Start,
            LocalOffset = session.Zone.GetUtcOffset(session.Start),
            Sport = new Sport("cycling"),
            Device = new Device(FitActivity.Development, product, 4700 + product),
            Samples = [.. session.HeartRates.Select((bpm, second) => new FitSample(
                session.Start + Duration.FromSeconds(second), HeartRate: bpm, Power: 2 * bpm, Distance: MetresPerSecond * second))],
        });
    }

    /// <summary>The built-in layout of samples; text of our own, so that a fault of the product's writer would show.</summary>
    public static byte[] Csv(TrueSession session)
    {
        ArgumentNullException.ThrowIfNull(session);
        var text = new StringBuilder("time,sport,heart_rate_bpm\n");
        foreach (var (bpm, second) in session.HeartRates.Select((bpm, second) => (bpm, second)))
        {
            var time = (session.Start + Duration.FromSeconds(second)).WithOffset(session.Zone.GetUtcOffset(session.Start));
            text.Append(OffsetDateTimePattern.Rfc3339.Format(time)).Append(CultureInfo.InvariantCulture, $",cycling,{bpm}\n");
        }

        return Text(text.ToString());
    }

    public static byte[] Gzip(byte[] bytes)
    {
        ArgumentNullException.ThrowIfNull(bytes);
        using var packed = new MemoryStream();
        using (var gzip = new GZipStream(packed, CompressionLevel.Fastest))
        {
            gzip.Write(bytes);
        }

        return packed.ToArray();
    }

    public static byte[] Zip(params IEnumerable<(string Name, byte[] Bytes)> members)
    {
        ArgumentNullException.ThrowIfNull(members);
        using var packed = new MemoryStream();
        using (var zip = new ZipArchive(packed, ZipArchiveMode.Create, leaveOpen: true))
        {
            foreach (var (name, bytes) in members)
            {
                var entry = zip.CreateEntry(name);
                entry.LastWriteTime = Packed;
                using var stream = entry.Open();
                stream.Write(bytes);
            }
        }

        return packed.ToArray();
    }

    public static byte[] Text(string text) => Encoding.UTF8.GetBytes(text);
}
