namespace LoadWatch.Benchmarks.Imports;

/// <summary>The values of a session second by second: waves with hard efforts now and then, and noise. In the units in which FIT keeps them.</summary>
internal sealed class Course(uint serial, uint start, bool isRide)
{
    private uint noise = unchecked((serial * 2654435761) ^ start) | 1;
    private double effort = 0.5;
    private double metres;

    public int Latitude { get; private set; } = 715_827_883;

    public int Longitude { get; private set; } = 298_261_617;

    public uint Centimetres { get; private set; }

    /// <summary>Fifths of a metre above -500 m.</summary>
    public uint Height { get; private set; }

    public uint SpeedMillimetres { get; private set; }

    /// <summary>Watts on a bicycle, tenths of a millisecond on foot.</summary>
    public ushort PowerOrStance { get; private set; }

    public byte HeartRate { get; private set; }

    public byte Cadence { get; private set; }

    public void Step(int second)
    {
        noise = unchecked((noise * 1664525) + 1013904223);
        var jitter = (noise >> 8) / 16777216.0;
        var isHard = second % 420 is > 300 and < 345;
        effort += ((isHard ? 0.95 : 0.45 + (0.1 * Math.Sin(second / 240.0))) - effort) / 25;
        var speed = isRide ? 4 + (9 * effort) + jitter : 1.8 + (3.2 * effort) + (0.2 * jitter);
        metres += speed;
        Latitude += (int)(speed * 90);
        Longitude += (int)(speed * 60 * Math.Sin(second / 500.0));
        Centimetres = (uint)(metres * 100);
        Height = (uint)((500 + 120 + (30 * Math.Sin(second / 700.0))) * 5);
        SpeedMillimetres = (uint)(speed * 1000);
        PowerOrStance = (ushort)(isRide ? (isHard ? 380 : 110) + (160 * effort) + (30 * jitter) : 2200 + (300 * jitter));
        HeartRate = (byte)(92 + (82 * effort) + (3 * jitter));
        Cadence = (byte)(isRide ? 84 + (8 * jitter) : 82 + (3 * jitter));
    }
}
