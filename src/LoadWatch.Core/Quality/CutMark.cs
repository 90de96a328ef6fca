namespace LoadWatch.Quality;

/// <summary>
/// A reading that was cut before its series was made: not a number, as where there is none, but one that holds the reason. Whoever only asks for NaN sees no
/// reading.
/// </summary>
public static class CutMark
{
    // A quiet NaN; the payload is the letters LW and the reason.
    private const ulong First = 0x7FF8_0000_4C57_0000;
    private const ulong Reasons = 0xFFFF;

    public static double Of(CutReason reason) => BitConverter.UInt64BitsToDouble(First | (ulong)reason);

    /// <summary>Null for a reading, and where there is none.</summary>
    public static CutReason? ReasonOf(double value) =>
        double.IsNaN(value) && BitConverter.DoubleToUInt64Bits(value) is var bits && (bits & ~Reasons) == First ? (CutReason)(bits & Reasons) : null;

    /// <summary>Whether there is a reading, cut or not.</summary>
    public static bool IsTaken(double value) => !double.IsNaN(value) || ReasonOf(value) is not null;
}
