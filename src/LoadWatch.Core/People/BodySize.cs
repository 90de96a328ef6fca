using NodaTime;

namespace LoadWatch.People;

/// <summary>How heavy and tall a person is on a date. Unknown is null.</summary>
/// <param name="MassKilograms">Body mass, kg, 20 to 300.</param>
/// <param name="HeightMetres">Body height, m, 0.8 to 2.6.</param>
public sealed record BodySize(double? MassKilograms, double? HeightMetres)
{
    public static BodySize Unknown { get; } = new(null, null);

    /// <summary>By the anchors that hold on a date.</summary>
    public static BodySize On(AnchorBook anchors, LocalDate date, string person) =>
        new(anchors.On(date, person, AnchorKind.BodyMass)?.Value, anchors.On(date, person, AnchorKind.Height)?.Value);
}
