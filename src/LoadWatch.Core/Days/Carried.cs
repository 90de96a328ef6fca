using System.Collections.ObjectModel;
using System.Text.Json;
using System.Text.Json.Serialization;
using LoadWatch.Loads;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Days;

/// <summary>
/// What a series carries from one date to the next beside its days, so that it can be taken up behind any date: whatever may reach further back than
/// <see cref="LoadCalendar.LookBackDays"/>.
/// </summary>
public sealed record Carried
{
    private static readonly JsonSerializerOptions Text = new()
    {
        PropertyNamingPolicy = JsonNamingPolicy.SnakeCaseLower,
        DefaultIgnoreCondition = JsonIgnoreCondition.WhenWritingNull,
        Converters =
        {
            new JsonStringEnumConverter(JsonNamingPolicy.SnakeCaseLower, allowIntegerValues: false),
            new JsonDates<LocalDate>(LocalDatePattern.Iso),
        },
    };

    public static Carried Nothing { get; } = new();

    /// <summary>The last recorded date of every source seen.</summary>
    public IReadOnlyDictionary<string, LocalDate> Sources { get; init; } = ReadOnlyDictionary<string, LocalDate>.Empty;

    /// <summary>The first date with a known value, of quantities other than the group's load that rules watch.</summary>
    public IReadOnlyDictionary<string, LocalDate> FirstCovered { get; init; } = ReadOnlyDictionary<string, LocalDate>.Empty;

    /// <summary>Null where the person's heart rate is always valid: then nothing looks so far back.</summary>
    public CarriedLoads? Loads { get; init; }

    /// <summary>What rules keep, by a key of their own: as they made it, or, read back, as text that they read.</summary>
    public IReadOnlyDictionary<string, object> Runs { get; init; } = ReadOnlyDictionary<string, object>.Empty;

    /// <summary>The same of the rules of load by the reference values before a change that lies in the window (I-15); null where none does.</summary>
    public IReadOnlyDictionary<string, object>? FormerRuns { get; init; }

    /// <summary>As JSON; numbers come back to the last bit.</summary>
    public static string Write(Carried carried) => JsonSerializer.Serialize(carried, Text);

    /// <exception cref="JsonException">The text is none of <see cref="Write"/>.</exception>
    public static Carried Read(string text) => JsonSerializer.Deserialize<Carried>(text, Text) ?? throw new JsonException("nothing carried: null");

    /// <summary>What a rule kept under a key; null where it kept nothing.</summary>
    public T? Run<T>(string key)
        where T : class =>
        Runs.GetValueOrDefault(key) switch
        {
            T kept => kept,
            JsonElement text => text.Deserialize<T>(Text),
            _ => null,
        };
}
