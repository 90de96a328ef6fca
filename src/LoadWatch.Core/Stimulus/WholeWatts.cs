namespace LoadWatch.Stimulus;

/// <summary>Keeps what was recruited at each whole watt, where that follows from the intensity alone: devices write whole watts, and few different ones.</summary>
internal sealed class WholeWatts
{
    private readonly ClassFractions?[] known = new ClassFractions?[512];

    /// <param name="drive">The drive at these watts.</param>
    public ClassFractions At(double watts, double drive, Recruitment recruitment)
    {
        var whole = unchecked((int)watts);
        if ((uint)whole >= (uint)known.Length || whole != watts)
        {
            return recruitment.At(drive);
        }

        return known[whole] ??= recruitment.At(drive);
    }
}
