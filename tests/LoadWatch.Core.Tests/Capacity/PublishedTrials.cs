namespace LoadWatch.Capacity;

/// <summary>
/// Trials of five people, s and W, with what their authors fitted to them: Weigend, Gray, Obst and Siegler 2022, arXiv:2207.14295, and the data
/// files published with it.
/// </summary>
internal static class PublishedTrials
{
    public static IReadOnlyList<Trial> Of(int person) => person switch
    {
        1 => Trials((118, 324), (157, 299), (200, 275), (240, 259), (485, 243)),
        2 => Trials((137, 428), (196, 396), (277, 364), (328, 343), (484, 332)),
        3 => Trials((155, 307), (266, 280), (410, 265), (708, 252)),
        4 => Trials((190, 288), (259, 265), (328, 245), (528, 230), (730, 224)),
        _ => Trials((141, 276), (179, 255), (249, 234), (291, 221), (365, 214)),
    };

    private static Trial[] Trials(params (double Seconds, double Watts)[] trials) => [.. trials.Select(trial => Trial.OfMean(trial.Seconds, trial.Watts))];
}
