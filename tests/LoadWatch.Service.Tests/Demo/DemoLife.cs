using System.Globalization;
using LoadWatch.Activities;
using LoadWatch.Days;
using LoadWatch.Decoding;
using LoadWatch.Decoding.Csv;
using LoadWatch.Findings;
using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Recordings;
using LoadWatch.Rows;
using LoadWatch.Service.Arrivals;
using LoadWatch.Service.Demo;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage.Decisions;
using LoadWatch.Storage.Rows;
using NodaTime;

namespace LoadWatch.Service.Tests.Demo;

/// <summary>
/// The demo by the steps of the service, in memory: tables decoded and their rows given to people, recordings computed and joined with them, plan and answers,
/// days and findings. Left out: files, archive, merging (each session is one recording) and the life of alerts.
/// </summary>
internal sealed class DemoLife
{
    private static readonly DecoderSet Decoders = new(BuiltInLayouts.All);
    private static readonly ComputationSettings Settings = new();

    private readonly int seed;
    private readonly LocalDate until;
    private readonly IReadOnlyList<DemoPerson> people;
    private readonly Dictionary<string, Group> groups;
    private readonly Subjects subjects;
    private readonly List<StoredRow> rows;

    public DemoLife(int seed, LocalDate until)
    {
        (this.seed, this.until) = (seed, until);
        people = [.. DemoCast.All.Select(part => DemoPerson.Draw(part, seed, until))];
        groups = DemoCast.All.Select(part => part.Group).Distinct()
            .ToDictionary(group => group, group => new Group(group, group, DemoCast.LoadOf(group), group == DemoCast.Class ? RuleLimits.OfClinic() : new RuleLimits()));
        subjects = new Subjects(people.ToDictionary(person => person.Person.Id, person => person.Person), groups, DeviceBook.Empty);
        rows = [.. new DemoTables(people, seed, until).Last.SelectMany(table => Rows(table.Path, table.Bytes))];
    }

    public IEnumerable<DemoEnd> Ends => people.AsParallel().AsOrdered().Select(End);

    private IEnumerable<StoredRow> Rows(string path, byte[] bytes)
    {
        var decoded = Decoders.Decode(bytes);
        Assert.Empty(decoded.Problems);
        return TableUpdate.Apply(
            [], new TableVersion(path, path, path, Instant.MinValue, Owner: null), decoded.Table!, row => row.Subject is { } written ? subjects.Find(written, row.Date)?.Id : null);
    }

    private DemoEnd End(DemoPerson demo)
    {
        var person = demo.Person;
        var own = rows.Where(row => row.Person == person.Id).ToList();
        var plan = PersonPlans.Plan(
            [.. rows.Where(row => row.Kind == RowKind.Plan && subjects.Of(row)?.Contains(person) == true).Select(PersonPlans.Entry)],
            own.FindAll(row => row.Kind == RowKind.Days),
            [.. own.Where(row => row.Kind == RowKind.Answers).Select(Decided).OfType<Decision>()]);
        var training = ActivityJoin.Join(
            person,
            Recorded(demo),
            [.. own.Where(row => row.Kind is RowKind.Sessions or RowKind.Sets).Select(row => new OwnedRow(row.Layout, row.Date, row.Key, row.Content))],
            new AnchorBook(demo.Anchors),
            Settings);
        var tests = own.Where(row => row.Kind == RowKind.Tests).Select(row => new DatedTest(row.Date, (TestRow)row.Content)).ToList();
        var series = PersonSeries.Of(person, groups[person.Group], training.Activities, tests, plan, until.PlusDays(-1));
        var alerts = series.Findings
            .Where(finding => finding.Date == until.PlusDays(-1))
            .Select(finding => new DemoAlert(finding.Person, finding.Rule, finding.Region, finding.Severity));
        return new DemoEnd(demo.Part, series.Days[^1], training, [.. alerts]);
    }

    private List<RecordedActivity> Recorded(DemoPerson demo)
    {
        var anchors = new AnchorBook(demo.Anchors);
        return [.. DemoSessions.Of(demo, seed, until).Select(DemoRecording.Of).Select((recording, at) => new RecordedActivity(
            RecordingSummaries.Of(at.ToString("x64", CultureInfo.InvariantCulture), new UsableRecording(recording, Settings.UsableShareWanted), demo.Person, sourceName: null),
            LocalStart.Of(recording, demo.Person).LocalDateTime,
            ActivityComputation.Compute(recording, demo.Person, anchors, Settings)))];
    }

    private static Decision? Decided(StoredRow row)
    {
        var answer = (AnswerRow)row.Content;
        DecisionKind? kind = answer.Word switch
        {
            AnswerWord.Ill => DecisionKind.Ill,
            AnswerWord.Away => DecisionKind.Away,
            AnswerWord.Returning => DecisionKind.Returning,
            _ => null,
        };
        return kind is null ? null : new Decision(kind.Value, row.Person!, row.Person!, Instant.MinValue, answer.By, answer.Note) { From = row.Date, Until = answer.Until };
    }
}

/// <summary>The last date of one person.</summary>
internal sealed record DemoEnd(DemoPart Part, Day Day, JoinResult Training, IReadOnlyList<DemoAlert> Alerts);
