using System.Globalization;
using LoadWatch.Notices;
using LoadWatch.People;
using static LoadWatch.Tests.MorningExamples;

namespace LoadWatch.Tests.Notices;

public sealed class BriefTextTests
{
    private const string Accepted = """
        Morning brief for Ada Merriweather, Sunday 1 March 2026
        Data up to Saturday 28 February 2026

        1 of 2 to look at: 1 well above their usual. 1 person without a known day in
        the last week. 1 question needs an answer.

        TO LOOK AT
        - Ann Tarrow (warning, new): Load of the last 7 days is 1.94 times the usual
          week since 27 February; consider comparing with what was planned: an
          easier day, or keeping the plan if it was meant; when: before the next
          hard session, within a day; decides: you and the person.
          56 days to 28 Feb. The last 7 days: 480 AU; a usual week: 400 AU, the
          middle half of 7 weeks. Load on 42 days, the highest 80 AU on 28 Feb; none
          on 14. Heavy or fast leg work on 14 days, the last on 27 Feb.

        NO LONGER TO LOOK AT
        - Ben Ollery: Heavy or fast leg work is back.

        NEEDS AN ANSWER
        - 2026-02-28.fit: Nobody is named as its owner.

        EVERYBODY
        * to look at. ? unknown. + so far, of the known days. Known: days of the
        last 7. Legs: days since the last heavy-or-fast leg day.

        Rowing squad, load in AU
          Name                          Week   Usual  Times  Known  Legs     Last
        * Ann Tarrow                     480     400   1.20      7     1   28 Feb
          Ben Ollery                       ?       ?      ?      0     ?        ?
            Nothing recorded yet.

        HOW TO READ THIS

        """;

    [Fact]
    public void TheTextOfASmallBriefIsAsAccepted()
    {
        var text = BriefText.Write(SmallBrief());
        Assert.Equal(Accepted.ReplaceLineEndings("\n"), text[..(text.IndexOf("THIS\n", StringComparison.Ordinal) + 5)]);
        Assert.EndsWith("follows their clinician and local\n  guidelines.\n", text, StringComparison.Ordinal);
    }

    [Fact]
    public void NoLineIsWiderThanAMailProgramShows() =>
        Assert.All(BriefText.Write(SquadBrief()).Split('\n'), line => Assert.InRange(line.Length, 0, 76));

    [Fact]
    public void TheCultureOfTheMachineDoesNotMatter()
    {
        var before = CultureInfo.CurrentCulture;
        var expected = BriefText.Write(SquadBrief());
        try
        {
            CultureInfo.CurrentCulture = new CultureInfo("fi-FI");
            Assert.Equal(expected, BriefText.Write(SquadBrief()));
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    [Theory]
    [InlineData("risk")]
    [InlineData("readiness")]
    [InlineData("score")]
    [InlineData("debt")]
    [InlineData("ready to")]
    [InlineData("safe to")]
    public void TheWordsDescribeChangeAndNoProbability(string word)
    {
        Assert.DoesNotContain(word, BriefText.Write(SquadBrief()), StringComparison.OrdinalIgnoreCase);
        Assert.DoesNotContain(word, BriefText.Write(ClassBrief()), StringComparison.OrdinalIgnoreCase);
    }

    [Fact]
    public void TheSubjectHoldsNeitherNamesNorValues()
    {
        Assert.Equal("Morning brief, Sunday 1 March 2026: something to look at", BriefText.Subject(SquadBrief()));
        var quiet = BriefBuilder.Build(Contact(ContactRole.Coach), Today, [Subject("a", "Ann")], []);
        Assert.Equal("Morning brief, Sunday 1 March 2026: all quiet", BriefText.Subject(quiet));
        var asked = BriefBuilder.Build(Contact(ContactRole.Coach), Today, [Subject("a", "Ann")], [new BriefLine("x.fit", "whose?")]);
        Assert.Equal("Morning brief, Sunday 1 March 2026: something needs an answer", BriefText.Subject(asked));
    }

    [Fact]
    public void ALongNameIsCutInTheTableOnly()
    {
        const string Name = "Maximiliana Theodosia von Hohenkirchen-Altwasser";
        var text = BriefText.Write(BriefBuilder.Build(Contact(ContactRole.Coach), Today, [Subject("a", Name, Silence("a"))], []));
        Assert.Contains($"- {Name} (notice, since 27 Feb):\n", text, StringComparison.Ordinal);
        Assert.Contains("* Maximiliana Theodosia von…  ", text, StringComparison.Ordinal);
    }

    internal static Brief SmallBrief() => BriefBuilder.Build(
        Contact(ContactRole.Coach),
        Today,
        [Subject("a", "Ann Tarrow", LoadRatio("a")), Subject("b", "Ben Ollery", Over(StimulusGap("b"))) with { Days = [] }],
        [new BriefLine("2026-02-28.fit", "nobody is named as its owner")]);
}
