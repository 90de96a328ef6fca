using LoadWatch.Tests;

namespace LoadWatch.Chaos.Inputs;

/// <summary>Four invented people and what the configuration says of them.</summary>
public static class Cast
{
    public const string Roster = """
        person,name,group,birth_year,sex,time_zone
        anna,Anna Ahola,squad,1996,f,
        bo,Bo Björk,squad,1991,m,
        cara,Cara Costa,squad,1958,f,
        dan,Dan Dubois,squad,1988,m,

        """;

    public const string Anchors = SquadAnchors.Text + """
        cara,,heart_rate_max,160,bpm,,
        dan,,heart_rate_rest,48,bpm,,
        dan,,heart_rate_max,188,bpm,,

        """;

    /// <summary>Heart rate at rest and at most, bpm: the same numbers once more, for the truth.</summary>
    public static (int Resting, int Highest) HeartRates(string person) => person switch
    {
        "anna" => (50, 190),
        "bo" => (55, 185),
        "cara" => (60, 160),
        _ => (48, 188),
    };
}
