using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Activities;

/// <summary>Brings together what recordings and tables tell of one person's date.</summary>
internal sealed class DateJoin
{
    private readonly List<SessionParts> recorded;
    private readonly List<SessionParts> ofRows = [];
    private readonly List<SessionParts> uncertain = [];
    private readonly List<JoinQuestion> questions = [];

    public DateJoin(IEnumerable<RecordedActivity> recordings, IEnumerable<StatedSession> stated)
    {
        recorded = [.. recordings
            .OrderBy(one => one.LocalStart)
            .ThenBy(one => one.Winner.Key, StringComparer.Ordinal)
            .Select(one => new SessionParts { Recording = one })];
        var unrecorded = ClearestFirst(stated).ToList().FindAll(one => !IsSettled(one, JoinCandidates.Of(one, recorded)));
        foreach (var one in unrecorded.OrderByDescending(one => one.StandsAlone))
        {
            JoinRows(one);
        }
    }

    /// <summary>Every recording, and the sessions that only rows tell of.</summary>
    public IEnumerable<SessionParts> Sessions => [.. recorded, .. ofRows, .. uncertain];

    public IEnumerable<JoinQuestion> Questions => questions;

    /// <summary>What states its time or number takes its place before what may go to any.</summary>
    private static IEnumerable<StatedSession> ClearestFirst(IEnumerable<StatedSession> stated) => stated
        .OrderBy(one => one.Start is null)
        .ThenBy(one => one.Order is null)
        .ThenBy(one => one.Start)
        .ThenBy(one => one.Order)
        .ThenBy(one => one.Layout, StringComparer.Ordinal)
        .ThenBy(one => one.Mark, StringComparer.Ordinal)
        .ThenBy(one => one.Sets is null);

    private void JoinRows(StatedSession stated)
    {
        if (IsSettled(stated, ofRows.FindAll(session => RowSessions.MayBeOne(stated, session))))
        {
            return;
        }

        if (stated.StandsAlone)
        {
            ofRows.Add(Alone(stated, addsLoad: true));
        }
        else if (!stated.IsBlank)
        {
            questions.Add(new JoinQuestion(stated.Date, JoinWording.Nowhere(stated), MayWait: true));
        }
    }

    /// <summary>False where there is no candidate.</summary>
    private bool IsSettled(StatedSession stated, List<SessionParts> candidates)
    {
        if (candidates.Count == 1)
        {
            candidates[0].Add(stated);
        }
        else if (candidates.Count > 1 && !stated.IsBlank)
        {
            Ask(stated, candidates);
        }

        return candidates.Count > 0;
    }

    /// <summary>Logged sets were done whichever session they belong to; unless one of the candidates may hold the same sets already.</summary>
    private void Ask(StatedSession stated, List<SessionParts> candidates)
    {
        questions.Add(new JoinQuestion(stated.Date, JoinWording.Several(stated, candidates)));
        if (stated.Sets is not null && !candidates.Exists(one => one.Recording is { Winner.Sets: > 0 } || one.Stated.Any(other => other.Sets is not null)))
        {
            uncertain.Add(Alone(stated, addsLoad: false));
        }
    }

    private static SessionParts Alone(StatedSession stated, bool addsLoad)
    {
        var session = new SessionParts { AddsLoad = addsLoad };
        session.Add(stated);
        return session;
    }
}
