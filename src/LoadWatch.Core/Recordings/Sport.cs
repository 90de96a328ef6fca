namespace LoadWatch.Recordings;

/// <summary>A sport and, where stated, its detail, in the words of the FIT profile: <c>cycling</c>, <c>training/strength_training</c>.</summary>
public sealed record Sport(string Name, string? Detail = null)
{
    public static Sport Generic { get; } = new("generic");

    /// <summary>On foot, power is a watch's model of speed and slope: a critical power from a bicycle or an ergometer does not belong to it.</summary>
    public bool IsOnFoot => Name is "running" or "walking" or "hiking";

    /// <summary>A game of two teams in which players run or skate.</summary>
    public bool IsTeamSport => Name is "team_sport" or "soccer" or "american_football" or "rugby" or "hockey" or "lacrosse" or "basketball"
        or "volleyball" or "baseball" or "cricket";

    /// <summary>
    /// The sports that are one kind of movement share a word: a watch at a match is often set to running, so team sports and running are one family; so are a sport and
    /// its machine, and what else there is of machines of the gym; a bicycle moved by the arms is one of its own. A choice.
    /// </summary>
    public string Family => this switch
    {
        { Name: "fitness_equipment", Detail: "treadmill" } => "running",
        { Name: "fitness_equipment", Detail: "indoor_cycling" or "spin" } => "cycling",
        { Name: "fitness_equipment", Detail: "indoor_rowing" } => "rowing",
        { Name: "fitness_equipment" } => "training",
        { Name: "e_biking" } => "cycling",
        { Name: "cycling", Detail: "hand_cycling" or "indoor_hand_cycling" } => "hand_cycling",
        { IsTeamSport: true } => "running",
        _ => Name,
    };

    /// <summary><c>name</c> or <c>name/detail</c>.</summary>
    public override string ToString() => Detail is null ? Name : $"{Name}/{Detail}";

    /// <summary>The reverse of <see cref="ToString"/>.</summary>
    public static Sport Parse(string text)
    {
        ArgumentException.ThrowIfNullOrWhiteSpace(text);
        var slash = text.IndexOf('/', StringComparison.Ordinal);
        return slash < 0 ? new Sport(text) : new Sport(text[..slash], text[(slash + 1)..]);
    }
}
