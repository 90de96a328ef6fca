using System.Globalization;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.References;

/// <summary>Holds what two decoders give of one part against each other, value by value. What differs has a kind whose cause is in the bytes, or is a fault.</summary>
internal sealed class Comparison(ReferencePart ours, ReferencePart theirs, PartFeatures features)
{
    /// <summary>The least count of seconds that is a date, as milliseconds since 1970.</summary>
    private const double FirstDate = (0x10000000 + 631_065_600.0) * 1000;

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
        Counts("laps", ours.LapsBySession, theirs.Laps);
        Counts("lengths", ours.LengthsBySession, theirs.Lengths);
        Pauses();
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
        if (theirs.Sessions.Count < 2)
            return theirs.Records;

        var owner = OwnerOf(null);
        var owned = new List<(int Owner, double?[] Record)>();
        foreach (var record in theirs.Records)
        {
            owner = record[0] is { } time ? OwnerOf(time) : owner;
            owned.Add((owner, record));
        }

        return owned.OrderBy(record => record.Owner).Select(record => record.Record);
    }

    /// <summary>The session of theirs that a moment belongs to; what has no time belongs to the first.</summary>
    private int OwnerOf(double? time)
    {
        var starts = theirs.Sessions.Select((session, index) => (Start: session.Start ?? double.MinValue, index)).OrderBy(session => session.Start).ToList();
        return starts.Count == 0 ? 0 : starts.LastOrDefault(session => session.Start <= time, starts[0]).index;
    }

    /// <summary>How many laps or lengths begin in each session.</summary>
    private void Counts(string what, IReadOnlyList<int> own, IReadOnlyList<double?> begun)
    {
        var counts = new int[Math.Max(1, theirs.Sessions.Count)];
        foreach (var time in begun)
            counts[OwnerOf(time)]++;

        Same($"all {what}", own.Sum(), begun.Count);
        foreach (var ((one, its), i) in own.Zip(counts).Select((pair, i) => (pair, i)))
            Times($"{what} of session {i}", one, its);
    }

    /// <summary>
    /// The timer stands from the first stop to the next start. A stop that no start follows is a pause where the session has a record behind it. What happens
    /// at a time that is no date is no pause of ours.
    /// </summary>
    private void Pauses()
    {
        var their = Standing().Select(pause => (Owner: OwnerOf(pause[0]), Pause: pause)).ToList();
        for (var i = 0; i < ours.PausesBySession.Count; i++)
        {
            var own = ours.PausesBySession[i];
            var last = InSession(i).Max(record => record[0]);
            double?[][] other = [.. their.Where(pause => pause.Owner == i).Select(pause => pause.Pause).Where(pause => pause[1] is not null || last > pause[0]).OrderBy(pause => pause[0])];
            if (own.Count != other.Length && theirs.Timer.Any(entry => entry.Time < FirstDate) && Excused(Difference.NotADate))
                continue;

            Same($"pauses of session {i}", own.Count, other.Length);
            foreach (var (one, its) in own.Zip(other))
            {
                Times($"start of a pause of session {i}", one[0], its[0]);
                Times($"end of a pause of session {i}", one[1], its[1]);
            }
        }
    }

    private IEnumerable<double?[]> InSession(int session) => theirs.Records.Where(record => record[0] is { } time && OwnerOf(time) == session);

    private IEnumerable<double?[]> Standing()
    {
        double? stopped = null;
        foreach (var entry in theirs.Timer.Where(entry => entry.Time is not null))
        {
            if (entry.Type is "stop" or "stop_all" or "stop_disable" or "stop_disable_all")
                stopped ??= entry.Time;
            else if (entry.Type == "start")
            {
                if (stopped < entry.Time)
                    yield return [stopped, entry.Time];

                stopped = null;
            }
        }

        if (stopped is not null)
            yield return [stopped, null];
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

    /// <summary>Times are whole milliseconds and must be the same to the last.</summary>
    private void Times(string what, double? own, double? other)
    {
        if (own is null && other is not null && Excused(Difference.NotADate))
            return;

        if (own != other && Excused(Difference.CompressedTimes))
            return;

        if (own == other)
            Equal++;
        else
            faults.Add(string.Create(CultureInfo.InvariantCulture, $"{what}: {own} and {other}"));
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
