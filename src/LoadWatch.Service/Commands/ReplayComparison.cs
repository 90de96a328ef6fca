using System.Globalization;
using System.Text;
using LoadWatch.Findings;
using LoadWatch.Replays;
using LoadWatch.Service.Export;
using NodaTime;

namespace LoadWatch.Service.Commands;

/// <summary>The figures of today's limits and of others, side by side.</summary>
public sealed record ReplayComparison(LocalDate From, LocalDate To, ReplayFigures Now, ReplayFigures Other)
{
    private const int NameWidth = 46;

    public string Text()
    {
        var text = new StringBuilder();
        text.Append(CultureInfo.InvariantCulture, $"{Words.Date(From)} to {Words.Date(To)}, {Now.Days} days, as if every alert had been seen by the next night\n\n");
        Line(text, "", "today", "file");
        foreach (var (rule, severity) in Rules())
        {
            Line(text, $"{rule.Replace('_', ' ')}, {Words.Of(severity)}", Count(Now, rule, severity), Count(Other, rule, severity));
        }

        foreach (var (now, other) in Now.Contacts.Zip(Other.Contacts))
        {
            Line(text, $"raised for {now.Contact} ({now.People} people), a day", Number(now.ADay), Number(other.ADay));
            Line(text, "    most on one date", Whole(now.MostOnADay), Whole(other.MostOnADay));
        }

        Line(text, "chatter (3 changes within 7 days)", Whole(Now.Chatter), Whole(Other.Chatter));
        Line(text, "standing on the last date", Whole(Now.Standing), Whole(Other.Standing));
        Line(text, "    for longer than 14 days", Whole(Now.StandingLong), Whole(Other.StandingLong));
        foreach (var (now, other) in Now.Leads.Zip(Other.Leads))
        {
            Line(text, $"days ahead of {now.Mark.Person} on {Words.Date(now.Mark.Date)}", Lead(now), Lead(other));
        }

        return text.ToString();
    }

    public string Json() => Words.Line(new
    {
        From = Words.Date(From),
        To = Words.Date(To),
        Now.Days,
        Today = Part(Now),
        File = Part(Other),
    }) + "\n";

    private static object Part(ReplayFigures figures) => new
    {
        Raised = figures.Raised.Select(one => new { one.Rule, Severity = Words.Of(one.Severity), one.Count }).ToList(),
        Contacts = figures.Contacts.Select(one => new { one.Contact, one.People, one.Raised, ADay = Math.Round(one.ADay, 6), one.MostOnADay }).ToList(),
        figures.Chatter,
        figures.Standing,
        figures.StandingLong,
        Leads = figures.Leads.Select(lead => new { lead.Mark.Person, Date = Words.Date(lead.Mark.Date), lead.Days }).ToList(),
    };

    private IEnumerable<(string Rule, Severity Severity)> Rules() => RuleBook.All
        .SelectMany(rule => new[] { Severity.Notice, Severity.Warning }.Select(severity => (rule.Name, severity)))
        .Where(one => Now.Raised.Concat(Other.Raised).Any(raised => raised.Rule == one.Name && raised.Severity == one.severity));

    private static string Count(ReplayFigures figures, string rule, Severity severity) =>
        Whole(figures.Raised.Where(one => one.Rule == rule && one.Severity == severity).Sum(one => one.Count));

    private static string Lead(Lead lead) => lead.Days is { } days ? Whole(days) : "none";

    private static string Number(double value) => value.ToString("0.00", CultureInfo.InvariantCulture);

    private static string Whole(int value) => value.ToString(CultureInfo.InvariantCulture);

    private static void Line(StringBuilder text, string name, string now, string other) =>
        text.Append(CultureInfo.InvariantCulture, $"{name.PadRight(NameWidth)}{now,10}{other,10}\n");
}
