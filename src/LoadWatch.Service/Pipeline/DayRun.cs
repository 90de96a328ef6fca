using LoadWatch.Activities;
using LoadWatch.Anchors;
using LoadWatch.Capacity;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Limits;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Recordings;
using LoadWatch.Rows;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using LoadWatch.Storage.Rows;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>
/// One person's days and findings from a date on, a stretch at a time, so that memory stays flat however long ago it begins. What lies before the first stretch is
/// read as it is stored: the days that look-backs need, with what they carry.
/// </summary>
/// <param name="from">First date to compute.</param>
/// <param name="through">Last date.</param>
/// <param name="marks">Of the person when it was found to be behind.</param>
public sealed class DayRun(WorkingConfiguration configuration, TableBasis basis, Person person, LocalDate from, LocalDate through, long marks)
{
    private const int StretchDays = 400;

    /// <summary>Recordings of squads are often uploaded two days later.</summary>
    private const int WaitDays = 2;

    private const int QuestionDays = 60;

    private readonly PersonPlans plans = new(configuration);
    private readonly Lazy<ReferencePeriods> periods = new(() => ReferencePeriods.Of(person, configuration.GroupOf(person), basis.AnchorsOf(person, from)));
    private LocalDate? replacedTo;
    private IReadOnlyList<Day>? before;
    private LocalDate? next;

    public bool IsDone { get; private set; }

    /// <summary>Computes the next stretch from one state of the database.</summary>
    public DayStretch Next(StoreSession session)
    {
        before ??= Begin(session);
        var replaced = replacedTo?.PlusDays(1) ?? from;
        var first = next is { } date && date <= through ? date : (LocalDate?)null;
        IsDone = first is null || Period.DaysBetween(first.Value, through) < StretchDays;
        var to = IsDone ? through : first!.Value.PlusDays(StretchDays - 1);
        var training = PersonTraining.Of(session, configuration, basis, person, first ?? replaced, IsDone ? null : to.PlusDays(LoadCalendar.SettledDaysBack));
        var changes = Changes(session, before.Count == 0 ? first ?? replaced : before[0].Date, to);
        var series = first is { } start ? Series(session, training, start, to, changes) : new PersonSeries([], []);
        var stretch = new DayStretch(person.Id, replaced, IsDone ? null : to, series, [.. Questions(training).Where(question => question.About >= replaced && (IsDone || question.About <= to))])
        {
            Through = through,
            Marks = marks,
            OldestQuestion = through.PlusDays(-QuestionDays),
        };
        (replacedTo, next) = (to, to.PlusDays(1));
        var wanted = Wanted(to.PlusDays(1));
        before = [.. before.Concat(series.Days).Where(day => day.Date >= wanted)];
        return IsDone && series.Days.Count > 0 ? stretch with { Room = Room(session, to.PlusDays(1), changes) } : stretch;
    }

    private IReadOnlyList<Day> Begin(StoreSession session)
    {
        var days = session.Days.Before(person.Id, from, Wanted(from));
        next = days.Count > 0 ? from : Earlier(session.Activities.FirstOfPerson(person.Id), session.TableRows.FirstOfPerson(person.Id)?.PlusDays(person.DayBeginsAt == LocalTime.Midnight ? 0 : -1));
        return days;
    }

    /// <summary>The first of the days that are looked back at from a date.</summary>
    private LocalDate Wanted(LocalDate date) => TodaysLimits.First(periods.Value, date);

    private TodaysRoom Room(StoreSession session, LocalDate date, ReferenceChanges changes) =>
        TodaysLimits.Behind(person, configuration.GroupOf(person), before!, plans.Of(session, person, date, date), changes);

    private static LocalDate? Earlier(LocalDate? one, LocalDate? other) => one is { } a && other is { } b ? LocalDate.Min(a, b) : one ?? other;

    private PersonSeries Series(StoreSession session, JoinResult training, LocalDate first, LocalDate to, ReferenceChanges changes)
    {
        var since = before!.Count == 0 ? LocalDate.MinIsoValue : first;
        var tests = TestRows.Of(session, basis, person, since, to);
        var counted = training.Activities.Where(activity => activity.Date <= through);
        return PersonSeries.Continue(person, configuration.GroupOf(person), before, [.. counted], tests, plans.Of(session, person, since, to), to, changes, BestMeans(session, training, first, to));
    }

    /// <summary>Of the stretches that the rule of falling capacity compares; nothing where it reads no date.</summary>
    private IReadOnlyDictionary<string, IReadOnlyDictionary<Channel, BestMeans>>? BestMeans(StoreSession session, JoinResult training, LocalDate first, LocalDate to)
    {
        var limits = configuration.GroupOf(person).Limits.FallingCapacity;
        return limits.Enabled && training.Activities.Count > 0 ? session.Activities.BestMeans(person.Id, first.PlusDays(-2 * limits.Days), to) : null;
    }

    private ReferenceChanges Changes(StoreSession session, LocalDate since, LocalDate to) => new(periods.Value, () => new RestatedSessions(
        person,
        basis.AnchorsOf(person, from),
        configuration.Computation,
        periods.Value.Quantities,
        session.Activities.Histograms(person.Id, since, to)));

    private IEnumerable<Question> Questions(JoinResult training) => training.Questions
        .Select(question => new Question(person.Id, question.MayWait ? question.Date.PlusDays(WaitDays) : question.Date, question.Sentence, question.Date))
        .Concat(training.UnknownExercises.Select(exercise => new Question(
            person.Id, exercise.Date, $"exercise \"{exercise.Word}\": which body regions? A line under computation, exercises tells", exercise.Date)))
        .Concat(Contradictions());

    /// <summary>Asked when such a value is adopted, and not again each month.</summary>
    private IEnumerable<Question> Contradictions()
    {
        var (observed, stated) = (basis.ObservedOf(person, from), basis.StatedOf(person));
        return observed.Select(one => one.From).Distinct()
            .SelectMany(month => AnchorContradiction.On(month, observed, stated).Where(one => one.Observed.From == month).Select(one => new Question(person.Id, month, one.Words, month)));
    }
}

/// <summary>What was computed of one stretch of a person's dates.</summary>
/// <param name="From">First date that it replaces.</param>
/// <param name="To">Last date that it replaces; null: all later ones, and the person is computed.</param>
public sealed record DayStretch(string Person, LocalDate From, LocalDate? To, PersonSeries Series, IReadOnlyList<Question> Questions)
{
    /// <summary>Last date of the whole run.</summary>
    public required LocalDate Through { get; init; }

    public required long Marks { get; init; }

    /// <summary>What the limits leave open on the date behind the run; null where no day was computed.</summary>
    public TodaysRoom? Room { get; init; }

    /// <summary>Questions to be asked before it are forgotten.</summary>
    public required LocalDate OldestQuestion { get; init; }

    public void Write(StoreSession session)
    {
        session.Days.Replace(Person, From, Series.Days, To);
        session.Findings.Replace(Person, From, Series.Findings, To);
        session.Questions.Replace(Person, From, To ?? LocalDate.MaxIsoValue, Questions, OldestQuestion);
        if (To is null)
        {
            session.People.Computed(Person, Through, Marks);
            WriteRoom(session);
        }
    }

    /// <summary>What is dirty behind the last date alone leaves it.</summary>
    private void WriteRoom(StoreSession session)
    {
        if (From <= Through)
        {
            session.Rooms.Replace(Person, Room);
        }
    }
}
