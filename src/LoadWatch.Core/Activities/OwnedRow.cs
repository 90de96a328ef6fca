using LoadWatch.People;
using LoadWatch.Rows;
using NodaTime;

namespace LoadWatch.Activities;

/// <summary>A table row in force, of a person.</summary>
/// <param name="Layout">Name of the layout that read it: its source (I-6).</param>
/// <param name="Key">Tells it from every other row of the layout and date; order among rows is by it.</param>
public sealed record OwnedRow(string Layout, LocalDate Date, string Key, RowContent Content)
{
    /// <summary>The row by the clock of the person's days, as recordings are told: with a time before their day begins it counts for the date before.</summary>
    public OwnedRow ByClockOf(Person person) => (person.DayBeginsAt == LocalTime.Midnight, Content) switch
    {
        (false, SessionRow { Start: { } start } session) => At(PersonDay.Clock(Date + start, person), time => session with { Start = time }),
        (false, SetRow { Time: { } start } set) => At(PersonDay.Clock(Date + start, person), time => set with { Time = time }),
        _ => this,
    };

    private OwnedRow At(LocalDateTime clock, Func<LocalTime, RowContent> content) => this with { Date = clock.Date, Content = content(clock.TimeOfDay) };
}
