using System.Text.Encodings.Web;
using System.Text.Json;
using LoadWatch.Alerts;
using LoadWatch.Notices;
using LoadWatch.People;
using static LoadWatch.Tests.MorningExamples;

namespace LoadWatch.Tests.Notices;

public sealed class MailNamesTests
{
    private static readonly JsonSerializerOptions Readable = new() { Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping };

    private static readonly Person[] Roster =
    [
        Person("anna", "Anna Kivi"), Person("ak", "Aino Katri Koski"), Person("r7", "Håkon Öhlund"), Person("17", "Bo Lind"), Person("zoe", "Zoe Ward"),
    ];

    [Fact]
    public void FullNamesLeaveTheBriefAsItIs()
    {
        var brief = Squad();

        Assert.Same(brief, MailNames.Of(brief, NamesShown.Full, Roster));
    }

    [Fact]
    public void InitialsStandInEveryPlaceOfAName()
    {
        var brief = MailNames.Of(Squad(), NamesShown.Initials, Roster);

        Assert.Equal(["A. K. 1", "A. K. 2", "B. L.", "H. Ö."], brief.Groups[0].Rows.Select(row => row.Name).Order(StringComparer.Ordinal));
        Assert.Equal(("A. K. 2", "A. K. 2"), (brief.Flagged[0].Name, brief.Flagged[0].PersonId));
        Assert.Equal("H. Ö.", Assert.Single(brief.Returned).Subject);
        Assert.Equal("Ada Merriweather", brief.ContactName);
    }

    [Theory]
    [InlineData("anna/ride.fit", "A. K. 2/ride.fit")]
    [InlineData("2026/ANNA/Kivi_Anna_2026-03-01.fit", "2026/A. K. 2/K._A. K. 2_2026-03-01.fit")]
    [InlineData("anna.fit", "A. K. 2.fit")]
    [InlineData("pods/Anna Kivi.zip!/17/part.fit", "pods/A. K. 2.zip!/B. L./part.fit")]
    [InlineData("AnnaKivi2026.fit", "A. K. 2 2026.fit")]
    [InlineData("annabel/savannah.fit", "annabel/savannah.fit")]
    [InlineData("lind_bo.fit", "L._B.fit")]
    [InlineData("r7/r70.fit", "H. Ö./r70.fit")]
    [InlineData("Ha\u030Akon.fit", "H.fit")]
    [InlineData("zoe/17.fit", "somebody else/B. L.fit")]
    public void AFileNameShowsNoName(string path, string expected) => Assert.Equal(expected, Question(path, "x").Subject);

    [Theory]
    [InlineData("held: claimed by ak and anna", "Held: claimed by A. K. 1 and A. K. 2.")]
    [InlineData("held: claimed by anna and r7", "Held: claimed by A. K. 2 and H. Ö.")]
    [InlineData("line 17, column 3 (person): \"Kivi\" is not in the roster", "Line 17, column 3 (person): \"K.\" is not in the roster.")]
    [InlineData("claimed by r7 and zoe", "Claimed by H. Ö. and somebody else.")]
    [InlineData("a bowl of lind tea", "A bowl of lind tea.")]
    public void AReasonShowsNoName(string reason, string expected) => Assert.Equal(expected, Question("x.fit", reason).Sentence);

    [Fact]
    public void ASentenceAboutSomebodyShowsNoName()
    {
        var alert = LoadRatio("anna");
        var subject = Subject("anna", "Anna Kivi", alert with { Alert = alert.Alert with { Text = "Anna Kivi did 17 runs, ANNA says" } }) with { Remarks = ["with håkon öhlund on the boat"] };
        var brief = MailNames.Of(Build(Contact(ContactRole.Coach), subject), NamesShown.Initials, Roster);

        Assert.Equal("A. K. did 17 runs, A. K. says.", brief.Flagged[0].Reasons[0].Sentence);
        Assert.Contains("with somebody else on the boat", brief.Groups[0].Rows[0].Remark, StringComparison.Ordinal);
    }

    [Fact]
    public void PeopleWithoutALetterAreToldApart()
    {
        Person[] people = [Person("x1", "\U0001F600"), Person("x2", "***")];
        var brief = Build(Contact(ContactRole.Coach), [.. people.Select(person => Subject(person.Id, person.Name))]);

        Assert.Equal(["Somebody 1", "Somebody 2"], MailNames.Of(brief, NamesShown.Initials, people).Groups[0].Rows.Select(row => row.Name).Order(StringComparer.Ordinal));
    }

    [Fact]
    public void OneselfStaysYouAndIsNotGreetedByName()
    {
        var contact = Oneself("anna") with { Name = "Anna" };
        var brief = BriefBuilder.Build(contact, Today, [Subject("anna", "Anna Kivi", LoadRatio("anna"), Over(Silence("anna")))], [new BriefLine("anna/cut.fit", "refused")]);

        var mailed = MailNames.Of(brief, NamesShown.Initials, Roster);

        Assert.Equal(("You", "You", "You", "you"), (mailed.Flagged[0].Name, mailed.Returned[0].Subject, mailed.Groups[0].Rows[0].Name, mailed.ContactName));
        Assert.Equal("A. K./cut.fit", mailed.Questions[0].Subject);
    }

    [Fact]
    public void WithoutNamesThereAreCountsAndNoRows()
    {
        var text = BriefText.Write(MailNames.Of(Squad(), NamesShown.None, Roster)).ReplaceLineEndings(" ");

        Assert.StartsWith(
            "Morning brief for you, Sunday 1 March 2026 Data up to Saturday 28 February 2026  "
            + "1 of 4 to look at: 1 well above their usual. 1 question needs an answer. No longer to look at: 1. The page has the rest.  HOW TO READ THIS",
            text,
            StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(NamesShown.Initials)]
    [InlineData(NamesShown.None)]
    public void NoNameOrIdIsLeftAnywhereInTheBrief(NamesShown names)
    {
        var brief = JsonSerializer.Serialize(MailNames.Of(Squad(), names, Roster), Readable);

        string[] words = ["Anna", "Kivi", "Aino", "Katri", "Koski", "Håkon", "Öhlund", "Lind", "\"ak\"", "\"r7\"", "\"17\""];
        Assert.All(words, word => Assert.DoesNotContain(word, brief, StringComparison.OrdinalIgnoreCase));
    }

    private static Brief Squad() => Build(
        Contact(ContactRole.Coach),
        [new BriefLine("anna/cut.fit", "refused: claimed by ak and anna")],
        Subject("anna", "Anna Kivi", LoadRatio("anna")),
        Subject("ak", "Aino Katri Koski"),
        Subject("r7", "Håkon Öhlund", Over(LoadRatio("r7"))),
        Subject("17", "Bo Lind"));

    private static BriefLine Question(string path, string reason) => Assert.Single(MailNames.Of(
        Build(Contact(ContactRole.Coach), [new BriefLine(path, reason)], [.. Roster.Where(person => person.Id != "zoe").Select(person => Subject(person.Id, person.Name))]),
        NamesShown.Initials,
        Roster).Questions);

    private static Brief Build(Contact contact, params BriefSubject[] subjects) => Build(contact, [], subjects);

    private static Brief Build(Contact contact, BriefLine[] questions, params BriefSubject[] subjects) => BriefBuilder.Build(contact, Today, subjects, questions);
}
