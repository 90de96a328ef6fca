using NodaTime;

namespace LoadWatch.Findings;

/// <summary>
/// The run of one finding over the dates: raised once its condition held on enough readable dates in a row, over on the first readable date on which it
/// no longer holds. A date that cannot be read is passed over, and the last reading stands (I-6).
/// </summary>
/// <param name="onDays">Readable dates in a row with the condition before it is raised, 1 or more.</param>
/// <param name="before">As it stood on the day before the first date; null: nothing did.</param>
internal sealed class FindingRun<TReading>(int onDays, RunState<TReading>? before)
    where TReading : class
{
    private int metInARow = before?.MetInARow ?? 0;

    /// <summary>First date of the run that stands; null where none does.</summary>
    public LocalDate? Since { get; private set; } = before?.Since;

    /// <summary>The last reading.</summary>
    public TReading? Reading { get; private set; } = before?.Reading;

    /// <summary>What the next date needs of it; null: nothing.</summary>
    public RunState<TReading>? State => Since is null && metInARow == 0 ? null : new(Since, Since is null ? null : Reading, metInARow);

    /// <param name="raises">The condition that raises it.</param>
    /// <param name="holds">The condition that keeps it, the weaker of the two.</param>
    public void Read(LocalDate date, TReading reading, bool raises, bool holds)
    {
        Reading = reading;
        metInARow = raises ? Math.Min(metInARow + 1, onDays) : 0;
        var standing = Since is null ? metInARow >= onDays : holds;
        Since = standing ? Since ?? date : null;
    }

    /// <summary>The rule is off on a date.</summary>
    public void End()
    {
        (Since, Reading, metInARow) = (null, null, 0);
    }
}

/// <param name="Reading">The last one; null where nothing stands.</param>
/// <param name="MetInARow">Readable dates in a row with the condition, up to those that are wanted.</param>
internal sealed record RunState<TReading>(LocalDate? Since, TReading? Reading, int MetInARow) : IStanding
    where TReading : class;

/// <summary>What rules keep of a run.</summary>
internal interface IStanding
{
    /// <summary>Null where nothing stands.</summary>
    LocalDate? Since { get; }
}
