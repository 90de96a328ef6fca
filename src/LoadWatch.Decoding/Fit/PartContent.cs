using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Fit;

/// <summary>What one part says, times still as in the file: milliseconds of the FIT epoch or of the device's uptime.</summary>
internal sealed class PartContent(MemoryBudget budget, DeveloperFields developer)
{
    /// <summary>What was read of a session, and its recording.</summary>
    public const int SessionCost = 1200;

    private const int SetCost = 320;
    private const int SmallCost = 64;
    private const int EventCost = 128;
    private const int IntervalCost = 32;
    private const int Quarter = 15 * 60;
    private const int MostOffsetSeconds = 18 * 3600;

    public int? FileType { get; private set; }

    public Device Device { get; private set; } = Device.Unknown;

    public Sport? StatedSport { get; private set; }

    /// <summary>Local time minus UTC in seconds, to the quarter of an hour.</summary>
    public int? LocalOffsetSeconds { get; private set; }

    public FitClock Clock { get; private set; } = FitClock.Plain;

    public List<SessionFacts> Sessions { get; } = [];

    public PooledList<SetFacts> Sets { get; } = new();

    /// <summary>When each began.</summary>
    public PooledList<long?> Laps { get; } = new();

    /// <summary>When each began.</summary>
    public PooledList<long?> Lengths { get; } = new();

    /// <summary>Times from beat to beat with the last time before them in the file; they carry none of their own.</summary>
    public PooledList<(long? Time, int Milliseconds)> Intervals { get; } = new();

    /// <summary>What lacks behind it, where the part was cut off; null where it is whole.</summary>
    public string? CutOff { get; set; }

    public TimerPauses Pauses { get; } = new();

    public SampleColumns Samples { get; } = new(budget);

    public MonitoringLog Monitoring { get; } = new(budget);

    public LateBeats Late { get; } = new(budget);

    public bool HasTraining => IsTrainingType && (Sessions.Count > 0 || Samples.Count > 0 || Sets.Count > 0);

    /// <summary>Whether it only brings beats that belong to the activity before it.</summary>
    public bool HasOnlyBeats => Late.Beats.Count > 0 && Sessions.Count == 0 && Samples.Count == 0 && Sets.Count == 0;

    /// <summary>A course holds records too; only what is called an activity, or nothing that the profile names, is training.</summary>
    private bool IsTrainingType => FileType is not { } type || type == FitDecoder.ActivityType || !FitWords.FileTypes.Knows(type);

    public void Read(in FitMessage message, int kind, long? time)
    {
        switch (kind)
        {
            case FitMessages.FileId:
                ReadFileId(message);
                break;
            case FitMessages.DeviceInfo:
                ReadDeviceInfo(message);
                break;
            case FitMessages.Sport:
                StatedSport = SportOf(message, FitFields.Sport.Name, FitFields.Sport.Detail);
                break;
            case FitMessages.Session:
                ReadSession(message);
                break;
            case FitMessages.Lap:
                Keep(Laps, message.Time(FitFields.Lap.Start) ?? time, SmallCost);
                break;
            case FitMessages.Length:
                Keep(Lengths, message.Time(FitFields.Lap.Start) ?? time, SmallCost);
                break;
            case FitMessages.Monitoring:
                Monitoring.Read(message, time);
                break;
            case FitMessages.MonitoringInfo:
                Monitoring.Note(time);
                LocalOffsetSeconds = OffsetOf(time, message.Time(FitFields.MonitoringInfo.LocalTimestamp)) ?? LocalOffsetSeconds;
                break;
            case FitMessages.BeatIntervals:
                ReadIntervals(message, time);
                break;
            case FitMessages.Event:
                Pauses.Read(message, time);
                budget.Spend(EventCost);
                break;
            case FitMessages.Set:
                ReadSet(message);
                break;
            case FitMessages.HeartRate:
                Late.Read(message);
                break;
            case FitMessages.Activity:
                LocalOffsetSeconds = OffsetOf(time, message.Time(FitFields.Activity.LocalTimestamp)) ?? LocalOffsetSeconds;
                break;
            case FitMessages.TimestampCorrelation:
                Clock = Clock.Correlated(time, message.Time(FitFields.TimestampCorrelation.SystemTimestamp));
                LocalOffsetSeconds ??= OffsetOf(time, message.Time(FitFields.TimestampCorrelation.LocalTimestamp));
                break;
        }
    }

    /// <summary>Gives all lent memory back.</summary>
    public void Return()
    {
        Samples.Return();
        Late.Beats.Return();
        Intervals.Return();
        Sets.Return();
        Laps.Return();
        Lengths.Return();
        Pauses.Closed.Return();
    }

    private static Sport SportOf(in FitMessage message, byte name, byte detail)
    {
        var sub = message.Int(detail) is { } number and not 0 ? FitWords.SubSports[number] : null;
        return message.Int(name) is { } sport ? new Sport(FitWords.Sports[sport], sub) : new Sport(Sport.Generic.Name, sub);
    }

    private void Keep<T>(PooledList<T> list, T item, int cost)
    {
        list.Add(item);
        budget.Spend(cost);
    }

    private void ReadFileId(in FitMessage message)
    {
        FileType ??= message.Int(FitFields.FileId.Type);
        Device = new(
            message.Int(FitFields.FileId.Manufacturer) ?? Device.Manufacturer,
            message.Int(FitFields.FileId.Product) ?? Device.Product,
            message.UInt(FitFields.FileId.Serial) ?? Device.Serial);
    }

    /// <summary>The recording device describes itself under index 0; what the file's own words left open is filled.</summary>
    private void ReadDeviceInfo(in FitMessage message)
    {
        if (message.Int(FitFields.DeviceInfo.Index) != 0)
            return;

        Device = new(
            Device.Manufacturer ?? message.Int(FitFields.DeviceInfo.Manufacturer),
            Device.Product ?? message.Int(FitFields.DeviceInfo.Product),
            Device.Serial ?? message.UInt(FitFields.DeviceInfo.Serial));
    }

    /// <summary>A total of a developer field stands in for the profile's where that is absent, else it is shown.</summary>
    private void ReadSession(in FitMessage message)
    {
        var elapsed = message.Scaled(FitFields.Session.ElapsedMilliseconds, 1000);
        var timer = message.Scaled(FitFields.Session.TimerMilliseconds, 1000);
        var distance = message.Scaled(FitFields.Session.DistanceCentimetres, 100);
        var shadowed = Shadowed.None;
        if (message.DeveloperSlots.Length > 0)
        {
            var beside = new Shadowed
            {
                ElapsedSeconds = developer.Total(message, FitFields.Session.ElapsedMilliseconds),
                TimerSeconds = developer.Total(message, FitFields.Session.TimerMilliseconds),
                DistanceMetres = developer.Total(message, FitFields.Session.DistanceCentimetres),
            };
            shadowed = new Shadowed
            {
                ElapsedSeconds = elapsed is null ? null : beside.ElapsedSeconds,
                TimerSeconds = timer is null ? null : beside.TimerSeconds,
                DistanceMetres = distance is null ? null : beside.DistanceMetres,
            };
            (elapsed, timer, distance) = (elapsed ?? beside.ElapsedSeconds, timer ?? beside.TimerSeconds, distance ?? beside.DistanceMetres);
        }

        var sport = SportOf(message, FitFields.Session.Sport, FitFields.Session.SubSport);
        Sessions.Add(new SessionFacts(message.Time(FitFields.Session.Start), sport, elapsed, timer, distance) { Shadowed = shadowed });
        budget.Spend(SessionCost);
    }

    private void ReadSet(in FitMessage message)
    {
        var start = message.Time(FitFields.Set.Start) ?? message.Time(FitFields.Set.Timestamp);
        var category = message.Int(FitFields.Set.Category);
        var set = new SetFacts(
            start,
            message.Scaled(FitFields.Set.DurationMilliseconds, 1000),
            message.Int(FitFields.Set.Type) != 0,
            category is { } number and not FitDecoder.UnknownExercise ? FitWords.ExerciseCategories[number] : null,
            message.Int(FitFields.Set.Repetitions),
            message.Scaled(FitFields.Set.WeightSixteenths, 16));
        Keep(Sets, set, SetCost);
    }

    private void ReadIntervals(in FitMessage message, long? time)
    {
        var bytes = message.Values(FitFields.BeatIntervals.Milliseconds, sizeof(ushort));
        for (; bytes.Length > 0; bytes = bytes[sizeof(ushort)..])
        {
            if (FitNumber.UInt16(bytes, message.BigEndian) is var milliseconds and > 0 and < ushort.MaxValue)
            {
                Intervals.Add((time, milliseconds));
                budget.Spend(IntervalCost);
            }
        }
    }

    /// <summary>The quarter of an hour that a local time is ahead of the date it belongs to; null where either is no date or no zone is so far off.</summary>
    private static int? OffsetOf(long? time, long? local)
    {
        if (!FitClock.IsDate(time) || local is null)
            return null;

        var seconds = (long)Math.Round((local.Value - time!.Value) / (1000.0 * Quarter)) * Quarter;
        return Math.Abs(seconds) <= MostOffsetSeconds ? (int)seconds : null;
    }
}

/// <summary>What a session message states; null where it does not.</summary>
internal sealed record SessionFacts(long? Start, Sport Sport, double? ElapsedSeconds, double? TimerSeconds, double? DistanceMetres)
{
    /// <summary>Totals that developer fields state beside it.</summary>
    public Shadowed Shadowed { get; init; } = Shadowed.None;
}

/// <summary>What a set message says; null where it does not.</summary>
internal readonly record struct SetFacts(long? Start, double? DurationSeconds, bool Active, string? Exercise, int? Repetitions, double? Kilograms);
