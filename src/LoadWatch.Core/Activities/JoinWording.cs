using System.Globalization;
using LoadWatch.Findings;
using LoadWatch.Loads;
using LoadWatch.Rows;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Activities;

/// <summary>Sentences of questions and remarks about joining.</summary>
internal static class JoinWording
{
    private static readonly LocalTimePattern HourAndMinute = LocalTimePattern.CreateWithInvariantCulture("HH:mm");

    public const string LoadIsCountedElsewhere = "may be part of one of the recordings of the date: its load is not added";

    public static string Several(StatedSession stated, IReadOnlyList<SessionParts> candidates)
    {
        var starts = candidates.Select(one => one.Recording).OfType<RecordedActivity>().Select(one => HourAndMinute.Format(one.Winner.Start.WithOffset(one.Winner.LocalOffset).TimeOfDay)).ToList();
        var where = starts.Count > 0
            ? $"the recordings at {Listed(starts)}"
            : $"{candidates.Count} sessions of that date that were not recorded";
        var fit = stated.Sets is { Count: > 1 } ? "fit" : "fits";
        return $"{What(stated)} {fit} {where}; a session number or a start time would tell";
    }

    public static string Nowhere(StatedSession stated) => $"{What(stated)} has no recording and no minutes; it counts once one of them comes";

    public static string WhichRegions(DeclaredContent content, LocalDate date) =>
        $"{Word(content)} session of {On(date)}: which body regions? Its sport would tell";

    public static string Differs(Quantity taken, string taker, Quantity other, string teller) =>
        $"{taken.Name}: {Value(taken)} by {taker} counts, {teller} says {Value(other)}";

    /// <param name="log">Layout of the log that counts; null for the recording's own sets.</param>
    public static string SetsBeside(StatedSession other, string? log) =>
        $"sets of {other.Layout} are not added to those of {log ?? "the recording"}";

    public static string Word(DeclaredContent content) => content switch
    {
        DeclaredContent.Heavy => "heavy",
        DeclaredContent.Fast => "fast",
        DeclaredContent.Match => "match",
        DeclaredContent.Easy => "easy",
        DeclaredContent.Rehabilitation => "rehabilitation",
        _ => throw new ArgumentOutOfRangeException(nameof(content)),
    };

    /// <summary><c>a rating of 7 of 2 March (ratings)</c>.</summary>
    private static string What(StatedSession stated) => $"{Kind(stated)} of {On(stated.Date)} ({stated.Layout})";

    private static string Kind(StatedSession stated)
    {
        if (stated.Sets is { } sets)
        {
            return sets.Count == 1 ? "1 logged set" : $"{sets.Count} logged sets";
        }

        return stated is { StandsAlone: false, Quantities: [var rating] } ? $"a rating of {Number(rating.Value)}" : "the session";
    }

    private static string On(LocalDate date) => Wording.Date(date, told: date);

    private static string Value(Quantity quantity) => quantity.Unit == "1" ? Number(quantity.Value) : $"{Number(quantity.Value)} {quantity.Unit}";

    private static string Number(double value) => value.ToString("0.##", CultureInfo.InvariantCulture);

    private static string Listed(List<string> words) =>
        words.Count == 1 ? words[0] : $"{string.Join(", ", words[..^1])} and {words[^1]}";
}
