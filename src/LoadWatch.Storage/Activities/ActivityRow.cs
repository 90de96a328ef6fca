using LoadWatch.Activities;
using LoadWatch.Loads;
using LoadWatch.Quality;
using LoadWatch.Recordings;
using LoadWatch.Stimulus;
using LoadWatch.Storage.Dialects;
using LoadWatch.Storage.Recordings;
using NodaTime;

namespace LoadWatch.Storage.Activities;

/// <summary>A row of <c>activity</c> beside that of its winning recording.</summary>
internal sealed class ActivityRow : RecordingRow
{
    private const string None = "[]";

    public string Key { get; init; } = "";

    public LocalDate Date { get; init; }

    public string Recordings { get; set; } = "";

    /// <summary>Null where it is as the winner says.</summary>
    public string? Session { get; init; }

    public double? HeartRateMeanBpm { get; init; }

    public int? HeartRateMaxBpm { get; init; }

    public double? PowerMeanWatts { get; init; }

    public double? PowerMaxWatts { get; init; }

    public string UsableShare { get; init; } = "";

    public string TimesInZone { get; init; } = "";

    public string Remarks { get; init; } = "";

    public string Quantities { get; init; } = "";

    public string Stimulus { get; init; } = "";

    public string Cuts { get; init; } = "";

    /// <summary>Null for a row of before checksums were kept.</summary>
    public string? Checksum { get; set; }

    public static ActivityRow From(StoredActivity activity) => new()
    {
        Key = activity.Key,
        Sha = activity.Winner.Sha,
        Part = activity.Winner.Part,
        Person = activity.Winner.Person,
        Date = activity.Date,
        Recordings = Text(activity.Merge.Contributions),
        Session = activity.Merge.Frame == SessionFrame.Of(activity.Winner) ? null : JsonText.Write(activity.Merge.Frame),
        HeartRateMeanBpm = activity.Values.HeartRateMeanBpm,
        HeartRateMaxBpm = activity.Values.HeartRateMaxBpm,
        PowerMeanWatts = activity.Values.PowerMeanWatts,
        PowerMaxWatts = activity.Values.PowerMaxWatts,
        UsableShare = JsonText.WriteSorted(activity.Values.UsableShare),
        TimesInZone = JsonText.Write(activity.Values.TimesInZone),
        Remarks = JsonText.Write(activity.Values.Remarks),
        Quantities = JsonText.Write(activity.Values.Quantities),
        Stimulus = JsonText.Write(activity.Values.Stimulus),
        Cuts = activity.Values.Cuts.Count == 0 ? None : JsonText.Write(activity.Values.Cuts),
    };

    /// <summary>As <see cref="Recordings"/> holds them.</summary>
    public static string Text(IReadOnlyList<Contribution> contributions) => JsonText.Write(contributions);

    public StoredActivity ToActivity()
    {
        var values = new ActivityValues
        {
            HeartRateMeanBpm = HeartRateMeanBpm,
            HeartRateMaxBpm = HeartRateMaxBpm,
            PowerMeanWatts = PowerMeanWatts,
            PowerMaxWatts = PowerMaxWatts,
            UsableShare = JsonText.Read<Dictionary<Channel, double>>(UsableShare),
            TimesInZone = JsonText.Read<List<TimeInZone>>(TimesInZone),
            Remarks = JsonText.Read<List<string>>(Remarks),
            Quantities = JsonText.Read<List<Quantity>>(Quantities),
            Stimulus = JsonText.Read<List<RegionStimulus>>(Stimulus),
            Cuts = Cuts == None ? [] : JsonText.Read<List<Cut>>(Cuts),
        };
        return new StoredActivity(ToMerge(), values);
    }

    public StoredMerge ToMerge()
    {
        var winner = ToRecording();
        return new StoredMerge(winner, Session is { } frame ? JsonText.Read<SessionFrame>(frame) : SessionFrame.Of(winner), JsonText.Read<List<Contribution>>(Recordings));
    }
}
