using System.Net;
using System.Text.RegularExpressions;
using LoadWatch.Alerts;
using LoadWatch.Delivery.Page;
using LoadWatch.Findings;
using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Tests;
using static LoadWatch.Tests.MorningExamples;

namespace LoadWatch.Delivery.Tests;

/// <summary>What coach and front desk are sent says nothing of anybody's health (I-12), whatever is known of it.</summary>
public sealed partial class HealthWordsTests
{
    private static readonly BriefSubject[] People =
    [
        Subject("ann", "Ann Tarrow", Test("ann", AlertState.Unacknowledged)),
        Subject("ben", "Ben Ollery", Test("ben", AlertState.Acknowledged), LoadRatio("ben")),
        Subject("cas", "Cas Weir", Over(Test("cas", AlertState.Returned))),
        Subject("dot", "Dot Lamb", Over(Test("dot", AlertState.Returned), corrected: true), Silence("dot")),
        Absent("eve", "Eve Moss", AbsenceWord.Ill, Over(LoadRatio("eve"))),
        Absent("fay", "Fay Nunn", AbsenceWord.Injured),
    ];

    public static TheoryData<ContactRole, BriefForm[]> RolesAndForms =>
    [
        .. from role in new[] { ContactRole.Coach, ContactRole.FrontDesk }
           from forms in Enum.GetValues<BriefForm>().Select(form => new[] { form }).Append(Enum.GetValues<BriefForm>())
           select (role, forms),
    ];

    [Theory]
    [MemberData(nameof(RolesAndForms))]
    public void CoachAndFrontDeskReadNoWordOfHealthInAnyForm(ContactRole role, BriefForm[] forms)
    {
        // A Monday, so that week and call list are there, too; everybody is planned.
        var monday = Today.PlusDays(1);
        BriefSubject[] planned = [.. People.Select(subject => subject with { Planned = [new PlanEntry(PlanWord.Class, monday, monday, null, null, true, null)], Today = subject.Days[^1].Plan })];
        var brief = BriefBuilder.Build(Contact(role) with { Forms = forms }, monday, planned, []);

        foreach (var names in Enum.GetValues<NamesShown>())
        {
            var sent = MailNames.Of(brief, names, People.Select(subject => subject.Person));
            var texts = new[] { BriefText.Subject(sent), BriefText.UpdateSubject(sent), Text(sent), Page(sent) };
            Assert.All(texts, text => Assert.DoesNotMatch(OfHealth(), text));
        }
    }

    [Fact]
    public void TheClinicianReadsThem()
    {
        var brief = BriefBuilder.Build(Contact(ContactRole.Clinician), Today, People, []);

        Assert.Matches(OfHealth(), Text(brief));
        Assert.Matches(OfHealth(), Page(brief));
        Assert.Equal("3 of 6 to look at: 1 well above their usual, 1 silent, 1 with a function test to look at.", brief.FirstLine);

        var monday = Today.PlusDays(1);
        foreach (var form in new[] { BriefForm.CallList, BriefForm.ClassSheet })
        {
            BriefSubject[] planned = [.. People.Select(subject => subject with { Planned = [new PlanEntry(PlanWord.Class, monday, monday, null, null, true, null)] })];
            Assert.Matches(OfHealth(), Text(BriefBuilder.Build(Contact(ContactRole.Clinician) with { Forms = [form] }, monday, planned, [])));
        }
    }

    [Theory]
    [InlineData(ContactRole.Coach)]
    [InlineData(ContactRole.FrontDesk)]
    [InlineData(ContactRole.Physiotherapist)]
    public void ATestOfFunctionCountsNowhereForOthers(ContactRole role)
    {
        var told = BriefBuilder.Build(Contact(role), Today, People, []);

        Assert.Equal("2 of 6 to look at: 1 well above their usual, 1 silent.", told.FirstLine);
        Assert.Equal(["Ben Ollery", "Dot Lamb"], told.Flagged.Select(person => person.Name));
        Assert.All(told.Flagged, person => Assert.Single(person.Reasons));
        Assert.Equal("Eve Moss", Assert.Single(told.Returned).Subject);
        Assert.Equal([false, true, false, true, false, false], told.Groups[0].Rows.Select(row => row.Flagged));
    }

    private static BriefSubject Absent(string id, string name, AbsenceWord word, params AlertNews[] alerts) => Subject(id, name, alerts) with
    {
        Days = [.. QuietDays(id, 60).Select(day => day with { Plan = DayPlan.None with { Absence = word } })],
    };

    private static AlertNews Test(string person, AlertState state) => News(
        person, FunctionTestRule.RuleName, null, Severity.Warning, state, "chair stand test fell from 14 to 9; illness, injury and pain reported, diagnosis open", isNew: true);

    /// <summary>Without the cautions, which are the same for everybody.</summary>
    private static string Text(Brief brief)
    {
        var text = BriefText.Write(brief);
        var foot = text.IndexOf("\nPLEASE MIND\n", StringComparison.Ordinal);
        return text[..foot];
    }

    private static string Page(Brief brief)
    {
        var page = WebUtility.HtmlDecode(PageRenderer.Render(brief));
        foreach (var caution in ReadingNotes.Cautions)
        {
            Assert.Contains(caution, page, StringComparison.Ordinal);
            page = page.Replace(caution, "", StringComparison.Ordinal);
        }

        return page;
    }

    [GeneratedRegex(
        @"\b(ill|illness(es)?|sick(ness)?|injur(y|ies|ed)|tests?|tested|pain(ful)?|hurt|diagnos(is|es|ed)|disease|disorder|symptoms?|medic(al|ine|ation)|drugs?|patients?|surgery|hospital|"
        + @"infection|fever|frail(ty)?|pregnan(t|cy)|concussion|rehab(ilitation)?|health|unwell|chair stand|grip)\b",
        RegexOptions.IgnoreCase | RegexOptions.ExplicitCapture)]
    private static partial Regex OfHealth();
}
