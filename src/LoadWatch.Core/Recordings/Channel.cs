namespace LoadWatch.Recordings;

/// <summary>A measured series of a recording. The unit belongs to the channel.</summary>
public enum Channel
{
    /// <summary>Heart rate, beats per minute.</summary>
    HeartRate,

    /// <summary>Mechanical power, watts.</summary>
    Power,

    /// <summary>Speed over ground, metres per second.</summary>
    Speed,

    /// <summary>Pedal, stride or stroke cadence as recorded, whole cycles per minute.</summary>
    Cadence,

    /// <summary>Distance covered since the start, metres.</summary>
    Distance,

    /// <summary>Height above sea level, metres.</summary>
    Altitude,
}
