using NodaTime;

namespace LoadWatch.Findings;

/// <summary>
/// The run of one finding over the dates: raised once its condition held on enough readable dates in a row, over once it has not held on enough of them in a
/// row. A date that cannot be read is passed over, and the last reading stands (I-6). While a planned state turns the rule off the run goes on unheard; it
/// begins anew when the rule is watched again.
/// </summary>
/// <param name="onDays">Readable dates in a row with the condition before it is raised, 1 or more.</param>
/// <param name="offDays">Readable dates in a row without the condition before it is over, 1 or more.</param>
/// <param name="before">As it stood on the day before the first date; null: nothing did.</param>
internal sealed class FindingRun<TReading>(int onDays, int offDays, RunState<TReading>? before)
    where TReading : class
{
    private int metInARow = before?.MetInARow ?? 0;
    private int clearInARow = before?.ClearInARow ?? 0;

    /// <summary>First date of the run that stands; null where none does.</summary>
    public LocalDate? Since { get; private set; } = before?.Since;

    /// <summary>The last reading.</summary>
    public TReading? Reading { get; private set; } = before?.Reading;

    /// <summary>What turns the rule off on the date; null where it is watched.</summary>
    public Muting? Muted { get; private set; } = before?.Muted;

    /// <summary>What the next date needs of it; null: nothing.</summary>
    public RunState<TReading>? State => Since is null && metInARow == 0 && Muted is null
        ? null
        : new(Since, Since is null ? null : Reading, metInARow) { ClearInARow = clearInARow == 0 ? null : clearInARow, Muted = Muted };

    /// <summary>To be called on every date, before it is read.</summary>
    public void Watch(PlannedState? muted, LocalDate date)
    {
        if (Muted is not null && muted is null)
        {
            (Since, Reading, metInARow, clearInARow) = (null, null, 0, 0);
        }

        Muted = muted is { } state ? Muted?.State == state ? Muted : new Muting(state, date) : null;
    }

    /// <param name="raises">The condition that raises it.</param>
    /// <param name="holds">The condition that keeps it, the weaker of the two.</param>
    public void Read(LocalDate date, TReading reading, bool raises, bool holds)
    {
        Reading = reading;
        metInARow = raises ? Math.Min(metInARow + 1, onDays) : 0;
        clearInARow = Since is null || holds ? 0 : clearInARow + 1;
        var standing = Since is null ? metInARow >= onDays : clearInARow < offDays;
        Since = standing ? Since ?? date : null;
        clearInARow = standing ? clearInARow : 0;
    }
}

/// <param name="Reading">The last one; null where nothing stands.</param>
/// <param name="MetInARow">Readable dates in a row with the condition, up to those that are wanted.</param>
internal sealed record RunState<TReading>(LocalDate? Since, TReading? Reading, int MetInARow) : IStanding
    where TReading : class
{
    /// <summary>Readable dates in a row without the condition while it still stands; null: none.</summary>
    public int? ClearInARow { get; init; }

    public Muting? Muted { get; init; }
}

/// <summary>A planned state that turns a rule off.</summary>
/// <param name="Since">Its first date, as far as the rule was looked at.</param>
public sealed record Muting(PlannedState State, LocalDate Since);

/// <summary>What rules keep of a run.</summary>
internal interface IStanding
{
    /// <summary>Null where nothing stands.</summary>
    LocalDate? Since { get; }
}
