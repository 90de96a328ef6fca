using NodaTime;

namespace LoadWatch.Service.Commands;

/// <summary>When, by whom and why something is decided; blank is not said.</summary>
public sealed class Circumstances(Instant now, string? by = null, string? note = null)
{
    public Instant Now { get; } = now;

    public string? By { get; } = Said(by);

    public string? Note { get; } = Said(note);

    private static string? Said(string? text) => string.IsNullOrWhiteSpace(text) ? null : text.Trim();
}
