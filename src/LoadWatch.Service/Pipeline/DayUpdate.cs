using LoadWatch.Activities;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Rows;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using LoadWatch.Storage.Rows;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>Brings the days and findings of everybody up to the last date that is over in their zone (I-14).</summary>
public sealed class DayUpdate(WorkingConfiguration configuration, Store store, Instant now, SweepReport report)
{
    /// <summary>A later recording settles up to seven earlier days (I-6).</summary>
    private const int SettlingDays = 7;

    private const int PeopleInOneCommit = 20;

    /// <summary>Recordings of squads are often uploaded two days later.</summary>
    private const int WaitDays = 2;

    private const int QuestionDays = 60;

    private TableBasis basis = null!;
    private IReadOnlyDictionary<string, PersonPlan> plans = null!;
    private IReadOnlyDictionary<string, long> marks = null!;

    /// <summary>Dates through which people are computed, by person, where it is not the last date that is over for them.</summary>
    public IReadOnlyDictionary<string, LocalDate> Through { get; init; } = new Dictionary<string, LocalDate>();

    /// <param name="last">Written in the commit of the last people, or in one of its own where nobody's days are computed: every commit waits for the disk.</param>
    public void Run(CancellationToken cancel, Action<StoreSession>? last = null)
    {
        var behind = store.Read(session =>
        {
            basis = TableBasis.Of(configuration, session);
            plans = new PersonPlans(configuration).Of(session);
            marks = session.People.Marks();
            var dirty = session.People.Dirty().ToDictionary(item => item.Person, item => item.From, StringComparer.Ordinal);
            return configuration.People.Values
                .OrderBy(person => person.Id, StringComparer.Ordinal)
                .Select(person => (person, From: RecomputeFrom(session, person, dirty)))
                .Where(item => item.From is not null)
                .ToList();
        });
        var groups = behind.Chunk(PeopleInOneCommit).ToList();
        foreach (var group in groups)
        {
            cancel.ThrowIfCancellationRequested();
            var computed = group.AsParallel().AsOrdered().Select(item => Compute(item.person, item.From!.Value)).ToList();
            store.Write(session =>
            {
                computed.ForEach(series => series.Write(session));
                if (group == groups[^1])
                {
                    last?.Invoke(session);
                }
            });
            report.PeopleComputed += computed.Count;
            report.Advanced();
        }

        if (groups.Count == 0 && last is not null)
        {
            store.Write(last);
        }
    }

    /// <summary>The last date that is over for the person: the one that rules and alerts look at.</summary>
    public static LocalDate LastDateOver(Person person, Instant now) => now.InZone(person.Zone).Date.PlusDays(-1);

    private LocalDate ThroughOf(Person person) => Through.TryGetValue(person.Id, out var date) ? date : LastDateOver(person, now);

    private LocalDate? RecomputeFrom(StoreSession session, Person person, Dictionary<string, LocalDate> dirty)
    {
        var asked = dirty.TryGetValue(person.Id, out var date) ? date : (LocalDate?)null;
        var missing = session.People.ComputedTo(person.Id) is { } done && done < ThroughOf(person) ? done.PlusDays(1) : (LocalDate?)null;
        var from = asked is { } early && missing is { } next ? LocalDate.Min(early, next) : asked ?? missing;
        return from?.PlusDays(-SettlingDays);
    }

    private ComputedSeries Compute(Person person, LocalDate from)
    {
        var group = configuration.Groups[person.Group];
        var through = ThroughOf(person);
        var (training, tests) = store.Read(session => (
            PersonTraining.Of(session, configuration, basis, person),
            session.TableRows.OfPerson(person.Id, RowKind.Tests).Select(row => new DatedTest(row.Date, (TestRow)row.Content)).ToList()));
        var series = PersonSeries.Of(person, group, training.Activities, tests, plans[person.Id], through);
        return new ComputedSeries(
            person.Id,
            from,
            through,
            marks.GetValueOrDefault(person.Id),
            series.Days.Where(day => day.Date >= from).ToList(),
            series.Findings.Where(finding => finding.Date >= from).ToList(),
            Questions(person, training).Where(question => question.Date >= through.PlusDays(-QuestionDays)).ToList());
    }

    /// <summary>An exercise of a set log that has no body region is asked about with the date of the last session.</summary>
    private static IEnumerable<Question> Questions(Person person, JoinResult training)
    {
        var last = training.Activities.Count == 0 ? (LocalDate?)null : training.Activities[^1].Date;
        return training.Questions.Select(question => new Question(person.Id, question.MayWait ? question.Date.PlusDays(WaitDays) : question.Date, question.Sentence))
            .Concat(last is { } date
                ? training.UnknownExercises.Select(word => new Question(person.Id, date, $"exercise \"{word}\": which body regions? A line under computation, exercises tells"))
                : []);
    }

    private sealed record ComputedSeries(
        string Person, LocalDate From, LocalDate Through, long Marks, IReadOnlyList<Day> Days, IReadOnlyList<Finding> Findings, IReadOnlyList<Question> Questions)
    {
        public void Write(StoreSession session)
        {
            session.Days.Replace(Person, From, Days);
            session.Findings.Replace(Person, From, Findings);
            session.Questions.Replace(Person, LocalDate.MinIsoValue, Questions);
            session.People.Computed(Person, Through, Marks);
        }
    }
}
