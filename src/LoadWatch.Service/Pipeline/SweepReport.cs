using LoadWatch.Notices;
using LoadWatch.Recordings;
using LoadWatch.Service.Arrivals;

namespace LoadWatch.Service.Pipeline;

/// <summary>What one sweep did, in counts.</summary>
public sealed class SweepReport
{
    /// <summary>Called after every step that got the sweep on: a file, a group, a notice. The service's watchdog listens.</summary>
    public Action Advanced { get; set; } = () => { };

    /// <summary>Files seen in the inboxes.</summary>
    public int Seen { get; set; }

    /// <summary>Files that may still be growing and are looked at again.</summary>
    public int Settling { get; set; }

    /// <summary>Files that could not be opened or read, by path, with the reason; looked at again.</summary>
    public List<BriefLine> Unreadable { get; } = [];

    /// <summary>Names of inboxes that could not be looked into.</summary>
    public List<string> MissingInboxes { get; } = [];

    /// <summary>What the look into each inbox found, in their order.</summary>
    public IReadOnlyList<InboxLook> Looks { get; private set; } = [];

    /// <summary>Arrivals settled by this sweep, by state; members of archives count on their own.</summary>
    public SortedDictionary<ArrivalState, int> Settled { get; } = [];

    /// <summary>All arrivals after the sweep, by state.</summary>
    public IReadOnlyDictionary<ArrivalState, int> InAll { get; set; } = new Dictionary<ArrivalState, int>();

    /// <summary>Contents decoded again because what their rows stand on has changed.</summary>
    public int Recomputed { get; set; }

    /// <summary>People of whom some content is still to be decoded again with the configuration as it is now; their findings stand on what is stored.</summary>
    public int PeopleBehind { get; set; }

    /// <summary>People whose days were computed.</summary>
    public int PeopleComputed { get; set; }

    /// <summary>Alerts raised, risen or returned.</summary>
    public int AlertChanges { get; set; }

    /// <summary>Decisions made or withdrawn by tables of answers.</summary>
    public int AnswersTaken { get; private set; }

    /// <summary>Rows of answers that nobody can follow, by table and date, with the reason.</summary>
    public IReadOnlyList<BriefLine> OpenAnswers { get; private set; } = [];

    /// <summary>Notices decided by this sweep.</summary>
    public int NoticesDecided { get; set; }

    /// <summary>Deliveries that did not go through and are tried again, with the reason.</summary>
    public List<string> Undelivered { get; } = [];

    /// <summary>Deliveries that are not tried again, with the reason.</summary>
    public List<string> GivenUp { get; } = [];

    /// <summary>Mails that the server took.</summary>
    public int MailsDelivered { get; set; }

    /// <summary>Contacts and channels by which nothing got through at the last try.</summary>
    public int Missed { get; set; }

    /// <summary>Pages that stand after the sweep.</summary>
    public List<string> Pages { get; } = [];

    /// <summary>Whether anything happened that a page could show.</summary>
    public bool HasNews => Settled.Count + PeopleComputed + AlertChanges + AnswersTaken + NoticesDecided + Undelivered.Count + GivenUp.Count + Unreadable.Count > 0;

    public int CountOf(ArrivalState state) => Settled.GetValueOrDefault(state);

    public void Take(AnswersReport answers)
    {
        AnswersTaken += answers.Made + answers.Withdrawn;
        OpenAnswers = answers.Questions;
    }

    public void Take(IReadOnlyList<InboxLook> looks)
    {
        Looks = looks;
        Seen += looks.Sum(look => look.Seen);
        MissingInboxes.AddRange(looks.Where(look => look.Away is not null).Select(look => look.Inbox.Name));
        Unreadable.AddRange(looks.SelectMany(look => look.Closed).Select(folder => new BriefLine(folder + "/", "there is no right to look into this folder: nothing comes in from it")));
        Unreadable.AddRange(looks.Where(look => look.Unreadable.Count > 0).Select(UnreadableNames.Line));
    }

    public void Count(ArrivalState state) => Settled[state] = CountOf(state) + 1;
}
