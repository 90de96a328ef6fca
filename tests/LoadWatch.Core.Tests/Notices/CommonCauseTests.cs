using LoadWatch.Alerts;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Plans;
using NodaTime;

namespace LoadWatch.Tests.Notices;

public class CommonCauseTests
{
    private static readonly LocalDate Date = new(2026, 3, 4);
    private static readonly Contact Ada = new("ada", "Ada", ContactRole.Coach, ["squad"], [], DateTimeZone.Utc, new LocalTime(6, 30), new HashSet<IsoDayOfWeek>());

    [Fact]
    public void ManySilentPeopleAreOneLineAndNobodyIsFlaggedForIt()
    {
        var brief = Build(Enumerable.Range(0, 8).Select(number => Person(number, silent: number < 5, expected: true)));

        Assert.Empty(brief.Flagged);
        Assert.Equal("squad", brief.Questions[0].Subject);
        Assert.StartsWith("Recordings of 5 of 8 people do not come in", brief.Questions[0].Sentence, StringComparison.Ordinal);
    }

    [Fact]
    public void WhoHasAnotherReasonIsStillNamed()
    {
        var people = Enumerable.Range(0, 8).Select(number => Person(number, silent: number < 5, expected: true)).ToList();
        people[0] = people[0] with { Alerts = [.. people[0].Alerts, News("p0", "load_ratio")] };

        Assert.Equal("p0", Assert.Single(Build(people).Flagged).PersonId);
    }

    [Fact]
    public void WhoStoppedWeeksApartIsNamed()
    {
        var people = Enumerable.Range(0, 7).Select(number => Person(number, silent: true, expected: false)).ToList();
        var apart = people.Select((subject, number) => subject with
        {
            Days = [new Day { Person = subject.Person.Id, Date = Date.PlusDays(-20 * (number + 1)), State = DayState.Recorded }, .. subject.Days],
        });

        Assert.Equal(7, Build(apart).Flagged.Count);
    }

    [Theory]
    [InlineData(4, 4)]
    [InlineData(5, 11)]
    public void AFewSilentPeopleAreNamed(int silent, int all) =>
        Assert.Equal(silent, Build(Enumerable.Range(0, all).Select(number => Person(number, silent: number < silent, expected: false))).Flagged.Count);

    [Fact]
    public void WhileAnInboxIsAwayNobodyWhoseRecordingsComeByItIsNamedForSilence()
    {
        var people = Enumerable.Range(0, 9).Select(number => Person(number, silent: number < 2, expected: false)).ToList();
        people[0] = people[0] with { InboxIsAway = true };

        var brief = Build(people);
        Assert.Equal("p1", Assert.Single(brief.Flagged).PersonId);
        Assert.StartsWith("Recordings of 1 of 9 people do not come in", brief.Questions[0].Sentence, StringComparison.Ordinal);
    }

    [Fact]
    public void TheFirstLineSaysHowManyRecordingsOfTheLastPlannedSessionAreIn()
    {
        var brief = Build(Enumerable.Range(0, 6).Select(number => Person(number, silent: number < 2, expected: true)));

        Assert.Contains("4 of 6 recordings of the session of 3 March are in.", brief.FirstLine, StringComparison.Ordinal);
    }

    /// <summary>Files are given two days: of a session of yesterday or the day before one is not in yet, of an earlier one it did not come.</summary>
    [Theory]
    [InlineData(1, true)]
    [InlineData(2, true)]
    [InlineData(3, false)]
    public void WhatMayStillComeIsNotInYet(int back, bool told)
    {
        var waiting = Person(0, silent: true, expected: true) with { Alerts = [] };
        waiting = waiting with { Days = [.. Enumerable.Range(1, 3).Reverse().Select(ago => waiting.Days[0] with
        {
            Date = Date.PlusDays(-ago),
            State = ago == back ? DayState.Unknown : DayState.Recorded,
            Plan = ago == back ? DayPlan.None with { Expected = 1 } : DayPlan.None,
        })] };

        var brief = Build([waiting]);
        Assert.Equal(told, brief.FirstLine.Contains(" are in, 1 not in yet.", StringComparison.Ordinal));
        Assert.Equal(told, brief.Groups[0].Rows[0].Remark?.Contains(" Mar not in yet", StringComparison.Ordinal) is true);
    }

    [Fact]
    public void WhoIsAwayIsNotWaitedFor()
    {
        var away = Person(0, silent: true, expected: true) with { Alerts = [] };

        var brief = Build([away with { Days = [away.Days[0] with { Plan = away.Days[0].Plan with { Absence = AbsenceWord.Ill } }] }, Person(1, silent: false, expected: true)]);
        Assert.Contains("1 of 2 recordings of the session of 3 March are in.", brief.FirstLine, StringComparison.Ordinal);
    }

    [Fact]
    public void WithoutAPlanItSaysNothingOfIt() => Assert.DoesNotContain(
        "recordings of the session", Build(Enumerable.Range(0, 6).Select(number => Person(number, silent: false, expected: false))).FirstLine, StringComparison.Ordinal);

    [Theory]
    [InlineData(ContactRole.Coach, "away since 3 March")]
    [InlineData(ContactRole.FrontDesk, "away since 3 March")]
    [InlineData(ContactRole.Clinician, "ill since 3 March")]
    public void OnlyThoseWhoMayKnowReadWhySomebodyIsAbsent(ContactRole role, string remark)
    {
        var subject = Person(0, silent: true, expected: false) with { Alerts = [] };
        var ill = subject with { Days = [subject.Days[0] with { Plan = DayPlan.None with { Absence = AbsenceWord.Ill } }] };

        var row = BriefBuilder.Build(Ada with { Role = role }, Date, [ill], []).Groups[0].Rows[0];
        Assert.StartsWith(remark, row.Remark, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(4, false)]
    [InlineData(5, true)]
    [InlineData(10, true)]
    [InlineData(11, false)]
    public void WhatWouldMakeLegWorkKnownIsToldWhileTheRecordIsYoung(int recorded, bool told)
    {
        var days = Enumerable.Range(0, recorded)
            .Select(back => new Day { Person = "p0", Date = Date.PlusDays(-recorded + back), State = DayState.Recorded, Load = 50 })
            .ToList();
        var row = BriefBuilder.Build(Ada, Date, [Person(0, silent: false, expected: false) with { Days = days }], []).Groups[0].Rows[0];

        Assert.Equal(told, row.Remark?.Contains("Leg work cannot be seen so far", StringComparison.OrdinalIgnoreCase) is true);
    }

    private static Brief Build(IEnumerable<BriefSubject> people) => BriefBuilder.Build(Ada, Date, [.. people], []);

    private static BriefSubject Person(int number, bool silent, bool expected)
    {
        var person = new Person($"p{number}", $"Person {number}", "squad", 1990, null, DateTimeZone.Utc);
        var day = new Day
        {
            Person = person.Id,
            Date = Date.PlusDays(-1),
            State = silent ? DayState.Unknown : DayState.Recorded,
            Plan = expected ? DayPlan.None with { Expected = 1 } : DayPlan.None,
        };
        return new BriefSubject(person, new Group("squad", "squad", "banister_trimp", new RuleLimits()), [day], silent ? [News(person.Id, "silence")] : [], []);
    }

    private static AlertNews News(string person, string rule) => new(
        new Alert(new FindingKey(person, rule, null), Date.PlusDays(-1), Date.PlusDays(-1), AlertState.Unacknowledged, Severity.Notice, "No recording for 5 days."),
        IsNew: true,
        ReturnedSince: false,
        Corrected: false);
}
