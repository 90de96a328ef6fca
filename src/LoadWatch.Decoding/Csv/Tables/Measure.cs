namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>Something measured: its own unit first, then the others that a table may use.</summary>
internal sealed record Measure(params IReadOnlyList<MeasureUnit> Units)
{
    // 0.45359237 kg: the international pound, by definition.
    private const double KilogramsPerPound = 0.45359237;

    public static Measure Minutes { get; } = new(
        new ScaledUnit("min"), new ScaledUnit("s", Over: 60), new ScaledUnit("h", Times: 60),
        new ClockUnit("h:mm:ss", Over: 60), new ClockUnit("h:mm", Over: 60), new ClockUnit("m:ss", Over: 60));

    public static Measure Seconds { get; } = new(
        new ScaledUnit("s"), new ScaledUnit("min", Times: 60), new ScaledUnit("h", Times: 3600),
        new ClockUnit("h:mm:ss"), new ClockUnit("h:mm"), new ClockUnit("m:ss"));

    public static Measure Kilograms { get; } = new(new ScaledUnit("kg"), new ScaledUnit("lb", Times: KilogramsPerPound));

    public static Measure Metres { get; } = new(new ScaledUnit("m"), new ScaledUnit("km", Times: 1000));

    public static Measure BodyMetres { get; } = new(new ScaledUnit("m"), new ScaledUnit("cm", Over: 100));

    public static Measure MetresPerSecond { get; } = new(new ScaledUnit("m/s"), new ScaledUnit("km/h", Over: 3.6));

    public static Measure Kilojoules { get; } = new(new ScaledUnit("kJ"), new ScaledUnit("J", Over: 1000));

    /// <summary>The unit of the values that come out.</summary>
    public string Unit => Units[0].Name;

    public string Known => string.Join(", ", Units.Select(unit => unit.Name));

    /// <summary>Of a unit that nothing converts.</summary>
    public static Measure Only(string unit) => new(new ScaledUnit(unit));

    public MeasureUnit? Find(string name) => Units.FirstOrDefault(unit => unit.Name == name);
}
