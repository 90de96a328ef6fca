using System.Globalization;
using System.Text;
using LoadWatch.Findings;
using LoadWatch.Replays;
using LoadWatch.Service.Export;
using NodaTime;

namespace LoadWatch.Service.Commands;

/// <summary>The figures of today's limits and of others, side by side, beside what was really told.</summary>
public sealed record ReplayComparison(LocalDate From, LocalDate To, ReplayFigures Told, ReplayFigures Now, ReplayFigures Other)
{
    private const int NameWidth = 46;
    private const int ColumnWidth = 17;

    public string Text()
    {
        var text = new StringBuilder();
        text.Append(CultureInfo.InvariantCulture, $"{Words.Date(From)} to {Words.Date(To)}, {Now.Days} days\n");
        text.Append("today, file: by today's limits and by the file's, as if every recording had come on its day and every alert had been seen by the next night\n");
        text.Append("told: what was really raised, with late files and answers; of what a first import brought, what stood on its day alone\n\n");
        Line(text, "", "told", "today", "file");
        foreach (var (rule, severity) in Rules())
        {
            Row(text, $"{rule.Replace('_', ' ')}, {Words.Of(severity)}", figures => Count(figures, rule, severity));
        }

        for (var at = 0; at < Now.Contacts.Count; at++)
        {
            var place = at;
            Row(text, $"raised for {Now.Contacts[at].Contact} ({Now.Contacts[at].People} people), a day", figures => Number(figures.Contacts[place].ADay));
            Row(text, "    most on one date", figures => Whole(figures.Contacts[place].MostOnADay));
        }

        Row(text, $"chatter ({Chatter.ChangesWanted} changes within {Chatter.Days} days)", figures => Whole(figures.Wavering));
        Row(text, "corrected by later files", figures => Whole(figures.Corrected));
        Row(text, "standing on the last date", figures => Whole(figures.Standing));
        Row(text, "    for longer than 14 days", figures => Whole(figures.StandingLong));
        for (var at = 0; at < Now.Leads.Count; at++)
        {
            var (place, mark) = (at, Now.Leads[at].Mark);
            Row(text, $"days ahead of {mark.Person} on {Words.Date(mark.Date)}", figures => Lead(figures.Leads[place]));
            Row(text, "    by the rule", figures => figures.Leads[place].Rule ?? "-");
        }

        return text.ToString();
    }

    public string Json() => Words.Line(new
    {
        From = Words.Date(From),
        To = Words.Date(To),
        Now.Days,
        Told = Part(Told),
        Today = Part(Now),
        File = Part(Other),
    }) + "\n";

    private static object Part(ReplayFigures figures) => new
    {
        Raised = figures.Raised.Select(one => new { one.Rule, Severity = Words.Of(one.Severity), one.Count }).ToList(),
        Contacts = figures.Contacts.Select(one => new { one.Contact, one.People, one.Raised, ADay = Math.Round(one.ADay, 6), one.MostOnADay }).ToList(),
        Chatter = figures.Wavering,
        figures.Corrected,
        figures.Standing,
        figures.StandingLong,
        Leads = figures.Leads.Select(lead => new { lead.Mark.Person, Date = Words.Date(lead.Mark.Date), lead.Days, lead.Rule }).ToList(),
    };

    private IEnumerable<(string Rule, Severity Severity)> Rules() => RuleBook.All
        .SelectMany(rule => new[] { Severity.Notice, Severity.Warning }.Select(severity => (rule.Name, severity)))
        .Where(one => Told.Raised.Concat(Now.Raised).Concat(Other.Raised).Any(raised => raised.Rule == one.Name && raised.Severity == one.severity));

    private static string Count(ReplayFigures figures, string rule, Severity severity) =>
        Whole(figures.Raised.Where(one => one.Rule == rule && one.Severity == severity).Sum(one => one.Count));

    private static string Lead(Lead lead) => lead.Days is { } days ? Whole(days) : "none";

    private static string Number(double value) => value.ToString("0.00", CultureInfo.InvariantCulture);

    private static string Whole(int value) => value.ToString(CultureInfo.InvariantCulture);

    private void Row(StringBuilder text, string name, Func<ReplayFigures, string> figure) => Line(text, name, figure(Told), figure(Now), figure(Other));

    private static void Line(StringBuilder text, string name, string told, string now, string other) =>
        text.Append(CultureInfo.InvariantCulture, $"{name.PadRight(NameWidth)}{told,ColumnWidth}{now,ColumnWidth}{other,ColumnWidth}\n");
}
