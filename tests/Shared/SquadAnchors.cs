namespace LoadWatch.Tests;

/// <summary>Reference values of the three invented people whom every temporary working folder knows. Cara's maximum is left out: her age stands for it.</summary>
internal static class SquadAnchors
{
    public const string Text = """
        person,date,anchor,value,unit,source,exercise
        anna,,heart_rate_rest,50,bpm,,
        anna,,heart_rate_max,190,bpm,,
        bo,,heart_rate_rest,55,bpm,,
        bo,,heart_rate_max,185,bpm,,
        bo,,critical_power,250,W,,
        bo,,w_prime,20000,J,,
        bo,,power_max,1100,W,,
        cara,,heart_rate_rest,60,bpm,,

        """;
}
