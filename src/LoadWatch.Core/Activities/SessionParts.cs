using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Activities;

/// <summary>What tells of one session: its recording, if there is one, and what tables state.</summary>
internal sealed class SessionParts
{
    private readonly List<StatedSession> stated = [];

    public RecordedActivity? Recording { get; init; }

    /// <summary>See <see cref="JoinedActivity.AddsLoad"/>.</summary>
    public bool AddsLoad { get; init; } = true;

    /// <summary>By name of the layout, then mark.</summary>
    public IReadOnlyList<StatedSession> Stated =>
        [.. stated.OrderBy(one => one.Layout, StringComparer.Ordinal).ThenBy(one => one.Mark, StringComparer.Ordinal).ThenBy(one => one.Sets is null)];

    /// <summary>The rows that made it a session, where there is no recording: it keeps their name whatever joins later.</summary>
    public StatedSession Maker => stated[0];

    public void Add(StatedSession session) => stated.Add(session);

    /// <summary>A table tells of each session once.</summary>
    public bool IsToldBy(string layout) => stated.Exists(one => one.Layout == layout);

    /// <summary>The recording's sport; where that is none, the stated one.</summary>
    public Sport Sport
    {
        get
        {
            if (Recording is { Winner.Sport: var recorded } && recorded != Sport.Generic)
            {
                return recorded;
            }

            return Stated.Select(one => one.Sport).FirstOrDefault(sport => sport is not null)
                ?? (stated.Exists(one => one.Sets is not null) ? new Sport("training", "strength_training") : Sport.Generic);
        }
    }

    /// <summary>Local; null where nothing tells it.</summary>
    public LocalTime? Start => Recording?.LocalStart.TimeOfDay ?? stated.Min(one => one.Start);
}
