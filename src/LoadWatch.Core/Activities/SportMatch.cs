using LoadWatch.Recordings;

namespace LoadWatch.Activities;

/// <summary>How well a session that a table tells of fits one that a device recorded, by sport. The better fit goes first.</summary>
public enum SportFit
{
    /// <summary>Never the same session.</summary>
    None,

    /// <summary>One of them does not say, or they are of one family.</summary>
    Possible,

    /// <summary>The same sport; of sets: a recording of strength work.</summary>
    Same,

    /// <summary>The same sport and stated detail.</summary>
    Exact,
}

/// <summary>
/// Which sports may be one session: those of one family (<see cref="Sport.Family"/>), all strength and gymnastics of the gym among them. <c>generic</c> says nothing. A
/// choice.
/// </summary>
public static class SportMatch
{
    private const string Run = "running";
    private const string Ride = "cycling";
    private const string Gym = "training";
    private const string Unsaid = "generic";

    /// <param name="stated">Null where the table does not say.</param>
    public static SportFit Of(Sport? stated, Sport recorded)
    {
        if (stated is null)
        {
            return SportFit.Possible;
        }

        var isFamily = stated.Family == recorded.Family;
        if (stated.Name == recorded.Name && (isFamily || stated.Detail is null || recorded.Detail is null))
        {
            return stated.Detail is not null && stated.Detail == recorded.Detail ? SportFit.Exact : SportFit.Same;
        }

        return isFamily || stated.Family == Unsaid || recorded.Family == Unsaid ? SportFit.Possible : SportFit.None;
    }

    /// <summary>Whether logged sets may have been done in a recording: never in a run, walk, match or ride.</summary>
    /// <param name="ownSets">Number of sets that the recording holds itself.</param>
    public static SportFit OfSets(Sport recorded, int ownSets)
    {
        var family = recorded.Family;
        if (family is Run or Ride || recorded.IsOnFoot)
        {
            return SportFit.None;
        }

        if (ownSets > 0 || recorded.Detail == "strength_training")
        {
            return SportFit.Same;
        }

        return family is Gym or Unsaid ? SportFit.Possible : SportFit.None;
    }
}
