using LoadWatch.Recordings;
using NodaTime;
using static LoadWatch.Decoding.Fit.FitBaseType;

namespace LoadWatch.Decoding.Fit;

/// <summary>Writes activity files: the same activity always becomes the same bytes.</summary>
public static class FitEncoder
{
    private const int FileIdType = 0;
    private const int DeviceType = 1;
    private const int EventType = 2;
    private const int RecordType = 3;
    private const int SetType = 4;
    private const int LapType = 5;
    private const int SessionType = 6;
    private const int ActivityType = 7;
    private const int TimerStart = 0;
    private const int TimerStop = 4;

    /// <exception cref="ArgumentException">A sport or exercise is no word of the profile.</exception>
    /// <exception cref="ArgumentOutOfRangeException">A value does not fit its field.</exception>
    public static byte[] Encode(FitActivity activity)
    {
        ArgumentNullException.ThrowIfNull(activity);
        var writer = new FitPartWriter();
        WriteDevice(writer, activity);
        WriteTimeline(writer, activity);
        WriteSets(writer, activity);
        WriteLaps(writer, activity);
        WriteTotals(writer, activity);
        return writer.ToBytes();
    }

    private static void WriteDevice(FitPartWriter writer, FitActivity activity)
    {
        var device = activity.Device;
        writer
            .Define(FileIdType, new(FitMessages.FileId,
                new(FitFields.FileId.Type, Enumeration),
                new(FitFields.FileId.Manufacturer, Unsigned16),
                new(FitFields.FileId.Product, Unsigned16),
                new(FitFields.FileId.Serial, Unsigned32Z),
                new(FitFields.FileId.TimeCreated, Unsigned32)))
            .Message(FileIdType, FitDecoder.ActivityType, device.Manufacturer, device.Product, device.Serial, Seconds(activity.Start))
            .Define(DeviceType, new(FitMessages.DeviceInfo,
                new(FitFields.Timestamp, Unsigned32),
                new(FitFields.DeviceInfo.Index, Unsigned8),
                new(FitFields.DeviceInfo.Manufacturer, Unsigned16),
                new(FitFields.DeviceInfo.Product, Unsigned16),
                new(FitFields.DeviceInfo.Serial, Unsigned32Z)))
            .Message(DeviceType, Seconds(activity.Start), 0, device.Manufacturer, device.Product, device.Serial);
    }

    private static void WriteTimeline(FitPartWriter writer, FitActivity activity)
    {
        var channels = Enum.GetValues<Channel>().Where(channel => activity.Samples.Any(sample => sample[channel] is not null)).ToArray();
        writer
            .Define(EventType, new(FitMessages.Event,
                new(FitFields.Timestamp, Unsigned32), new(FitFields.Event.Kind, Enumeration), new(FitFields.Event.Type, Enumeration)))
            .Define(RecordType, new(FitMessages.Record, [new(FitFields.Timestamp, Unsigned32), .. channels.Select(Layout)]));
        var moments = Timer(activity)
            .Select(stop => (stop.Time, Write: (Action)(() => writer.Message(EventType, Seconds(stop.Time), 0, stop.Type))))
            .Concat(activity.Samples.Select(sample => (sample.Time, Write: (Action)(() => WriteSample(writer, sample, channels)))));
        foreach (var moment in moments.OrderBy(moment => moment.Time))
            moment.Write();

        writer.Message(EventType, Seconds(activity.End), 0, TimerStop);
    }

    private static IEnumerable<(Instant Time, int Type)> Timer(FitActivity activity)
    {
        yield return (activity.Start, TimerStart);
        foreach (var pause in activity.Pauses)
        {
            yield return (pause.Start, TimerStop);
            if (pause.End is { } end)
                yield return (end, TimerStart);
        }
    }

    private static void WriteSample(FitPartWriter writer, FitSample sample, Channel[] channels) =>
        writer.Message(RecordType, [Seconds(sample.Time), .. channels.Select(channel => Raw(channel, sample[channel]))]);

    private static FitFieldLayout Layout(Channel channel) => channel switch
    {
        Channel.HeartRate => new(FitFields.Record.HeartRate, Unsigned8),
        Channel.Power => new(FitFields.Record.Power, Unsigned16),
        Channel.Speed => new(FitFields.Record.EnhancedSpeed, Unsigned32),
        Channel.Cadence => new(FitFields.Record.Cadence, Unsigned8),
        Channel.Distance => new(FitFields.Record.Distance, Unsigned32),
        _ => new(FitFields.Record.EnhancedAltitude, Unsigned32),
    };

    private static FitValue Raw(Channel channel, double? value)
    {
        var (scale, shift) = ChannelSource.ScaleOf(channel);
        return (value + shift) * scale;
    }

    private static void WriteSets(FitPartWriter writer, FitActivity activity)
    {
        if (activity.Sets.Count == 0)
            return;

        writer.Define(SetType, new(FitMessages.Set,
            new(FitFields.Set.Timestamp, Unsigned32),
            new(FitFields.Set.Start, Unsigned32),
            new(FitFields.Set.DurationMilliseconds, Unsigned32),
            new(FitFields.Set.Repetitions, Unsigned16),
            new(FitFields.Set.WeightSixteenths, Unsigned16),
            new(FitFields.Set.Type, Unsigned8),
            new(FitFields.Set.Category, Unsigned16)));
        foreach (var set in activity.Sets)
        {
            var start = set.Start is { } time ? Seconds(time) : FitValue.None;
            writer.Message(SetType, start, start, set.DurationSeconds * 1000, set.Repetitions, set.Kilograms * 16, set.Active ? 1 : 0,
                set.Exercise is { } word ? Number(FitWords.ExerciseCategories, word) : FitValue.None);
        }
    }

    private static void WriteLaps(FitPartWriter writer, FitActivity activity)
    {
        var starts = activity.LapStarts.Count > 0 ? activity.LapStarts : [activity.Start];
        writer.Define(LapType, new(FitMessages.Lap,
            new(FitFields.Timestamp, Unsigned32), new(FitFields.Lap.Start, Unsigned32), new(FitFields.Lap.ElapsedMilliseconds, Unsigned32)));
        for (var i = 0; i < starts.Count; i++)
        {
            var end = i + 1 < starts.Count ? starts[i + 1] : activity.End;
            writer.Message(LapType, Seconds(activity.End), Seconds(starts[i]), (end - starts[i]).TotalMilliseconds);
        }
    }

    private static void WriteTotals(FitPartWriter writer, FitActivity activity)
    {
        var end = Seconds(activity.End);
        writer
            .Define(SessionType, new(FitMessages.Session,
                new(FitFields.Timestamp, Unsigned32),
                new(FitFields.Session.Start, Unsigned32),
                new(FitFields.Session.Sport, Enumeration),
                new(FitFields.Session.SubSport, Enumeration),
                new(FitFields.Session.ElapsedMilliseconds, Unsigned32),
                new(FitFields.Session.TimerMilliseconds, Unsigned32)))
            .Message(SessionType, end, Seconds(activity.Start), Number(FitWords.Sports, activity.Sport.Name),
                Number(FitWords.SubSports, activity.Sport.Detail ?? Sport.Generic.Name), activity.Elapsed * 1000, activity.Timer * 1000)
            .Define(ActivityType, new(FitMessages.Activity,
                new(FitFields.Timestamp, Unsigned32), new(FitFields.Activity.Sessions, Unsigned16), new(FitFields.Activity.LocalTimestamp, Unsigned32)))
            .Message(ActivityType, end, 1,
                activity.LocalOffset is { } offset ? Seconds(activity.End) + offset.Seconds : FitValue.None);
    }

    private static double Seconds(Instant time) => time.ToUnixTimeSeconds() - FitClock.EpochUnixSeconds;

    private static double Number(WordTable words, string word) =>
        words.NumberOf(word) ?? throw new ArgumentException($"'{word}' is no word of the FIT profile", nameof(word));
}
