using System.Text.Json.Serialization;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Rows;

/// <summary>What a row of kind <c>sets</c> says. Unknown is null.</summary>
/// <param name="Order">The how-manieth session of the date, from 1.</param>
/// <param name="Time">Local time of the set.</param>
/// <param name="Exercise">As written; its region is looked up in the table of exercises.</param>
/// <param name="Machine">Which machine, in the gym's own words.</param>
/// <param name="Set">The how-manieth set, from 1.</param>
/// <param name="Repetitions">0 or more.</param>
/// <param name="Kilograms">External load, 0 or more; 0 is body weight.</param>
/// <param name="Pin">Number of the pin of a stack without kilograms.</param>
/// <param name="RepetitionsInReserve">0 or more.</param>
/// <param name="Hardness">0 to 10; at 10 nothing was left.</param>
/// <param name="Seconds">Length of the set; of a hold, the seconds held.</param>
/// <param name="Load">How the load was made.</param>
/// <param name="IsHold">Held without moving.</param>
/// <param name="IsFast">Declared fast: jumps, throws, speed work.</param>
public sealed record SetRow(
    int? Order,
    LocalTime? Time,
    string Exercise,
    string? Machine,
    int? Set,
    int? Repetitions,
    double? Kilograms,
    double? Pin,
    double? RepetitionsInReserve,
    double? Hardness,
    double? Seconds,
    SetLoad Load,
    bool IsHold,
    bool IsFast) : RowContent
{
    /// <summary>Measured mean speed of the lifting phase, metres per second, above 0.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double? BarSpeedMetresPerSecond { get; init; }
}
