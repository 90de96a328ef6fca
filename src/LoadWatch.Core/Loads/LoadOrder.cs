using NodaTime;

namespace LoadWatch.Loads;

/// <summary>
/// Chooses the load of each session of one person: the group's own quantity, else the first of its fallbacks that the session has and that the
/// person's sessions convert. While a person's heart rate says little about effort (medicine, for one), every load from it is off, also as half of a
/// pair, and the rating of effort comes first among the fallbacks, named or not.
/// Keeps the lines of every month that it was asked for. Not safe for several threads.
/// </summary>
public sealed class LoadOrder
{
    /// <summary>So long a line goes on while heart rate is not valid. A choice.</summary>
    public const int LastLineMonths = 36;

    private readonly string wanted;
    private readonly IReadOnlyList<string> fallbacks;
    private readonly IReadOnlyList<string> fallbacksWithoutHeartRate;
    private readonly Func<LocalDate, bool> heartRateValid;
    private readonly Lazy<SessionLoads[]> sessions;
    private readonly Lazy<LocalDate?> firstWanted;
    private readonly Dictionary<string, LoadPairs> pairs = new(StringComparer.Ordinal);
    private readonly Dictionary<(LocalDate Month, string From), ConversionLine?> lines = [];
    private readonly LocalDate firstMonth = LocalDate.MinIsoValue;
    private readonly CarriedLoads? before;

    /// <param name="loadQuantity">Name of the group's load.</param>
    /// <param name="fallbacks">Names of what stands in for it, first choice first.</param>
    /// <param name="sessions">All of the person up to the dates asked for, in any order; with <paramref name="before"/>, from the 12 months before the first month asked for on.</param>
    /// <param name="heartRateValid">Whether loads from heart rate mean anything for the person on a date.</param>
    /// <param name="before">What is carried of the sessions before <paramref name="from"/>; null: there are none but <paramref name="sessions"/>.</param>
    /// <param name="from">The first date asked for.</param>
    public LoadOrder(
        string loadQuantity,
        IReadOnlyList<string> fallbacks,
        IReadOnlyList<SessionLoads> sessions,
        Func<LocalDate, bool> heartRateValid,
        CarriedLoads? before = null,
        LocalDate? from = null)
    {
        this.before = before;
        firstMonth = before is not null && from is { } first ? LoadConversion.FirstOfMonth(first) : LocalDate.MinIsoValue;
        wanted = loadQuantity;
        this.fallbacks = fallbacks;
        fallbacksWithoutHeartRate = [.. fallbacks.Prepend(QuantityNames.FosterLoad).Where(name => !QuantityNames.IsOfHeartRate(name))];
        this.heartRateValid = heartRateValid;
        this.sessions = new Lazy<SessionLoads[]>(() => [.. sessions.Select(WithoutInvalid)]);
        firstWanted = new Lazy<LocalDate?>(FirstWanted);
    }

    /// <summary>The load of a session, or null where it has neither the quantity nor a fallback with a line.</summary>
    /// <param name="session">It need not be among the person's sessions: a line never rests on its own month.</param>
    public ChosenLoad? Choose(SessionLoads session)
    {
        var usable = WithoutInvalid(session);
        return usable[wanted] is { } own ? new ChosenLoad(own.Value, own.Estimated, wanted, Line: null) : Converted(usable);
    }

    /// <summary>The load of a session in a series by other reference values than those of its own date; null where it has none, and where it was converted without heart rate.</summary>
    /// <param name="session">With its quantities by those values.</param>
    /// <param name="linesOf">The date whose lines convert it.</param>
    public double? Restate(SessionLoads session, LocalDate linesOf)
    {
        var usable = WithoutInvalid(session);
        return usable[wanted]?.Value ?? (heartRateValid(session.Date)
            ? fallbacks.Select(from => usable[from] is { } there ? Line(linesOf, from)?.Apply(there.Value) : null).FirstOrDefault(load => load is not null)
            : null);
    }

    private ChosenLoad? Converted(SessionLoads session)
    {
        var isValid = heartRateValid(session.Date);
        foreach (var from in isValid ? fallbacks : fallbacksWithoutHeartRate)
        {
            if (session[from] is { } there && (isValid ? Line(session.Date, from) : LastLine(session.Date, from)) is { } line)
            {
                return new ChosenLoad(line.Apply(there.Value), Estimated: true, from, line);
            }
        }

        return isValid || !QuantityNames.IsOfHeartRate(wanted) || firstWanted.Value <= session.Date || session[QuantityNames.FosterLoad] is not { } rated
            ? null
            : new ChosenLoad(rated.Value, Estimated: true, QuantityNames.FosterLoad, Line: null);
    }

    /// <summary>What is to be carried behind a date.</summary>
    public CarriedLoads CarriedOn(LocalDate date) => new(
        firstWanted.Value <= date ? firstWanted.Value : null,
        fallbacksWithoutHeartRate.Distinct(StringComparer.Ordinal)
            .Order(StringComparer.Ordinal)
            .Select(from => (from, Line: LastLine(date, from)))
            .Where(last => last.Line is not null)
            .ToDictionary(last => last.from, last => last.Line!, StringComparer.Ordinal));

    /// <summary>Since heart rate is not valid no new pairs come: the last line that there was goes on.</summary>
    private ConversionLine? LastLine(LocalDate date, string from)
    {
        var oldest = LoadConversion.FirstOfMonth(date).PlusMonths(1 - LastLineMonths);
        for (var month = LoadConversion.FirstOfMonth(date); month >= oldest && month >= firstMonth; month = month.PlusMonths(-1))
        {
            if (Line(month, from) is { } line)
            {
                return line;
            }
        }

        return before?.LastLines.GetValueOrDefault(from) is { } carried && carried.Before >= oldest ? carried : null;
    }

    /// <summary>
    /// The first date with a load of the group's kind; null without any: such a person has a series of ratings, in their own unit. Mixed with converted ones
    /// it would break.
    /// </summary>
    private LocalDate? FirstWanted() => before?.FirstWanted ?? sessions.Value.Where(session => session[wanted] is not null).Min(session => (LocalDate?)session.Date);

    private ConversionLine? Line(LocalDate date, string from)
    {
        var key = (LoadConversion.FirstOfMonth(date), from);
        if (!lines.TryGetValue(key, out var line))
        {
            lines[key] = line = LoadConversion.For(Pairs(from), date, wanted, from);
        }

        return line;
    }

    private LoadPairs Pairs(string from)
    {
        if (!pairs.TryGetValue(from, out var found))
        {
            pairs[from] = found = new LoadPairs(sessions.Value, wanted, from);
        }

        return found;
    }

    private SessionLoads WithoutInvalid(SessionLoads session) => heartRateValid(session.Date)
        ? session
        : session with { Quantities = [.. session.Quantities.Where(quantity => !QuantityNames.IsOfHeartRate(quantity.Name))] };
}
