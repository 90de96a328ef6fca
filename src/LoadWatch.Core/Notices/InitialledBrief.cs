using LoadWatch.People;

namespace LoadWatch.Notices;

/// <summary>Turns a brief with names into one with initials.</summary>
internal sealed class InitialledBrief
{
    /// <summary>For a contact whose name is also that of somebody watched.</summary>
    public const string You = "you";

    private readonly Brief brief;
    private readonly IReadOnlyDictionary<string, string> names;
    private readonly IReadOnlyDictionary<string, string> labels;
    private readonly NameCover cover;

    public InitialledBrief(Brief brief, IReadOnlyList<Person> people)
    {
        var shown = brief.Groups.SelectMany(group => group.Rows).Select(row => row.PersonId).Concat(brief.People).ToHashSet(StringComparer.OrdinalIgnoreCase);
        this.brief = brief;
        names = people.ToDictionary(person => person.Id, person => BriefBuilder.NameOf(person, self: false), StringComparer.OrdinalIgnoreCase);
        labels = Initials.Of(people.Where(person => shown.Contains(person.Id)));
        cover = new NameCover(people, labels);
    }

    public Brief Write() => brief with
    {
        ContactName = cover.File(brief.ContactName) == brief.ContactName ? brief.ContactName : You,
        Flagged = [.. brief.Flagged.Select(Flagged)],
        Returned = [.. brief.Returned.Select(Line)],
        Changed = [.. brief.Changed.Select(Line)],
        Questions = [.. brief.Questions.Select(Question)],
        Groups = [.. brief.Groups.Select(Group)],
        Week = brief.Week is { } week ? Week(week) : null,
        Calls = brief.Calls is { } calls ? calls with { Calls = [.. calls.Calls.Select(Call)] } : null,
        Sheets = [.. brief.Sheets.Select(sheet => new ClassSheet(cover.Sentence(sheet.Heading), [.. sheet.People.Select(Planned)]))],
        People = [],
    };

    private BriefLine Line(BriefLine line) => line with { Subject = Subject(line.Subject), Sentence = cover.Sentence(line.Sentence) };

    private BriefGroup Group(BriefGroup group) => group with
    {
        Name = cover.Sentence(group.Name),
        Rows = [.. group.Rows.Select(Row)],
        NotWatched = [.. group.NotWatched.Select(cover.Sentence)],
    };

    private BriefWeek Week(BriefWeek week) => week with
    {
        Groups = [.. week.Groups.Select(group => group with { Name = cover.Sentence(group.Name) })],
        Standing = [.. week.Standing.Select(Line)],
        Lost = [.. week.Lost.Select(line => line with { Subject = Subject(line.Subject) })],
    };

    private Call Call(Call call) => call with
    {
        PersonId = Label(call.PersonId, call.Name),
        Name = Name(call.PersonId, call.Name),
        Why = cover.Sentence(call.Why),
    };

    private ClassPerson Planned(ClassPerson person) => person with
    {
        PersonId = Label(person.PersonId, person.Name),
        Name = Name(person.PersonId, person.Name),
        Note = person.Note is null ? null : cover.Sentence(person.Note),
    };

    /// <summary>Ids of people and alerts may be names, too. A label tells people apart as well; nobody needs the alert's id in a mail.</summary>
    private FlaggedPerson Flagged(FlaggedPerson person) => person with
    {
        PersonId = Label(person.PersonId, person.Name),
        Name = Name(person.PersonId, person.Name),
        Reasons = [.. person.Reasons.Select(reason => reason with { AlertId = "", Sentence = cover.Sentence(reason.Sentence), Named = cover.Sentence(reason.Named) })],
    };

    private BriefRow Row(BriefRow row) => row with
    {
        PersonId = Label(row.PersonId, row.Name),
        Name = Name(row.PersonId, row.Name),
        Remark = row.Remark is null ? null : cover.Sentence(row.Remark),
    };

    private BriefLine Question(BriefLine line) => line with
    {
        Subject = cover.File(line.Subject),
        Sentence = line.OfDelivery ? cover.Sentence(line.Sentence) : cover.Reason(line.Sentence),
    };

    /// <summary>A line knows its person by name alone: two of the same name have their initials without a number.</summary>
    private string Subject(string name)
    {
        var same = names.Where(pair => pair.Value == name && labels.ContainsKey(pair.Key)).Select(pair => labels[pair.Key]).ToList();
        return same switch
        {
            [] => cover.Sentence(name),
            [var only] => only,
            _ => Initials.Of(name),
        };
    }

    /// <summary>Who is spoken to stays "You".</summary>
    private string Name(string id, string name) => names.GetValueOrDefault(id) is { } own && own != name ? name : Label(id, name);

    private string Label(string id, string name) => labels.GetValueOrDefault(id) ?? Initials.Of(name);
}
