namespace LoadWatch.Decoding.Fit;

/// <summary>Global message numbers of the public profile.</summary>
internal static class FitMessages
{
    public const int FileId = 0;
    public const int Sport = 12;
    public const int Session = 18;
    public const int Lap = 19;
    public const int Record = 20;
    public const int Event = 21;
    public const int DeviceInfo = 23;
    public const int Activity = 34;
    public const int Monitoring = 55;
    public const int BeatIntervals = 78;
    public const int Length = 101;
    public const int MonitoringInfo = 103;
    public const int HeartRate = 132;
    public const int TimestampCorrelation = 162;
    public const int FieldDescription = 206;
    public const int Set = 225;

    /// <summary>Whether the decoder reads more of it than its length and its time.</summary>
    public static bool IsRead(int message) => message is FileId or Sport or Session or Lap or Record or Event or DeviceInfo
        or Activity or Monitoring or MonitoringInfo or BeatIntervals or Length or HeartRate or TimestampCorrelation or FieldDescription or Set;
}

/// <summary>Field numbers, by message.</summary>
internal static class FitFields
{
    public const byte Timestamp = 253;

    public static class FileId
    {
        public const byte Type = 0;
        public const byte Manufacturer = 1;
        public const byte Product = 2;
        public const byte Serial = 3;
        public const byte TimeCreated = 4;
    }

    public static class Sport
    {
        public const byte Name = 0;
        public const byte Detail = 1;
    }

    public static class Session
    {
        public const byte Start = 2;
        public const byte Sport = 5;
        public const byte SubSport = 6;
        public const byte ElapsedMilliseconds = 7;
        public const byte TimerMilliseconds = 8;
        public const byte DistanceCentimetres = 9;
    }

    /// <summary>Laps and lengths carry their start under the same number.</summary>
    public static class Lap
    {
        public const byte Start = 2;
        public const byte ElapsedMilliseconds = 7;
    }

    public static class Record
    {
        public const byte Altitude = 2;
        public const byte HeartRate = 3;
        public const byte Cadence = 4;
        public const byte Distance = 5;
        public const byte Speed = 6;
        public const byte Power = 7;
        public const byte CompressedSpeedDistance = 8;
        public const byte EnhancedSpeed = 73;
        public const byte EnhancedAltitude = 78;
    }

    public static class Event
    {
        public const byte Kind = 0;
        public const byte Type = 1;
    }

    public static class DeviceInfo
    {
        public const byte Index = 0;
        public const byte Manufacturer = 2;
        public const byte Serial = 3;
        public const byte Product = 4;
    }

    public static class Activity
    {
        public const byte Sessions = 1;
        public const byte LocalTimestamp = 5;
    }

    public static class Monitoring
    {
        /// <summary>A counter of steps where the kind is walking or running.</summary>
        public const byte Steps = 3;
        public const byte Kind = 5;
        public const byte Steps16 = 9;

        /// <summary>Kind in the low five bits.</summary>
        public const byte KindAndIntensity = 24;
        public const byte ShortTimestamp = 26;
        public const byte HeartRate = 27;
    }

    public static class MonitoringInfo
    {
        public const byte LocalTimestamp = 0;
    }

    public static class BeatIntervals
    {
        /// <summary>Several in one message, unused places without a value.</summary>
        public const byte Milliseconds = 0;
    }

    public static class HeartRate
    {
        /// <summary>1/32768 s.</summary>
        public const byte Fraction = 0;

        /// <summary>1/256 s.</summary>
        public const byte Fraction256 = 1;
        public const byte BeatsPerMinute = 6;

        /// <summary>1/1024 s.</summary>
        public const byte EventTime = 9;
        public const byte EventTime12 = 10;
    }

    public static class TimestampCorrelation
    {
        public const byte SystemTimestamp = 1;
        public const byte LocalTimestamp = 3;
    }

    public static class FieldDescription
    {
        public const byte DeveloperIndex = 0;
        public const byte Number = 1;
        public const byte BaseType = 2;
        public const byte Scale = 6;
        public const byte Offset = 7;
        public const byte Units = 8;
        public const byte NativeMessage = 14;
        public const byte NativeField = 15;
    }

    public static class Set
    {
        public const byte DurationMilliseconds = 0;
        public const byte Repetitions = 3;
        public const byte WeightSixteenths = 4;
        public const byte Type = 5;
        public const byte Start = 6;
        public const byte Category = 7;
        public const byte Timestamp = 254;
    }
}
