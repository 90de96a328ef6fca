using NodaTime;

namespace LoadWatch.Findings;

/// <summary>
/// The run of one finding over the dates: raised once its condition held on enough readable dates in a row, over on the first readable date on which it
/// no longer holds. A date that cannot be read is passed over, and the last reading stands (I-6).
/// </summary>
/// <param name="onDays">Readable dates in a row with the condition before it is raised, 1 or more.</param>
internal sealed class FindingRun<TReading>(int onDays = 1)
    where TReading : class
{
    private int metInARow;

    /// <summary>First date of the run that stands; null where none does.</summary>
    public LocalDate? Since { get; private set; }

    /// <summary>The last reading.</summary>
    public TReading? Reading { get; private set; }

    /// <param name="raises">The condition that raises it.</param>
    /// <param name="holds">The condition that keeps it, the weaker of the two.</param>
    public void Read(LocalDate date, TReading reading, bool raises, bool holds)
    {
        Reading = reading;
        metInARow = raises ? metInARow + 1 : 0;
        var standing = Since is null ? metInARow >= onDays : holds;
        Since = standing ? Since ?? date : null;
    }

    /// <summary>The rule is off on a date.</summary>
    public void End()
    {
        (Since, Reading, metInARow) = (null, null, 0);
    }
}
