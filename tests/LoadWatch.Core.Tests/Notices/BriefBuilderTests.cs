using LoadWatch.Alerts;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Stimulus;
using NodaTime;
using static LoadWatch.Tests.MorningExamples;

namespace LoadWatch.Tests.Notices;

public sealed class BriefBuilderTests
{
    [Fact]
    public void ThePeopleToLookAtAreCountedByTheGravestReasonInTheFirstLine()
    {
        var brief = Build(
            Subject("a", "Ann", LoadRatio("a"), StimulusGap("a")),
            Subject("b", "Ben", StimulusGap("b")),
            Subject("c", "Cas", Silence("c")),
            Subject("d", "Dot"));
        Assert.Equal("3 of 4 to look at: 1 well above their usual, 1 without heavy or fast leg work, 1 silent.", brief.FirstLine);
    }

    [Fact]
    public void AChangedReferenceValueIsToldAndFlagsNobody()
    {
        var note = new Finding("a", Today, "load_ratio", null, Severity.Note, Today, 1.95, 1.8, "ratio", "Load is high. Reference value changed.", new Evidence("a / b", "a choice", []));
        var brief = Build(Subject("a", "Ann") with { Notes = [note] });

        Assert.Equal("All quiet: 1 person, nothing to act on.", brief.FirstLine);
        Assert.Equal([new BriefLine("Ann", "Load is high. Reference value changed.")], brief.Changed);
        Assert.Contains("REFERENCE VALUE CHANGED\n- Ann: Load is high. Reference value changed.\n", BriefText.Write(brief), StringComparison.Ordinal);
    }

    [Fact]
    public void WhatIsShelvedIsNeitherFlaggedNorCountedAndItsRowSaysUntilWhen()
    {
        var shelved = Silence("c") with { Alert = Silence("c").Alert with { ShelvedUntil = new LocalDate(2026, 3, 3) } };
        var brief = Build(Subject("a", "Ann", LoadRatio("a")), Subject("c", "Cas", shelved));

        Assert.Equal("1 of 2 to look at: 1 well above their usual.", brief.FirstLine);
        Assert.Equal(["a"], brief.Flagged.Select(person => person.PersonId));
        var row = brief.Groups[0].Rows.Single(row => row.PersonId == "c");
        Assert.False(row.Flagged);
        Assert.StartsWith("shelved until 3 Mar: ", row.Remark, StringComparison.Ordinal);
        Assert.Equal("", FlaggedList.Of([shelved.Alert]));
    }

    [Fact]
    public void NothingToActOnIsSaidPlainly()
    {
        Assert.Equal("All quiet: 41 people, nothing to act on.", Build([.. Enumerable.Range(1, 41).Select(n => Subject($"p{n}", $"P {n}"))]).FirstLine);
        Assert.Equal("All quiet: 1 person, nothing to act on.", Build(Subject("a", "Ann")).FirstLine);
        Assert.Equal("Nobody is in this brief yet.", Build().FirstLine);
    }

    [Theory]
    [InlineData(1, "Nothing to act on for 1 person, but 1 question needs an answer.")]
    [InlineData(2, "Nothing to act on for 1 person, but 2 questions need an answer.")]
    public void FilesThatNeedAnAnswerAreMentioned(int files, string expected)
    {
        var questions = Enumerable.Range(1, files).Select(n => new BriefLine($"{n}.fit", "nobody is named as its owner")).ToList();
        Assert.Equal(expected, BriefBuilder.Build(Contact(ContactRole.Coach), Today, [Subject("a", "Ann")], questions).FirstLine);
    }

    [Fact]
    public void QuietWithoutDataIsNotCalledQuietAlone()
    {
        var unknown = Subject("b", "Ben") with { Days = Trends("b", 60, back => back < 7 ? null : 80, _ => null) };
        Assert.Equal("Nothing to act on for 2 people. 1 person without a known day in the last week.", Build(Subject("a", "Ann"), unknown).FirstLine);
    }

    [Fact]
    public void TheSubjectCallsNothingQuietWhereTheFirstLineNamesUnknownPeople()
    {
        var unknown = Subject("b", "Ben") with { Days = Trends("b", 60, back => back < 7 ? null : 80, _ => null) };
        Assert.Equal("Morning brief, Sunday 1 March 2026: nothing to act on, some unknown", BriefText.Subject(Build(Subject("a", "Ann"), unknown)));
        Assert.Equal("Morning brief, Sunday 1 March 2026: nothing to act on, some unknown", BriefText.Subject(BriefBuilder.Build(Oneself("b"), Today, [unknown], [])));
        var known = Subject("b", "Ben") with { Days = Trends("b", 60, back => back == 6 ? 80 : null, _ => null) };
        Assert.Equal("Morning brief, Sunday 1 March 2026: all quiet", BriefText.Subject(Build(Subject("a", "Ann"), known)));
    }

    [Fact]
    public void WhatIsToBeDoneComesBeforeWhatIsUnknownInTheSubject()
    {
        var unknown = Subject("b", "Ben") with { Days = Trends("b", 60, back => back < 7 ? null : 80, _ => null) };
        var asked = BriefBuilder.Build(Contact(ContactRole.Coach), Today, [Subject("a", "Ann"), unknown], [new BriefLine("x.fit", "whose?")]);
        Assert.Equal("Morning brief, Sunday 1 March 2026: something needs an answer", BriefText.Subject(asked));
    }

    [Fact]
    public void TheFirstLineHoldsNoName()
    {
        var brief = SquadBrief();
        Assert.All(brief.Groups[0].Rows, row => Assert.DoesNotContain(row.Name.Split(' ')[^1], brief.FirstLine, StringComparison.Ordinal));
    }

    [Fact]
    public void TenPeopleAreNamedAndTheRestIsCounted()
    {
        var brief = Build([.. Enumerable.Range(1, 13).Select(n => Subject($"p{n:00}", $"P {n:00}", LoadRatio($"p{n:00}")))]);
        Assert.Equal(10, brief.Flagged.Count);
        Assert.Equal(3, brief.FlaggedBeyond);
        Assert.StartsWith("13 of 13 to look at", brief.FirstLine, StringComparison.Ordinal);
        Assert.Equal(13, brief.Groups[0].Rows.Count(row => row.Flagged));
    }

    [Fact]
    public void WarningsComeFirstThenNamesWithoutRegardToCase()
    {
        var brief = Build(
            Subject("1", "zoe", Silence("1")),
            Subject("2", "Yan", LoadRatio("2")),
            Subject("3", "adam", Silence("3")),
            Subject("4", "Bea", Silence("4")),
            Subject("5", "vic", LoadRatio("5")));
        Assert.Equal(["vic", "Yan", "adam", "Bea", "zoe"], brief.Flagged.Select(person => person.Name));
        Assert.Equal(["adam", "Bea", "vic", "Yan", "zoe"], brief.Groups[0].Rows.Select(row => row.Name));
    }

    [Fact]
    public void TheOrderOfTheSubjectsDoesNotMatter()
    {
        BriefSubject[] subjects = [Subject("a", "Ann", Silence("a")), Subject("b", "Ben", LoadRatio("b")), Subject("c", "Cas", StimulusGap("c"))];
        Assert.Equal(BriefText.Write(Build(subjects)), BriefText.Write(Build([.. subjects.Reverse()])));
    }

    [Fact]
    public void APersonWithSeveralAlertsStandsThereOnce()
    {
        var brief = Build(Subject("a", "Ann", StimulusGap("a"), Silence("a"), LoadRatio("a")));
        var person = Assert.Single(brief.Flagged);
        Assert.Equal(["load_ratio", "stimulus_gap", "silence"], person.Reasons.Select(reason => reason.Rule));
        Assert.Equal(Severity.Warning, person.Severity);
        Assert.Equal([true, false, false], person.Reasons.Select(reason => reason.IsNew));
    }

    [Fact]
    public void APersonGivenTwiceStandsThereOnce()
    {
        var brief = Build(Subject("ann", "Ann", Silence("ann")), Subject("ANN", "Ann", Silence("ANN")));
        Assert.Single(brief.Flagged);
        Assert.Single(brief.Groups[0].Rows);
    }

    [Fact]
    public void WhatSomebodyAcknowledgedIsNotAskedForAgainButStaysVisible()
    {
        var brief = Build(Subject("a", "Ann", StimulusGap("a", state: AlertState.Acknowledged)));
        Assert.Empty(brief.Flagged);
        Assert.Equal("All quiet: 1 person, nothing to act on. What was seen before still stands for 1 person.", brief.FirstLine);
        Assert.Equal("seen before and still standing: no heavy or fast leg work lately", brief.Groups[0].Rows[0].Remark);
    }

    [Fact]
    public void AnAcknowledgedAlertStandsBesideANewOne()
    {
        var brief = Build(Subject("a", "Ann", StimulusGap("a", state: AlertState.Acknowledged), LoadRatio("a")));
        Assert.Equal([false, true], Assert.Single(brief.Flagged).Reasons.Select(reason => reason.IsSeen));
    }

    [Fact]
    public void ReturnedAlertsAreLinesThatSayHow()
    {
        var brief = Build(
            Subject("a", "Ann", Over(LoadRatio("a"))),
            Subject("b", "Ben", Over(LoadRatio("b"), corrected: true)),
            Subject("c", "Cas", Over(StimulusGap("c"))),
            Subject("d", "Dot", Over(Silence("d"))));
        Assert.Equal(
            [
                new BriefLine("Ann", "Load is back within 1.8 times the usual week."),
                new BriefLine("Ben", "Load well above the usual: corrected by a later file."),
                new BriefLine("Cas", "Heavy or fast leg work is back."),
                new BriefLine("Dot", "Recordings are coming in again."),
            ],
            brief.Returned);
        Assert.Empty(brief.Flagged);
    }

    [Fact]
    public void TheReturnValueIsTheGroupsOwn()
    {
        var strict = Squad with { Limits = new RuleLimits { LoadRatio = new LoadRatioLimits { Return = 1.45 } } };
        var brief = Build(Subject("a", "Ann", Over(LoadRatio("a"))) with { Group = strict });
        Assert.Equal("Load is back within 1.45 times the usual week.", Assert.Single(brief.Returned).Sentence);
    }

    [Fact]
    public void AnAlertThatReturnedBeforeTheLastBriefIsNotToldAgain()
    {
        var old = Over(LoadRatio("a")) with { ReturnedSince = false };
        Assert.Empty(Build(Subject("a", "Ann", old)).Returned);
    }

    [Fact]
    public void SomebodyWhoWatchesThemselvesIsCalledYou()
    {
        var brief = BriefBuilder.Build(Oneself("a"), Today, [Subject("a", "Ann", LoadRatio("a"), StimulusGap("a"))], []);
        Assert.Equal("To look at: load well above your usual and no heavy or fast leg work lately.", brief.FirstLine);
        Assert.Equal("You", Assert.Single(brief.Flagged).Name);
        Assert.Equal("you, with your coach or clinician where you have one; you, with your clinician where one looks after you", brief.Flagged[0].Decides);
        Assert.Equal("before the next hard session, within a day", brief.Flagged[0].When);
        Assert.Contains("what you had planned", brief.Flagged[0].Reasons[0].Consider, StringComparison.Ordinal);
        Assert.Contains("you and your clinician allow", brief.Flagged[0].Reasons[1].Consider, StringComparison.Ordinal);
        Assert.DoesNotContain("Ann", BriefText.Write(brief), StringComparison.Ordinal);
        Assert.Equal("All quiet: nothing to act on.", BriefBuilder.Build(Oneself("a"), Today, [Subject("a", "Ann")], []).FirstLine);
    }

    [Theory]
    [InlineData(ContactRole.Coach, "the person, and whoever looks after devices and uploads; you and the person, with their clinician where one looks after them")]
    [InlineData(ContactRole.Clinician, "the person, and whoever looks after devices and uploads; the person and their coach, with what you know; the person, with you")]
    [InlineData(ContactRole.Self, "the person, and whoever looks after devices and uploads; you and the person, with their clinician where one looks after them")]
    public void WhoDecidesDependsOnTheReasonsAndTheReader(ContactRole role, string expected)
    {
        var brief = BriefBuilder.Build(Contact(role), Today, [Subject("a", "Ann", Silence("a"), LoadRatio("a"), StimulusGap("a")), Subject("b", "Ben")], []);
        Assert.Equal(expected.Split("; ").Order(), brief.Flagged[0].Decides.Split("; ").Order());
    }

    [Fact]
    public void PeopleOutsideTheContactsGroupsAreLeftOut()
    {
        var elsewhere = new BriefSubject(Person("z", "Zed", Class), Class, QuietDays("z", 60), [Silence("z")], []);
        var brief = Build(Subject("a", "Ann"), elsewhere);
        Assert.Equal("All quiet: 1 person, nothing to act on.", brief.FirstLine);
        Assert.Equal(["squad"], brief.Groups.Select(group => group.Id));
        var self = BriefBuilder.Build(Oneself("A"), Today, [Subject("a", "Ann"), Subject("b", "Ben", Silence("b"))], []);
        Assert.Empty(self.Flagged);
        Assert.Equal("a", Assert.Single(Assert.Single(self.Groups).Rows).PersonId);
    }

    [Fact]
    public void GroupsComeInTheContactsOrder()
    {
        var other = new BriefSubject(Person("z", "Zed", Class), Class, QuietDays("z", 60), [], []);
        var brief = BriefBuilder.Build(Contact(ContactRole.Coach, "ada", "squad", "class"), Today, [other, Subject("a", "Ann")], []);
        Assert.Equal([("squad", "AU"), ("class", "kg")], brief.Groups.Select(group => (group.Id, group.LoadUnit)));
    }

    [Fact]
    public void ARowShowsTheEvaluationDatesNumbers()
    {
        // 3 training days of 80 and a rest day in turn, yesterday 80: the last 7 days hold one rest day (back 3), so 6 x 80 = 480; the 21 before hold 15 or 16.
        // Rest days lie 3, 7, 11, 15, 19, 23, 27 days back: 6 of them in days 7 to 27, so 15 x 80 = 1200 in 3 weeks = 400 a week; 480 / 400 = 1.2.
        var row = Build(Subject("a", "Ann")).Groups[0].Rows[0];
        Assert.Equal(480, row.WeekLoad!.Value, 9);
        Assert.Equal(400, row.UsualWeekLoad!.Value, 9);
        Assert.Equal(1.2, row.Ratio!.Value, 9);
        Assert.Equal(7, row.KnownDays);
        Assert.Equal(1, row.DaysSinceHeavyLegs);
        Assert.Equal(7, row.HeavyLegsDays28);
        Assert.Equal(Yesterday, row.LastRecorded);
        Assert.Equal(28, row.Recent.Count);
        Assert.Equal((new LocalDate(2026, 2, 1), Yesterday), (row.Recent[0].Date, row.Recent[^1].Date));
        Assert.Equal(new BriefDay(new LocalDate(2026, 2, 25), true, 0, false), row.Recent[^4]);
        Assert.Null(row.Remark);
    }

    [Fact]
    public void WhatThePlanHoldsBackIsSaidInTheRowAndFlagsNobody()
    {
        var held = new Finding("a", Today, "load_ratio", null, Severity.Suppressed, Today, 1.95, 1.8, "ratio", "Load is high.", new Evidence("a / b", "a choice", []));
        var brief = Build(Subject("a", "Ann") with { Suppressed = [held] });
        Assert.Equal("load well above the usual: not watched up to now", brief.Groups[0].Rows[0].Remark);
        Assert.Empty(brief.Flagged);
    }

    [Fact]
    public void UnknownDaysStayUnknown()
    {
        var row = Build(Subject("a", "Ann") with { Days = Trends("a", 60, back => back < 3 ? null : 80, back => back < 3 ? null : false) }).Groups[0].Rows[0];
        Assert.Equal(4, row.KnownDays);
        Assert.Equal(320, row.WeekLoad);
        Assert.Null(row.Ratio);
        Assert.All(row.Recent.TakeLast(3), day => Assert.Equal((false, null, null), (day.Known, day.Load, day.HeavyLegs)));
        Assert.StartsWith("load known on 4 of the last 7 days, 5 wanted", row.Remark, StringComparison.Ordinal);
    }

    /// <summary>Two of the last 7 days are unknown: 80 x 5 = 400 so far, not the 560 that the week would be if scaled up.</summary>
    [Fact]
    public void AWeekThatIsNotKnownWholeStandsAsItIsSoFar()
    {
        var brief = Build(Subject("a", "Ann") with { Days = Trends("a", 60, back => back < 2 ? null : 80, _ => false) });
        var row = brief.Groups[0].Rows[0];
        Assert.Equal((400.0, 5, null), (row.WeekLoad, row.KnownDays, row.Ratio));
        Assert.Contains("Ann                           400+     560", BriefText.Write(brief), StringComparison.Ordinal);
    }

    [Fact]
    public void WhereNothingIsKnownYetNothingIsCalledQuiet()
    {
        var nobody = new[] { Subject("a", "Ann") with { Days = [] }, Subject("b", "Ben") with { Days = Trends("b", 3, _ => null, _ => null) } };
        var brief = Build(nobody);
        Assert.Equal("Nothing is known yet: no recording of 2 people has come in.", brief.FirstLine);
        Assert.Equal("Morning brief, Sunday 1 March 2026: nothing is known yet", BriefText.Subject(brief));
        Assert.Equal("Nothing is known yet: no recording has come in.", BriefBuilder.Build(Oneself("a"), Today, nobody, []).FirstLine);
    }

    [Fact]
    public void APersonWithoutAnyDayHasARowOfUnknowns()
    {
        var row = Build(Subject("a", "Ann"), Subject("b", "Ben") with { Days = [] }).Groups[0].Rows[1];
        Assert.Equal((null, null, null, 0, null, null), (row.WeekLoad, row.UsualWeekLoad, row.Ratio, row.KnownDays, row.DaysSinceHeavyLegs, row.HeavyLegsDays28));
        Assert.Null(row.LastRecorded);
        Assert.Equal(28, row.Recent.Count(day => !day.Known));
        Assert.Equal("nothing recorded yet", row.Remark);
    }

    [Fact]
    public void DaysSinceTheFirstKnownDayAreNotShownAsDaysSinceLegWork()
    {
        var row = Build(Subject("a", "Ann") with { Days = Trends("a", 40, _ => 80, _ => false) }).Groups[0].Rows[0];
        Assert.Null(row.DaysSinceHeavyLegs);
        Assert.Equal(0, row.HeavyLegsDays28);
        Assert.Equal("no heavy or fast leg work seen in 40 days on record", row.Remark);
    }

    [Theory]
    [InlineData(3, null)]
    [InlineData(4, "leg work known on 6 of the 10 days since the last heavy or fast one")]
    public void ACountOverManyUnknownDaysSaysSo(int unknownDays, string? expected)
    {
        // The last heavy day lies 10 days back; the group's limit wants 0.7 of the 10 days known.
        var days = Trends("a", 60, _ => 80, back => back < unknownDays ? null : back == 10);
        var row = Build(Subject("a", "Ann") with { Days = days }).Groups[0].Rows[0];
        Assert.Equal(10, row.DaysSinceHeavyLegs);
        Assert.Equal(expected, row.Remark);
    }

    [Fact]
    public void ManyRemarksAreCounted()
    {
        var row = Build(Subject("a", "Ann") with { Remarks = ["one", "two", "two", "three", "four"] }).Groups[0].Rows[0];
        Assert.Equal("one; two; 2 more of the kind", row.Remark);
    }

    [Fact]
    public void ARuleWithoutATextOfItsOwnIsStillTold()
    {
        var brief = Build(Subject("a", "Ann", News("a", "some_new_rule", null, Severity.Notice, AlertState.Unacknowledged, "this week is 52 % above the last", true)));
        Assert.Equal("1 of 1 to look at: 1 with some new rule.", brief.FirstLine);
        Assert.Equal("This week is 52 % above the last.", brief.Flagged[0].Reasons[0].Sentence);
    }

    /// <summary>QuietDays: the last 7 days hold 480. Away for 10 days up to the day before the return; the mean week of 28 days on the day before them is told.</summary>
    [Fact]
    public void SomebodyReturningIsShownBesideTheUsualBeforeTheBreak()
    {
        var row = Build(Returning(3, 10, usual: 430)).Groups[0].Rows[0];

        Assert.Equal("returning, day 3: this week 480 of usually 430 AU before the break", row.Remark);
        Assert.Equal((480.0, 430.0, null), (row.WeekLoad, row.UsualWeekLoad, row.Ratio));
    }

    [Fact]
    public void WhatIsNotKnownOfTheTimeBeforeTheBreakIsNotShown()
    {
        Assert.Equal("returning, day 1", Build(Returning(1, 10, usual: null)).Groups[0].Rows[0].Remark);
        Assert.Equal("returning, day 14", Build(Returning(14, 0, usual: 430)).Groups[0].Rows[0].Remark);
        var unknownWeek = Returning(2, 10, usual: 430);
        unknownWeek = unknownWeek with { Days = [.. unknownWeek.Days.Select(day => day with { Acute = null })] };
        Assert.StartsWith("returning, day 2: usually 430 AU a week before the break; ", Build(unknownWeek).Groups[0].Rows[0].Remark, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("load_ratio", "Load well above the usual: not watched while away or returning.")]
    [InlineData("weekly_jump", "Load of a week far above the last: not watched while away or returning.")]
    [InlineData("falling_load", "Load well below the usual: not watched while away or returning.")]
    [InlineData("stimulus_gap", "No heavy or fast work lately: not watched while away or returning.")]
    [InlineData("not_usable", "Recordings can be used again.")]
    public void ARuleThatIsOffHasNotSeenTheEnd(string rule, string expected)
    {
        var over = Over(News("a", rule, null, Severity.Notice, AlertState.Unacknowledged, "as it was", false));
        Assert.Equal(expected, Assert.Single(Build(Returning(3, 10, usual: 430) with { Alerts = [over] }).Returned).Sentence);
    }

    /// <summary>Ill from the sixth day back on, injured from the third: whoever is not told of health is not told either that the reason changed.</summary>
    [Theory]
    [InlineData(ContactRole.Coach, "away since 23 February")]
    [InlineData(ContactRole.FrontDesk, "away since 23 February")]
    [InlineData(ContactRole.Physiotherapist, "injured since 26 February")]
    public void AnAbsenceBeginsWhereTheReaderSeesItBegin(ContactRole role, string expected)
    {
        var subject = Subject("a", "Ann");
        var days = subject.Days.Select((day, place) => day with
        {
            Plan = (subject.Days.Count - 1 - place) switch
            {
                < 3 => DayPlan.None with { Absence = AbsenceWord.Injured },
                < 6 => DayPlan.None with { Absence = AbsenceWord.Ill },
                _ => DayPlan.None,
            },
        });

        var brief = BriefBuilder.Build(Contact(role), Today, [subject with { Days = [.. days] }], []);

        Assert.StartsWith(expected, brief.Groups[0].Rows[0].Remark, StringComparison.OrdinalIgnoreCase);
    }

    /// <summary>On the last day the return is so many days old; before it lies a break of so many days.</summary>
    private static BriefSubject Returning(int returnDay, int breakDays, double? usual)
    {
        var subject = Subject("a", "Ann");
        var days = subject.Days.Select((day, place) => (day, Back: subject.Days.Count - 1 - place)).Select(one => one.day with
        {
            Chronic = one.Back == returnDay + breakDays ? usual : 999,
            Plan = one.Back < returnDay ? DayPlan.None with { ReturnDay = returnDay - one.Back }
                : one.Back < returnDay + breakDays ? DayPlan.None with { Absence = AbsenceWord.Ill }
                : DayPlan.None,
        });
        return subject with { Days = [.. days] };
    }

    private static Brief Build(params BriefSubject[] subjects) => BriefBuilder.Build(Contact(ContactRole.Coach), Today, subjects, []);
}
