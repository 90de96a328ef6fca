namespace LoadWatch.Decoding.Fit;

/// <summary>
/// Speed and distance in three bytes: 12 bits of 1/100 m/s, then 12 bits of 1/16 m that run over and are added up. A distance
/// stated in full sets the sum.
/// </summary>
internal struct PackedSpeedDistance
{
    public const int Size = 3;
    private const int Mask = 0xFFF;
    private const double UnitsPerMetre = 16;
    private long sum;
    private bool started;

    public static bool IsValid(ReadOnlySpan<byte> bytes) => (bytes[0] & bytes[1] & bytes[2]) != 0xFF;

    public static double SpeedMetresPerSecond(ReadOnlySpan<byte> bytes) => (bytes[0] | ((bytes[1] & 0xF) << 8)) / 100.0;

    /// <summary>Distance in metres after these bytes.</summary>
    public double Advance(ReadOnlySpan<byte> bytes)
    {
        var units = (bytes[1] >> 4) | (bytes[2] << 4);
        sum = started ? sum + ((units - sum) & Mask) : units;
        started = true;
        return sum / UnitsPerMetre;
    }

    public void Restart(double metres)
    {
        if (Math.Abs(metres) < int.MaxValue)
            (sum, started) = ((long)Math.Round(metres * UnitsPerMetre), true);
    }
}
