namespace LoadWatch.Rows;

/// <summary>What a row of kind <c>days</c> says of a person's date.</summary>
public sealed record DayRow(DayWord Word) : RowContent;

/// <summary>What can be said of a date.</summary>
public enum DayWord
{
    /// <summary>No training.</summary>
    Rest,
    Ill,
    Injured,
    Away,

    /// <summary>Was there.</summary>
    Attended,

    /// <summary>Was expected and was not there.</summary>
    Absent,
}
