using System.Text.Json;
using LoadWatch.Decoding.Fit;
using LoadWatch.Service.Tests.Pipeline;
using NodaTime.Text;

namespace LoadWatch.Service.Tests.Commands;

/// <summary>What <c>inspect --json</c> says of recordings of real devices, against an independent decoder (fitdecode, MIT).</summary>
public sealed class RealInspectTests
{
    private static readonly Lazy<ILookup<string, JsonElement>> Inspected = new(InspectAll);

    public static TheoryData<string> References => RealFiles.Names(file => file.IsReference);

    [Theory]
    [MemberData(nameof(References))]
    public void TimesAndCountsAgreeWithAnIndependentDecoder(string name)
    {
        var expected = RealFiles.Get(name);
        var lines = Inspected.Value[name].ToList();
        Assert.Equal(expected.Int("records"), lines.Sum(line => line.GetProperty("samples").GetInt32()));
        Assert.Equal(expected.Int("sessions"), lines.Count(line => line.GetProperty("part").ValueKind == JsonValueKind.Number));
        Assert.Equal(expected.Int("lengths"), lines.Sum(line => line.GetProperty("lengths").GetInt32()));
        Assert.Equal(expected.Int("sets"), lines.Sum(line => line.GetProperty("sets").GetInt32()));
        Close(Written(expected.FirstRecord), lines.Select(line => line.GetProperty("first_sample").GetString()).Min(StringComparer.Ordinal));
        Close(Written(expected.LastRecord), lines.Select(line => line.GetProperty("last_sample").GetString()).Max(StringComparer.Ordinal));
        Assert.All(lines, line => Assert.Empty(line.GetProperty("problems").EnumerateArray()));
    }

    [Theory]
    [MemberData(nameof(References))]
    public void ChannelsAgreeWithAnIndependentDecoder(string name)
    {
        var expected = RealFiles.Get(name);
        var lines = Inspected.Value[name].ToList();
        Agree(expected, "hr", lines, "heart_rate");
        Agree(expected, "power", lines, "power");
        Agree(expected, "speed", lines, "speed");
        Agree(expected, "cadence", lines, "cadence");
        var metres = lines.Select(line => line.GetProperty("distance_m")).Where(value => value.ValueKind == JsonValueKind.Number).Select(value => value.GetDouble()).ToList();
        Assert.Equal(expected.Number("distance_m") is null, metres.Count == 0);
        if (expected.Number("distance_m") is { } wanted)
        {
            Assert.Equal(wanted, metres.Max(), 1.0);
        }
    }

    private static void Agree(RealFile expected, string column, List<JsonElement> lines, string channel)
    {
        var parts = lines.Select(line => line.GetProperty("channels")).Where(channels => channels.TryGetProperty(channel, out _)).Select(channels => channels.GetProperty(channel)).ToList();
        var count = parts.Sum(part => part.GetProperty("n").GetInt32());
        if (expected.Int($"{column}_n") == 0 && column is not "hr")
        {
            return; // The other decoder leaves out what comes in developer fields.
        }

        Assert.Equal(expected.Int($"{column}_n"), count);
        if (count == 0)
        {
            return;
        }

        Assert.Equal(expected.Number($"{column}_max")!.Value, parts.Max(part => part.GetProperty("max").GetDouble()), 0.001);
        if (column is "hr" or "power")
        {
            var mean = parts.Sum(part => part.GetProperty("mean").GetDouble() * part.GetProperty("n").GetInt32()) / count;
            Assert.Equal(expected.Number($"{column}_mean")!.Value, mean, 0.5);
        }
    }

    private static ILookup<string, JsonElement> InspectAll()
    {
        var ended = Loadwatch.RunWithInput(string.Join('\n', RealFiles.Paths) + "\n", "inspect", "--json", "--from-list", "-");
        Assert.Equal((0, ""), (ended.Code, ended.Errors));
        return JsonDocument.Parse(ended.Output).RootElement.EnumerateArray().ToLookup(line => Path.GetFileName(line.GetProperty("file").GetString()!), StringComparer.Ordinal);
    }

    private static string? Written(NodaTime.Instant? instant) => instant is { } known ? InstantPattern.ExtendedIso.Format(known) : null;

    /// <summary>Within a second: the other decoder cuts fractions.</summary>
    private static void Close(string? expected, string? actual)
    {
        Assert.Equal(expected is null, actual is null);
        if (expected is not null)
        {
            var apart = InstantPattern.ExtendedIso.Parse(expected).Value - InstantPattern.ExtendedIso.Parse(actual!).Value;
            Assert.InRange(Math.Abs(apart.TotalSeconds), 0, 1);
        }
    }
}
