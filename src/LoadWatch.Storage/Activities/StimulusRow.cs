using LoadWatch.Stimulus;
using LoadWatch.Storage.Dialects;

namespace LoadWatch.Storage.Activities;

/// <summary>A row of <c>stimulus</c>. The three ends of a band are known together or not at all.</summary>
internal sealed class StimulusRow
{
    public string Activity { get; init; } = "";

    public string Region { get; init; } = "";

    public string Grade { get; init; } = "";

    public string Channel { get; init; } = "";

    public double? HardBoutsLow { get; init; }

    public double? HardBoutsMid { get; init; }

    public double? HardBoutsHigh { get; init; }

    public double? HardRepetitionsLow { get; init; }

    public double? HardRepetitionsMid { get; init; }

    public double? HardRepetitionsHigh { get; init; }

    public int? HardSets { get; init; }

    public double? SlowSecondsLow { get; init; }

    public double? SlowSecondsMid { get; init; }

    public double? SlowSecondsHigh { get; init; }

    public double? MediumSecondsLow { get; init; }

    public double? MediumSecondsMid { get; init; }

    public double? MediumSecondsHigh { get; init; }

    public double? LargeSecondsLow { get; init; }

    public double? LargeSecondsMid { get; init; }

    public double? LargeSecondsHigh { get; init; }

    public string NotSeen { get; init; } = "";

    public static StimulusRow From(string activity, RegionStimulus stimulus) => new()
    {
        Activity = activity,
        Region = BodyRegions.Word(stimulus.Region),
        Grade = stimulus.Grade.ToString(),
        Channel = stimulus.Channel,
        HardBoutsLow = stimulus.HardBouts?.Low,
        HardBoutsMid = stimulus.HardBouts?.Mid,
        HardBoutsHigh = stimulus.HardBouts?.High,
        HardRepetitionsLow = stimulus.HardRepetitions?.Low,
        HardRepetitionsMid = stimulus.HardRepetitions?.Mid,
        HardRepetitionsHigh = stimulus.HardRepetitions?.High,
        HardSets = stimulus.HardSets,
        SlowSecondsLow = stimulus.SlowSeconds?.Low,
        SlowSecondsMid = stimulus.SlowSeconds?.Mid,
        SlowSecondsHigh = stimulus.SlowSeconds?.High,
        MediumSecondsLow = stimulus.MediumSeconds?.Low,
        MediumSecondsMid = stimulus.MediumSeconds?.Mid,
        MediumSecondsHigh = stimulus.MediumSeconds?.High,
        LargeSecondsLow = stimulus.LargeSeconds?.Low,
        LargeSecondsMid = stimulus.LargeSeconds?.Mid,
        LargeSecondsHigh = stimulus.LargeSeconds?.High,
        NotSeen = JsonText.Write(stimulus.NotSeen),
    };

    public RegionStimulus ToStimulus() => new(
        Words<BodyRegion>.Parse(Region),
        Enum.Parse<Grade>(Grade),
        Channel,
        BandOf(HardBoutsLow, HardBoutsMid, HardBoutsHigh),
        BandOf(HardRepetitionsLow, HardRepetitionsMid, HardRepetitionsHigh),
        HardSets,
        BandOf(SlowSecondsLow, SlowSecondsMid, SlowSecondsHigh),
        BandOf(MediumSecondsLow, MediumSecondsMid, MediumSecondsHigh),
        BandOf(LargeSecondsLow, LargeSecondsMid, LargeSecondsHigh),
        JsonText.Read<List<string>>(NotSeen));

    private static Band? BandOf(double? low, double? mid, double? high) =>
        (low, mid, high) is ({ } lowest, { } middle, { } highest) ? new Band(lowest, middle, highest) : null;
}
