using LoadWatch.Alerts;
using LoadWatch.Findings;
using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Stimulus;
using NodaTime;
using static LoadWatch.Tests.MorningExamples;

namespace LoadWatch.Tests.Notices;

/// <summary>1 March 2026 is a Sunday, 2 March a Monday.</summary>
public sealed class BriefFormsTests
{
    private static readonly LocalDate Monday = new(2026, 3, 2);

    [Theory]
    [InlineData(ContactRole.Coach, 7, new[] { BriefForm.Daily })]
    [InlineData(ContactRole.Coach, 2, new[] { BriefForm.Daily, BriefForm.Weekly })]
    [InlineData(ContactRole.Physiotherapist, 5, new[] { BriefForm.Daily })]
    [InlineData(ContactRole.Self, 1, new[] { BriefForm.Daily, BriefForm.Weekly })]
    [InlineData(ContactRole.Clinician, 7, new[] { BriefForm.Daily, BriefForm.CallList })]
    [InlineData(ContactRole.Clinician, 1, new[] { BriefForm.Daily, BriefForm.Weekly, BriefForm.CallList })]
    [InlineData(ContactRole.FrontDesk, 7, new[] { BriefForm.CallList, BriefForm.ClassSheet })]
    [InlineData(ContactRole.FrontDesk, 1, new[] { BriefForm.CallList, BriefForm.ClassSheet })]
    public void WhoNamesNoFormGetsWhatIsUsualForTheRole(ContactRole role, int days, BriefForm[] expected) => Assert.Equal(expected, BriefForms.Usual(role, days));

    [Fact]
    public void WeekAndCallListComeWithTheFirstBriefOfTheWeek()
    {
        Assert.Equal(Enum.GetValues<BriefForm>(), BriefForms.On(Everything(), Monday).Order());
        Assert.Equal([BriefForm.Daily, BriefForm.ClassSheet], BriefForms.On(Everything(), Monday.PlusDays(1)).Order());
        Assert.Equal([BriefForm.Daily, BriefForm.ClassSheet], BriefForms.On(Everything(), Monday.PlusDays(6)).Order());
    }

    /// <summary>Whoever reads on Wednesdays and Fridays: Wednesday's page stands until Friday's brief, Friday's until Wednesday's.</summary>
    [Theory]
    [InlineData(1, false)]
    [InlineData(2, true)]
    [InlineData(3, true)]
    [InlineData(4, false)]
    [InlineData(6, false)]
    public void BetweenTwoBriefsThePageKeepsWhatTheLastOneHeld(int afterMonday, bool hasWeek)
    {
        var contact = Everything() with { BriefDays = new HashSet<IsoDayOfWeek> { IsoDayOfWeek.Wednesday, IsoDayOfWeek.Friday } };
        Assert.Equal(hasWeek, BriefForms.On(contact, Monday.PlusDays(afterMonday)).Contains(BriefForm.Weekly));
    }

    /// <summary>Each person of QuietDays trains 80 on three of four days; two weeks before yesterday hold 6 and 5 such days: 480 against 400.</summary>
    [Fact]
    public void TheWeekStandsBesideTheWeekBeforeGroupByGroup()
    {
        var week = Build(Everything() with { Forms = [BriefForm.Weekly] }, Subject("a", "Ann"), Subject("b", "Ben")).Week!;

        Assert.Equal((new LocalDate(2026, 2, 22), Yesterday), (week.From, week.To));
        var group = Assert.Single(week.Groups);
        Assert.Equal("Rowing squad", group.Name);
        Assert.Equal(
            [
                "Load: 960 AU against 800 on the same days of the week before (+20 %); 14 of 14 days are known in both weeks.",
                "Days with training: 12 against 10.",
                "Heavy-or-fast leg days: 4 against 4, on 14 days that are known in both weeks.",
                "Coverage: 14 of 14 days known.",
            ],
            group.Sentences);
        Assert.Empty(week.Standing);
        Assert.Empty(week.Lost);
    }

    [Fact]
    public void AnUnknownDayTakesTheSameDayOfTheWeekBeforeOutOfTheComparison()
    {
        var unknown = Subject("a", "Ann") with { Days = Trends("a", 60, back => back == 0 ? null : back < 7 ? 60 : 50, back => back == 0 ? null : false) };
        var sentences = Build(Everything(), unknown).Week!.Groups[0].Sentences;

        // Six days of 60 against the same six of 50.
        Assert.Equal("Load: 360 AU against 300 on the same days of the week before (+20 %); 6 of 7 days are known in both weeks.", sentences[0]);
        Assert.Equal("Coverage: 6 of 7 days known.", sentences[3]);
    }

    [Fact]
    public void NothingKnownIsNoChange()
    {
        var sentences = Build(Everything(), Subject("a", "Ann") with { Days = Trends("a", 60, _ => null, _ => null) }).Week!.Groups[0].Sentences;
        Assert.Equal("Load: no day of the week is known together with the same day of the week before.", sentences[0]);
        Assert.Equal("Heavy-or-fast leg days: unknown.", sentences[2]);
    }

    /// <summary>27 February is 3 days before the Monday of the brief, 15 February 15 days.</summary>
    [Fact]
    public void WhatNobodyAcknowledgedForMoreThanAFortnightIsListed()
    {
        var old = StimulusGap("b") with { Alert = StimulusGap("b").Alert with { StandsSince = new LocalDate(2026, 2, 15) } };
        var seen = StimulusGap("c", state: AlertState.Acknowledged) with { Alert = StimulusGap("c", state: AlertState.Acknowledged).Alert with { StandsSince = new LocalDate(2026, 1, 15) } };
        var week = Build(Everything(), Subject("a", "Ann", LoadRatio("a")), Subject("b", "Ben", old), Subject("c", "Cas", seen)).Week!;

        Assert.Equal([new BriefLine("Ben", "No heavy or fast leg work lately: standing since 15 Feb, 15 days, and not acknowledged.")], week.Standing);
    }

    [Fact]
    public void WhoLostHeavyLegWorkIsNamedWithBothNumbers()
    {
        var less = Subject("a", "Ann") with { Days = Trends("a", 90, _ => 80, back => back < 28 ? back == 20 : back % 4 == 0) };
        var unseen = Subject("b", "Ben") with { Days = Trends("b", 90, _ => 80, back => back < 12 ? null : back < 28 ? back == 20 : back % 4 == 0) };
        var never = Subject("c", "Cas") with { Days = Trends("c", 90, _ => 80, back => back > 28 && back % 12 == 0) };

        Assert.Equal([new BriefLine("Ann", "Heavy or fast leg work on 1 of the last 28 days, on 7 of the 28 before.")], Build(Everything(), less, unseen, never).Week!.Lost);
    }

    /// <summary>It is the sentence that stands large: "nothing to act on" would hide the list below it.</summary>
    [Fact]
    public void SomebodyToCallIsToldFirstWhereThereIsNothingElse() => Assert.StartsWith(
        "1 person to call. Nothing else to act on for 2 people.",
        Build(Everything() with { Forms = [BriefForm.Daily, BriefForm.CallList] }, Subject("a", "Ann", Silence("a")), Subject("b", "Ben")).FirstLine,
        StringComparison.Ordinal);

    [Fact]
    public void TheCallListSaysSinceWhenAndWhy()
    {
        var gone = Subject("b", "Ben", Silence("b")) with { Days = Trends("b", 60, back => back < 6 ? null : 80, back => back < 6 ? null : back % 4 == 1) };
        var gap = Subject("c", "Cas", StimulusGap("c")) with { Days = Trends("c", 60, _ => 80, back => back == 11) };
        var calls = Build(Everything(), Subject("a", "Ann", LoadRatio("a")), gap, gone).Calls!;

        Assert.Equal(
            [
                new Call("b", "Ben", new LocalDate(2026, 2, 22), "No recording since 22 February, 6 days."),
                new Call("c", "Cas", Yesterday, "No heavy or fast leg work since 17 February, 11 days."),
            ],
            calls.Calls);
    }

    [Fact]
    public void ATestThatFellIsForTheClinicianToCallAbout()
    {
        var test = Subject("a", "Ann", News("a", FunctionTestRule.RuleName, null, Severity.Notice, AlertState.Unacknowledged, "Gait speed 0.7 m/s on 20 February: slower than 0.8 m/s.", true));
        Assert.Equal("Gait speed 0.7 m/s on 20 February: slower than 0.8 m/s.", Assert.Single(Build(Everything() with { Role = ContactRole.Clinician }, test).Calls!.Calls).Why);
        foreach (var role in new[] { ContactRole.FrontDesk, ContactRole.Coach, ContactRole.Physiotherapist })
        {
            Assert.Empty(Build(Everything() with { Role = role }, test).Calls!.Calls);
        }
    }

    [Fact]
    public void WhoIsAwayOrInSomebodysHandsIsNotCalled()
    {
        var away = Subject("a", "Ann", Silence("a")) with { Today = DayPlan.None with { Absence = AbsenceWord.Ill } };
        Assert.Empty(Build(Everything(), away, Subject("b", "Ben", Silence("b", AlertState.Acknowledged))).Calls!.Calls);
    }

    /// <summary>Ten rows in all: whoever is only to be called is not named a second time above.</summary>
    [Theory]
    [InlineData(3, 20, 3, 7)]
    [InlineData(9, 20, 5, 5)]
    [InlineData(9, 2, 8, 2)]
    public void ThoseToLookAtAndThoseToCallShareTheRows(int high, int gaps, int flagged, int called)
    {
        var brief = Build(
            Everything(),
            [
                .. Enumerable.Range(0, high).Select(n => Subject($"h{n:00}", $"H {n:00}", LoadRatio($"h{n:00}"))),
                .. Enumerable.Range(0, gaps).Select(n => Subject($"g{n:00}", $"G {n:00}", StimulusGap($"g{n:00}"))),
            ]);
        Assert.Equal((flagged, called), (brief.Flagged.Count, brief.Calls!.Calls.Count));
        Assert.Equal((high - flagged, gaps - called), (brief.FlaggedBeyond, brief.Calls.Beyond));
        Assert.StartsWith($"{high} of {high + gaps} to look at: {high} well above their usual.", brief.FirstLine, StringComparison.Ordinal);
    }

    [Fact]
    public void TenAreToBeCalledAtMostAndWhoHasMoreReasonsIsAmongThem()
    {
        BriefSubject[] people = [.. Enumerable.Range(1, 14).Select(n => Subject($"p{n:00}", $"P {n:00}", n > 12 ? [StimulusGap($"p{n:00}"), Silence($"p{n:00}")] : [StimulusGap($"p{n:00}")]))];
        var calls = Build(Everything(), people).Calls!;
        Assert.Equal((10, 4), (calls.Calls.Count, calls.Beyond));
        Assert.Equal(["P 13", "P 14"], calls.Calls.TakeLast(2).Select(call => call.Name));
    }

    [Fact]
    public void TheSheetHoldsWhoIsPlannedTodayWithAShortNote()
    {
        var sheets = Build(
            Everything() with { Role = ContactRole.FrontDesk },
            Planned(Subject("d", "Dot")),
            Planned(Subject("b", "Ben", StimulusGap("b"), LoadRatio("b"), Silence("b"))),
            Planned(Subject("a", "Ann")) with { Today = DayPlan.None with { Absence = AbsenceWord.Injured } },
            Planned(Subject("c", "Cas")) with { Today = DayPlan.None with { ReturnDay = 3 } },
            Subject("e", "Eve")).Sheets;

        var sheet = Assert.Single(sheets);
        Assert.Equal("Rowing squad, class from 10:00 to 11:00", sheet.Heading);
        Assert.Equal(
            [
                new ClassPerson("a", "Ann", "Away.", true),
                new ClassPerson("b", "Ben", "Load well above the usual; no heavy or fast leg work since 27 February, 2 days; and 1 more.", false),
                new ClassPerson("c", "Cas", "Returning, day 3.", false),
                new ClassPerson("d", "Dot", null, false),
            ],
            sheet.People);
    }

    [Fact]
    public void SessionsOfADayAreSheetsOfTheirOwnInTheOrderOfTime()
    {
        var late = new PlanEntry(PlanWord.TeamSession, Monday, Monday, new LocalTime(17, 0), null, true, null);
        var camp = new PlanEntry(PlanWord.Camp, Monday, Monday, null, null, false, null);
        var sheets = Build(Everything(), Subject("b", "Ben") with { Planned = [late, camp] }, Planned(Subject("a", "Ann"))).Sheets;
        Assert.Equal(["Rowing squad, class from 10:00 to 11:00", "Rowing squad, team session at 17:00"], sheets.Select(sheet => sheet.Heading));
    }

    [Theory]
    [InlineData(0, 0, "No session is planned today. Nobody to call.")]
    [InlineData(3, 0, "3 people planned today. Nobody to call.")]
    [InlineData(3, 1, "3 people planned today, 1 of them away. Nobody to call.")]
    public void TheFirstLineOfAFrontDeskCountsTheDay(int planned, int away, string expected)
    {
        BriefSubject[] people =
        [
            .. Enumerable.Range(0, planned).Select(n => Planned(Subject($"p{n}", $"P {n}")) with { Today = DayPlan.None with { Absence = n < away ? AbsenceWord.Ill : null } }),
            Subject("z", "Zed", LoadRatio("z")),
        ];
        var brief = Build(Everything() with { Role = ContactRole.FrontDesk, Forms = [BriefForm.CallList, BriefForm.ClassSheet] }, people);
        Assert.Equal(expected, brief.FirstLine);
        Assert.Empty(brief.Flagged);
        Assert.Empty(brief.Groups);
    }

    [Fact]
    public void TheTextOfEveryFormIsAsAccepted()
    {
        var text = BriefText.Write(Build(
            Everything() with { Role = ContactRole.Clinician },
            Planned(Subject("a", "Ann Tarrow")),
            Planned(Subject("b", "Ben Ollery", Silence("b"))) with { Days = Trends("b", 60, back => back < 6 ? null : 80, back => back < 6 ? null : back % 4 == 1) }));
        Assert.Contains(Accepted.ReplaceLineEndings("\n"), text, StringComparison.Ordinal);
    }

    [Fact]
    public void InitialsCoverEveryForm()
    {
        BriefSubject[] people =
        [
            Planned(Subject("tarrow", "Ann Tarrow", StimulusGap("tarrow") with { Alert = StimulusGap("tarrow").Alert with { StandsSince = new LocalDate(2026, 1, 1) } })),
            Planned(Subject("ollery", "Ben Ollery", Silence("ollery"))) with { Days = Trends("ollery", 90, _ => 80, back => back < 28 ? back == 20 : back % 4 == 0) },
        ];
        foreach (var forms in new[] { Enum.GetValues<BriefForm>(), [BriefForm.Weekly, BriefForm.CallList, BriefForm.ClassSheet] })
        {
            var brief = Build(Everything() with { Forms = forms }, people);
            Assert.NotEmpty(brief.Week!.Lost);
            Assert.NotEmpty(brief.Week.Standing);
            var sent = BriefText.Write(MailNames.Of(brief, NamesShown.Initials, people.Select(subject => subject.Person)));
            Assert.DoesNotMatch(@"(?i)tarrow|ollery|\bann\b|\bben\b", sent[..sent.IndexOf("HOW TO READ", StringComparison.Ordinal)]);
            Assert.Contains("- A. T. (last recorded: 28 Feb)", sent, StringComparison.Ordinal);

            var counts = BriefText.Write(MailNames.Of(brief, NamesShown.None, people.Select(subject => subject.Person)));
            Assert.DoesNotContain("TO CALL", counts, StringComparison.Ordinal);
            Assert.DoesNotContain("THE WEEK", counts, StringComparison.Ordinal);
        }
    }

    private const string Accepted = """
        TODAY
        Rowing squad, class from 10:00 to 11:00: 2 people
        - Ann Tarrow
        - Ben Ollery: No recording since 22 February, 7 days.

        TO CALL
        - Ben Ollery (last recorded: 22 Feb): No recording since 22 February, 6
          days.

        THE WEEK
        Sunday 22 February 2026 to Saturday 28 February 2026
        - Rowing squad: Load: 560 AU against 480 on the same days of the week before
          (+17 %); 8 of 14 days are known in both weeks. Days with training: 7
          against 12. Heavy-or-fast leg days: 2 against 3, on 8 days that are known
          in both weeks. Coverage: 8 of 14 days known.
        """;

    private static Contact Everything() => Contact(ContactRole.Coach) with { Forms = Enum.GetValues<BriefForm>() };

    private static BriefSubject Planned(BriefSubject subject) =>
        subject with { Planned = [new PlanEntry(PlanWord.Class, Monday, Monday, new LocalTime(10, 0), new LocalTime(11, 0), true, null)] };

    private static Brief Build(Contact contact, params BriefSubject[] subjects) => BriefBuilder.Build(contact, Monday, subjects, []);
}
