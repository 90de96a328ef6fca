using LoadWatch.Plans;
using LoadWatch.Rows;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage.Decisions;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

public sealed class AbsencesTests
{
    [Theory]
    [InlineData("away 2", "away 2-")]
    [InlineData("away 2-9", "away 2-9")]
    [InlineData("ill 2; returning 6", "ill 2-5")]
    [InlineData("ill 2-20; returning 6", "ill 2-5")]
    [InlineData("ill 2; returning 2", "")]
    [InlineData("ill 2; injured 6", "ill 2-5, injured 6-")]
    [InlineData("ill 2; injured 6-8", "ill 2-5, injured 6-8")] // The rest of an open one is replaced.
    [InlineData("away 1-10; ill 3-5", "away 1-2, ill 3-5, away 6-10")]
    [InlineData("away 1-10; ill 3-5; injured 4", "away 1-2, ill 3-3, injured 4-")]
    [InlineData("ill 6; away 2", "away 2-5, ill 6-")] // Told later, began earlier.
    [InlineData("ill 2; injured 2", "injured 2-")] // The later decision about one date.
    [InlineData("ill 2-4; ill 9; returning 12; away 20-22", "ill 2-4, ill 9-11, away 20-22")]
    [InlineData("returning 5; ill 7", "ill 7-")]
    public void DecisionsMakeAbsencesWithoutOverlap(string decisions, string expected) =>
        Assert.Equal(expected, string.Join(", ", Absences.Decided([.. decisions.Split("; ").Select(Decided)]).Select(Text)));

    [Fact]
    public void ConsecutiveDatesOfOneWordAreOneAbsence() => Assert.Equal(
        "ill 1-3, injured 4-4, injured 6-6",
        string.Join(", ", Absences.Stated(
            [(On(2), DayWord.Ill), (On(1), DayWord.Ill), (On(3), DayWord.Ill), (On(4), DayWord.Injured), (On(5), DayWord.Attended), (On(6), DayWord.Injured)], []).Select(Text)));

    [Fact]
    public void WhatStaffDecidedGoesBeforeDayTables() => Assert.Equal(
        "ill 1-1, ill 4-4",
        string.Join(", ", Absences.Stated(
            [(On(1), DayWord.Ill), (On(2), DayWord.Ill), (On(3), DayWord.Ill), (On(4), DayWord.Ill)], [new Absence(AbsenceWord.Away, On(2), On(3))]).Select(Text)));

    private static Decision Decided(string text)
    {
        var (word, dates) = (text.Split(' ')[0], text.Split(' ')[1].Split('-'));
        return new Decision(Enum.Parse<DecisionKind>(word, ignoreCase: true), "anna", "anna", WorkingFolder.Now, null, null)
        {
            From = On(int.Parse(dates[0])),
            Until = dates.Length > 1 ? On(int.Parse(dates[1])) : null,
        };
    }

    private static string Text(Absence absence) => $"{absence.Word.ToString().ToLowerInvariant()} {absence.From.Day}-{absence.Until?.Day}";

    private static LocalDate On(int day) => new(2026, 3, day);
}
