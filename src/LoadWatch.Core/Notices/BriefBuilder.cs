using LoadWatch.Alerts;
using LoadWatch.Findings;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Plans;
using NodaTime;

namespace LoadWatch.Notices;

/// <summary>Builds one contact's brief from what is known. Pure: the same values give the same brief, whatever their order.</summary>
public static class BriefBuilder
{
    /// <summary>People to act on that one brief names, those to call among them; the rest is counted.</summary>
    public const int RowsAtMost = 10;

    /// <param name="date">The contact's local date on which the brief is due.</param>
    /// <param name="subjects">People; those outside the contact's groups or people are left out.</param>
    /// <param name="questions">Files held or refused and other things that need an answer.</param>
    public static Brief Build(Contact contact, LocalDate date, IReadOnlyList<BriefSubject> subjects, IReadOnlyList<BriefLine> questions)
    {
        var forms = BriefForms.On(contact, date);
        var shown = Shown(contact, subjects);
        var self = contact.Role == ContactRole.Self && shown.Count == 1;
        var upTo = UpTo(shown);
        var silent = CommonSilence.Of(shown);

        // The week lists them itself.
        var unseen = forms.Contains(BriefForm.Daily) && !forms.Contains(BriefForm.Weekly) ? UnseenAlerts.Lines(contact, date, shown, self) : [];
        var asked = CommonSilence.Lines(shown, silent).Concat(unseen).Concat(questions).ToList();
        var brief = Bare(contact, date, upTo, asked) with { People = [.. shown.Select(subject => subject.Person.Id)] };
        var first = new FirstLine(shown, upTo, asked, self) { Silent = silent.Count };
        var last = upTo ?? date.PlusDays(-1);
        if (forms.Contains(BriefForm.ClassSheet))
        {
            brief = brief with { Sheets = ClassSheets.Of(shown, date, ViewOf(contact, shown)) };
            first = first with { Sheets = brief.Sheets };
        }

        var flagged = ToLookAt(contact, date, shown, silent);
        if (forms.Contains(BriefForm.CallList))
        {
            var room = forms.Contains(BriefForm.Daily) ? Math.Max(RowsAtMost / 2, RowsAtMost - flagged.Count) : RowsAtMost;
            IReadOnlyList<BriefSubject> others = forms.Contains(BriefForm.Daily)
                ? [.. shown.ExceptBy(flagged.Select(subject => subject.Person.Id), subject => subject.Person.Id, StringComparer.Ordinal)]
                : shown;
            brief = brief with { Calls = CallLists.Of(others, silent, date, last, room) };
            first = first with { Calls = brief.Calls };
        }

        if (forms.Contains(BriefForm.Daily))
        {
            first = first with { Flagged = flagged };
            brief = Daily(brief, contact, shown, flagged, last, self);
        }

        var week = forms.Contains(BriefForm.Weekly) && upTo is not null ? BriefWeeks.Of(shown, date, last, ByGroup(contact, shown), self) : null;
        return brief with
        {
            Week = week,
            NothingIsKnown = first.NothingIsKnown,
            SomeAreUnknown = first.SomeAreUnknown,
            FirstLine = (first with { HasWeek = week is not null }).Write(),
        };
    }

    /// <summary>Ids of those who get a picture: they want more days than others (<see cref="BriefDays.OfPicture"/>).</summary>
    public static IReadOnlySet<string> Pictured(Contact contact, LocalDate date, IReadOnlyList<BriefSubject> subjects)
    {
        if (!BriefForms.On(contact, date).Contains(BriefForm.Daily))
        {
            return new HashSet<string>(StringComparer.Ordinal);
        }

        var shown = Shown(contact, subjects);
        return Named(ToLookAt(contact, date, shown, CommonSilence.Of(shown)), RowsAtMost).Select(subject => subject.Person.Id).ToHashSet(StringComparer.Ordinal);
    }

    private static LocalDate? UpTo(List<BriefSubject> shown) => shown.Where(subject => subject.Days.Count > 0).Max(subject => (LocalDate?)subject.Days[^1].Date);

    private static RoleView ViewOf(Contact contact, List<BriefSubject> shown) => RoleView.Of(contact.Role, shown.Count);

    private static Brief Bare(Contact contact, LocalDate date, LocalDate? upTo, List<BriefLine> asked) => new()
    {
        ContactId = contact.Id,
        ContactName = OneLine.Of(contact.Name),
        Date = date,
        DataUpTo = upTo,
        FirstLine = "",
        Flagged = [],
        FlaggedBeyond = 0,
        Returned = [],
        Questions = [.. asked.Select(line => line with { Subject = OneLine.Of(line.Subject), Sentence = OneLine.Sentence(line.Sentence) })],
        Groups = [],
    };

    private static Brief Daily(Brief bare, Contact contact, List<BriefSubject> shown, List<BriefSubject> flagged, LocalDate upTo, bool self)
    {
        var room = RowsAtMost - (bare.Calls?.Calls.Count ?? 0);
        return bare with
        {
            Flagged = [.. Named(flagged, room).Select(subject => Flag(subject, self ? ContactRole.Self : contact.Role == ContactRole.Self ? ContactRole.Coach : contact.Role, upTo, self))],
            FlaggedBeyond = Math.Max(0, flagged.Count - room),
            Returned = [.. shown.SelectMany(subject => Returned(subject, self))],
            Changed = [.. shown.SelectMany(subject => Changed(subject, self))],
            Groups = Groups(contact, shown, upTo, self),
        };
    }

    /// <summary>Warnings first. Whoever is only silent, and not alone, is told of in common; whoever is only to be called, in the call list.</summary>
    private static List<BriefSubject> ToLookAt(Contact contact, LocalDate date, List<BriefSubject> shown, IReadOnlyList<BriefSubject> silent)
    {
        var together = silent.Select(subject => subject.Person.Id).ToHashSet(StringComparer.Ordinal);
        var calls = BriefForms.On(contact, date).Contains(BriefForm.CallList);
        return
        [
            .. shown
                .Where(subject => ToLookAt(subject) && !(together.Contains(subject.Person.Id) && CommonSilence.IsOnlySilent(subject)))
                .Where(subject => !calls || !CallLists.IsOnlyToCall(subject, date))
                .OrderByDescending(Worst),
        ];
    }

    /// <summary>Standing and told: one that is shelved or suppressed is not.</summary>
    internal static bool IsActive(AlertNews news) => news.Alert.IsTold;

    /// <summary>Active alerts, the gravest first: warnings, what nobody has seen yet, then by the rank of the rule.</summary>
    internal static IEnumerable<AlertNews> Active(BriefSubject subject) => subject.Alerts
        .Where(IsActive)
        .OrderByDescending(news => news.Alert.Severity)
        .ThenBy(news => news.Alert.State == AlertState.Acknowledged)
        .ThenBy(news => RuleTexts.Rank(news.Alert.Key.Rule))
        .ThenBy(news => news.Alert.Id, StringComparer.Ordinal);

    /// <summary>The name to show: the person's own, or "You"; the id for a name of which nothing can be shown.</summary>
    internal static string NameOf(Person person, bool self) => (self, OneLine.Of(person.Name)) switch
    {
        (true, _) => "You",
        (_, "") => person.Id,
        (_, var name) => name,
    };

    /// <summary>An acknowledged alert asks for nothing more; it stays beside one that does, and in the group's table.</summary>
    internal static bool ToLookAt(BriefSubject subject) =>
        subject.Alerts.Any(news => IsActive(news) && (news.IsNew || news.Alert.State == AlertState.Unacknowledged));

    /// <summary>The contact's people, each with the alerts that may be told to a reader of this role.</summary>
    private static List<BriefSubject> Shown(Contact contact, IReadOnlyList<BriefSubject> subjects)
    {
        var people = PeopleOf(contact, subjects);
        var view = RoleView.Of(contact.Role, people.Count);
        return [.. people.Select(subject => subject with
        {
            Alerts = [.. subject.Alerts.Where(news => view.ShowsRule(news.Alert.Key.Rule))],
            Notes = [.. subject.Notes.Where(note => view.ShowsRule(note.Rule))],
            Suppressed = [.. subject.Suppressed.Where(finding => view.ShowsRule(finding.Rule))],
        })];
    }

    private static List<BriefSubject> PeopleOf(Contact contact, IReadOnlyList<BriefSubject> subjects) =>
    [
        .. subjects
            .Where(subject => contact.People.Count > 0
                ? contact.People.Contains(subject.Person.Id, StringComparer.OrdinalIgnoreCase)
                : contact.Groups.Contains(subject.Group.Id, StringComparer.Ordinal))
            .DistinctBy(subject => subject.Person.Id, StringComparer.OrdinalIgnoreCase)
            .OrderBy(subject => OneLine.Of(subject.Person.Name), StringComparer.OrdinalIgnoreCase)
            .ThenBy(subject => subject.Person.Id, StringComparer.OrdinalIgnoreCase),
    ];

    private static Severity Worst(BriefSubject subject) => subject.Alerts.Where(IsActive).Max(news => news.Alert.Severity);

    /// <summary>Where there are too many for one brief, the graver reasons are named; in the order of the brief.</summary>
    private static IEnumerable<BriefSubject> Named(List<BriefSubject> flagged, int room)
    {
        var named = flagged
            .OrderByDescending(Worst)
            .ThenBy(subject => Active(subject).Min(news => RuleTexts.Rank(news.Alert.Key.Rule)))
            .Take(room)
            .Select(subject => subject.Person.Id)
            .ToHashSet(StringComparer.Ordinal);
        return flagged.Where(subject => named.Contains(subject.Person.Id));
    }

    private static FlaggedPerson Flag(BriefSubject subject, ContactRole role, LocalDate upTo, bool self) =>
        new(subject.Person.Id, NameOf(subject.Person, self), Worst(subject), [.. Active(subject).Select(news => Reason(news, role, self))])
        {
            Picture = PersonPictures.Of(subject, upTo),
        };

    private static FlaggedReason Reason(AlertNews news, ContactRole role, bool self) => new(
        news.Alert.Id,
        news.Alert.Key.Rule,
        news.Alert.Key.Region,
        news.Alert.Severity,
        OneLine.Sentence(news.Alert.Text),
        RuleTexts.Consider(news.Alert.Key, self),
        RuleTexts.Decides(news.Alert.Key.Rule, role),
        news.IsNew,
        news.Alert.State == AlertState.Acknowledged)
    {
        Named = RuleTexts.Named(news.Alert.Key, self),
        TimeToRespond = RuleTexts.TimeToRespond(news.Alert.Key.Rule),
        StandsSince = news.Alert.StandsSince,
    };

    private static IEnumerable<BriefLine> Returned(BriefSubject subject, bool self) => subject.Alerts
        .Where(news => news.ReturnedSince && !IsActive(news))
        .OrderBy(news => RuleTexts.Order(news.Alert.Key.Rule))
        .ThenBy(news => news.Alert.Id, StringComparer.Ordinal)
        .Select(news => RuleTexts.Returned(news, subject.Group.Limits, PlanOf(subject), self))
        .Distinct(StringComparer.Ordinal)
        .Select(sentence => new BriefLine(NameOf(subject.Person, self), OneLine.Sentence(sentence)));

    private static IEnumerable<BriefLine> Changed(BriefSubject subject, bool self) => subject.Notes
        .OrderBy(note => RuleTexts.Order(note.Rule))
        .ThenBy(note => note.Quantity, StringComparer.Ordinal)
        .Select(note => new BriefLine(NameOf(subject.Person, self), OneLine.Sentence(note.Text)));

    private static DayPlan PlanOf(BriefSubject subject) => subject.Days.Count == 0 ? DayPlan.None : subject.Days[^1].Plan;

    private static IReadOnlyList<BriefGroup> Groups(Contact contact, List<BriefSubject> shown, LocalDate upTo, bool self) =>
        [.. ByGroup(contact, shown).Select(group => Table(group.First().Group, [.. group], upTo, ViewOf(contact, shown), self))];

    private static IOrderedEnumerable<IGrouping<string, BriefSubject>> ByGroup(Contact contact, List<BriefSubject> shown) => shown
        .GroupBy(subject => subject.Group.Id, StringComparer.Ordinal)
        .OrderBy(group => Place(contact.Groups, group.Key))
        .ThenBy(group => group.Key, StringComparer.Ordinal);

    private static BriefGroup Table(Group group, List<BriefSubject> members, LocalDate upTo, RoleView view, bool self) => new(
        group.Id,
        OneLine.Of(group.Name),
        LoadUnits.Of(group.LoadQuantity),
        [.. members.Select(member => BriefRows.Of(member, upTo, view, self))])
    {
        NotWatched = UnwatchedLines.Of(members, upTo, view, self),
    };

    private static int Place(IReadOnlyList<string> order, string id)
    {
        for (var place = 0; place < order.Count; place++)
        {
            if (string.Equals(order[place], id, StringComparison.Ordinal))
            {
                return place;
            }
        }

        return order.Count;
    }
}
