using System.Globalization;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.References;

/// <summary>Holds what two decoders give of one part against each other, value by value. What differs has a kind whose cause is in the bytes, or is a fault.</summary>
internal sealed class Comparison(ReferencePart ours, ReferencePart theirs, PartFeatures features)
{
    private readonly List<string> faults = [];

    /// <summary>The kinds of difference that were met.</summary>
    public HashSet<Difference> Met { get; } = [];

    /// <summary>How many values were equal.</summary>
    public int Equal { get; private set; }

    /// <summary>What differs without a reason.</summary>
    public IReadOnlyList<string> Run()
    {
        if (theirs.Error is { } error)
            Refused(error);
        else if (ours.Error is { } refusal)
            faults.Add($"refused by us alone: {refusal}");
        else if (ours.Sessions.Count > 0)
            Values();

        return faults;
    }

    private void Refused(string error)
    {
        if (ours.Error is null && !Excused(Difference.ReservedBitsOfAHeader) && !Excused(Difference.CompressedTimes))
            faults.Add($"refused by the reference alone: {error}");
    }

    private void Values()
    {
        Words("file type", ours.FileType, theirs.FileType);
        if (theirs.Serial is not null)
            Same("serial", ours.Serial, theirs.Serial);

        Sessions();
        Records();
        Sets();
        Same("laps", ours.Laps.Count, theirs.Laps.Count);
        Same("lengths", ours.Lengths.Count, theirs.Lengths.Count);
        Lists("beats", ours.Beats, [.. theirs.Beats.Where(rate => rate is > 0)]);
        Lists("intervals", ours.Intervals, [.. theirs.Intervals.Where(interval => interval is not null)]);
        if (ours.Activity is [_, { } offset] && theirs.Activity is [{ } utc, { } local])
            Same("offset", offset, Math.Round((local - utc) / 900_000) * 900_000);
    }

    private void Sessions()
    {
        if (theirs.Sessions.Count == 0)
            return;

        Same("sessions", ours.Sessions.Count, theirs.Sessions.Count);
        foreach (var ((own, other), i) in ours.Sessions.Zip(theirs.Sessions).Select((pair, i) => (pair, i)))
        {
            Times($"start of session {i}", own.Start, other.Start ?? own.Start);
            Words($"sport of session {i}", own.Sport, other.Sport ?? "generic");
            Words($"detail of session {i}", own.SubSport ?? "generic", other.SubSport ?? "generic");
            Same($"elapsed of session {i}", own.Elapsed, other.Elapsed ?? own.Elapsed);
            Same($"timer of session {i}", own.Timer, other.Timer);
            Same($"distance of session {i}", own.Distance, other.Distance);
        }
    }

    private void Records()
    {
        Same("records", ours.Records.Count, theirs.Records.Count);
        foreach (var ((own, other), row) in ours.Records.Zip(InOurOrder()).Select((pair, row) => (pair, row)))
        {
            Times($"time of record {row}", own[0], other[0]);
            for (var i = 0; i < OurParts.Channels.Count; i++)
                Reading($"{OurParts.Channels[i]} of record {row}", OurParts.Channels[i], own[i + 1], other[i + 1]);
        }
    }

    /// <summary>Their records by the session that each belongs to: the last begun at or before it, else the first; one without a time stays with the one before.</summary>
    private IEnumerable<double?[]> InOurOrder()
    {
        var starts = theirs.Sessions.Select((session, index) => (Start: session.Start ?? double.MinValue, index)).OrderBy(session => session.Start).ToList();
        if (starts.Count < 2)
            return theirs.Records;

        var owner = starts[0].index;
        var owned = new List<(int Owner, double?[] Record)>();
        foreach (var record in theirs.Records)
        {
            owner = record[0] is { } time ? starts.LastOrDefault(session => session.Start <= time, starts[0]).index : owner;
            owned.Add((owner, record));
        }

        return owned.OrderBy(record => record.Owner).Select(record => record.Record);
    }

    private void Sets()
    {
        static string Line(ReferenceSet set) =>
            string.Create(CultureInfo.InvariantCulture, $"{set.Start} {set.Duration} {set.Active} {set.Category ?? "unknown"} {set.Repetitions} {set.Weight}");
        var (own, other) = (ours.Sets.Select(Line).Order(StringComparer.Ordinal).ToList(), theirs.Sets.Select(Line).Order(StringComparer.Ordinal).ToList());
        Same("sets", own.Count, other.Count);
        foreach (var (one, its) in own.Zip(other))
            Words("set", one, its);
    }

    private void Lists(string what, IReadOnlyList<double?> own, IReadOnlyList<double?> other)
    {
        Same(what, own.Count, other.Count);
        foreach (var (one, its) in own.Order().Zip(other.Order()))
            Same(what, one, its);
    }

    private void Reading(string what, Channel channel, double? own, double? other)
    {
        var excuses = features.Channels.Where(special => special.Channel == channel).Select(special => special.Kind).ToList();
        if (!IsSame(own, other) && excuses.Count > 0)
            Met.UnionWith(excuses);
        else
            Same(what, own, other);
    }

    private void Times(string what, double? own, double? other)
    {
        if (own is null && other is not null && Excused(Difference.NotADate))
            return;

        if (!IsSame(own, other) && Excused(Difference.CompressedTimes))
            return;

        Same(what, own, other);
    }

    private bool Excused(Difference kind) => features.Kinds.Contains(kind) && (Met.Add(kind) || true);

    private void Words(string what, string? own, string? other)
    {
        if (own != other && (IsNumbered(own) || IsNumbered(other)))
            Met.Add(Difference.WordOfANumber);
        else if (own != other)
            faults.Add($"{what}: {own} and {other}");
        else
            Equal++;
    }

    private static bool IsNumbered(string? word) => word is not null && char.IsAsciiDigit(word[^1]) && word.Contains('_', StringComparison.Ordinal);

    private void Same(string what, double? own, double? other)
    {
        if (IsSame(own, other))
            Equal++;
        else
            faults.Add(string.Create(CultureInfo.InvariantCulture, $"{what}: {own} and {other}"));
    }

    private static bool IsSame(double? own, double? other) => own == other || Math.Abs((own - other) ?? double.NaN) <= 1e-9 * Math.Max(1, Math.Abs(own ?? 0));
}
