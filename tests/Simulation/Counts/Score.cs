using LoadWatch.Alerts;
using LoadWatch.Findings;
using LoadWatch.Replays;
using LoadWatch.Simulation.Nights;
using LoadWatch.Simulation.Worlds;
using NodaTime;

namespace LoadWatch.Simulation.Counts;

/// <summary>What a season's alerts were worth, held against the truth.</summary>
public static class Score
{
    /// <summary>Every time within the counted days that an alert was raised, the first time, again or as graver, with nothing true to explain it.</summary>
    public static IReadOnlyList<Raise> FalseAlerts(SeasonResult season) =>
    [
        .. season.People.SelectMany(person => Raises(person)
            .Where(raise => raise.Date >= season.World.Counted)
            .Where(raise => !person.Truth.Happenings.Any(one => Explains(one, raise)))),
    ];

    public static double FalsePerPersonAnd100Days(SeasonResult season) =>
        100.0 * FalseAlerts(season).Count / season.People.Count / season.World.CountedDays;

    /// <summary>How often an alert asked for a look: raised, raised again, or graver than before.</summary>
    public static IEnumerable<Raise> Raises(PersonNights person) => person.Changes
        .Where(change => change.Reason is AlertChangeReason.Raised or AlertChangeReason.RaisedAgain or AlertChangeReason.SeverityRose)
        .Select(change => new Raise(person.AlertOf(change.AlertId).Key, change.Date));

    /// <summary>By kind of episode: how many there were, how many were found, and after how many days.</summary>
    public static IReadOnlyList<Found> Episodes(params IReadOnlyList<SeasonResult> seasons) =>
    [
        .. seasons.SelectMany(season => season.People)
            .SelectMany(person => person.Truth.Happenings.Where(one => one.IsEpisode).Select(one => (one, First: FirstAlert(person, one))))
            .GroupBy(pair => pair.one.Kind)
            .OrderBy(kind => kind.Key)
            .Select(kind => new Found(
                kind.Key,
                kind.Count(),
                kind.Count(pair => pair.First is not null),
                Middle([.. kind.Where(pair => pair.First is not null).Select(pair => Period.DaysBetween(pair.one.From, pair.First!.Value)).Order()]))),
    ];

    /// <summary>Alerts about the same that were raised and over again three times or more, both counted, within 7 days.</summary>
    public static int Wavering(SeasonResult season) => season.People.Sum(person =>
        Chatter.Of(person.Changes.Where(change => change.Date >= season.World.Counted), id => person.AlertOf(id).Key));

    /// <summary>Raised dates within the counted days, by what they are about: the same where nothing but the service's own course differs.</summary>
    public static IReadOnlySet<Raise> CountedRaises(SeasonResult season) =>
        season.People.SelectMany(Raises).Where(raise => raise.Date >= season.World.Counted).ToHashSet();

    /// <summary>People to act on in a brief, named or counted.</summary>
    public static IReadOnlyList<int> Rows(SeasonResult season) => [.. season.Briefs.Select(brief => brief.Flagged.Count + brief.FlaggedBeyond)];

    /// <summary>The longest an alert may come after what it is about, days: windows have to fill.</summary>
    private static int Patience(HappeningKind kind) => kind switch
    {
        HappeningKind.DoubleWeek => 5,
        HappeningKind.DoubleSession => 4,
        HappeningKind.NothingHeavy => 4,
        _ => 0,
    };

    private static LocalDate? FirstAlert(PersonNights person, Happening episode) => Finds(person, episode).Min(raise => (LocalDate?)raise.Date);

    /// <summary>Alerts that tell of an episode while it is time.</summary>
    public static IEnumerable<Raise> Finds(PersonNights person, Happening episode) => Raises(person)
        .Where(raise => Fits(episode.Kind, raise.Key.Rule) && raise.Date >= episode.From && raise.Date <= episode.To.PlusDays(Patience(episode.Kind)));

    private static bool Explains(Happening happening, Raise raise) =>
        Fits(happening.Kind, raise.Key.Rule) && raise.Date >= happening.From && raise.Date <= happening.To.PlusDays(14);

    private static bool Fits(HappeningKind kind, string rule) => kind switch
    {
        HappeningKind.DoubleWeek => rule is "load_ratio" or "weekly_jump" or "session_spike" or "hard_days" or "monotony",
        HappeningKind.DoubleSession => rule is "session_spike",
        HappeningKind.NothingHeavy or HappeningKind.NeverFast => rule is "stimulus_gap" or "stimulus_low",
        HappeningKind.Fade => rule is "falling_load",
        HappeningKind.AwayUntold => rule is "silence" or "falling_load" or "stimulus_gap" or "stimulus_low",
        _ => false,
    };

    private static int? Middle(List<int> sorted) => sorted.Count == 0 ? null : sorted[sorted.Count / 2];
}

/// <param name="MedianDays">From the first date of the episode to the date on which the alert was raised; null where none was found.</param>
public sealed record Found(HappeningKind Kind, int Episodes, int Times, int? MedianDays)
{
    /// <summary>How likely it would be to find so few, or fewer, if a share of all such episodes were found: the binomial sum, 0 to 1.</summary>
    public double ChanceOfSoFew(double share)
    {
        var (term, sum) = (Math.Pow(1 - share, Episodes), 0.0);
        for (var times = 0; times <= Times; times++)
        {
            sum += term;
            term *= share / (1 - share) * (Episodes - times) / (times + 1);
        }

        return Math.Min(1, sum);
    }
}

/// <summary>An alert was raised on a date.</summary>
public readonly record struct Raise(FindingKey Key, LocalDate Date);
