namespace LoadWatch.Recordings;

/// <summary>Where an arrival stands (design: states of an arrival).</summary>
public enum ArrivalState
{
    /// <summary>Durable in the archive, not decoded yet.</summary>
    Waiting,

    /// <summary>Its recordings are in (I-3).</summary>
    Stored,

    /// <summary>Whole, but it holds no training: settings, courses, the archive around other arrivals.</summary>
    Aside,

    /// <summary>Nobody or more than one person is named as its owner, or it carries no date. Taken up by itself once answered.</summary>
    Held,

    /// <summary>Not usable; the reason names the place.</summary>
    Refused,
}
