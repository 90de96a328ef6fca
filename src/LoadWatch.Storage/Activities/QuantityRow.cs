using LoadWatch.Loads;

namespace LoadWatch.Storage.Activities;

/// <summary>A row of <c>quantity</c>.</summary>
internal sealed class QuantityRow
{
    public string Activity { get; init; } = "";

    public string Name { get; init; } = "";

    public double Value { get; init; }

    public string Unit { get; init; } = "";

    public long Estimated { get; init; }

    public static QuantityRow From(string activity, Quantity quantity) => new()
    {
        Activity = activity,
        Name = quantity.Name,
        Value = quantity.Value,
        Unit = quantity.Unit,
        Estimated = quantity.Estimated ? 1 : 0,
    };

    public Quantity ToQuantity() => new(Name, Value, Unit, Estimated == 1);
}
