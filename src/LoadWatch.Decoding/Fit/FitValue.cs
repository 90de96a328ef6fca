namespace LoadWatch.Decoding.Fit;

/// <summary>
/// What is written into one field: numbers as the file holds them (before scale and offset), a text, or nothing, which becomes the type's own
/// "no value". Fields larger than their values are filled up with that.
/// </summary>
public readonly struct FitValue
{
    private readonly double?[]? numbers;

    private FitValue(double?[]? numbers, string? text) => (this.numbers, Text) = (numbers, text);

    public static FitValue None => default;

    internal string? Text { get; }

    internal ReadOnlySpan<double?> Numbers => numbers;

    public static implicit operator FitValue(int value) => new([value], null);

    public static implicit operator FitValue(long value) => new([value], null);

    public static implicit operator FitValue(double value) => new([value], null);

    public static implicit operator FitValue(double? value) => new([value], null);

    public static implicit operator FitValue(string text) => new(null, text);

    public static FitValue Of(double? number) => new([number], null);

    /// <summary>Several values in one field; null stands for "no value" in its place.</summary>
    public static FitValue Many(params double?[] numbers) => new(numbers, null);
}
