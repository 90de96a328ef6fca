using System.Globalization;
using System.Text;
using LoadWatch.Activities;
using LoadWatch.Days;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Recordings;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Export;
using LoadWatch.Service.Pipeline;
using LoadWatch.Stimulus;
using LoadWatch.Storage;
using LoadWatch.Storage.Activities;
using LoadWatch.Storage.Archives;
using NodaTime;

namespace LoadWatch.Service.Explain;

/// <summary>One session whole: what it was read from, the reference values, each number with its formula and what lies between, what was measured and what is assumed, and what was not seen.</summary>
public sealed class SessionExplanation
{
    private readonly WorkingConfiguration configuration;
    private readonly Archive archive;
    private readonly StoreSession session;
    private readonly Person person;
    private readonly TableBasis basis;
    private readonly StringBuilder text = new();

    private SessionExplanation(WorkingConfiguration configuration, Archive archive, StoreSession session, Person person)
    {
        (this.configuration, this.archive, this.session, this.person) = (configuration, archive, session, person);
        basis = TableBasis.Of(configuration, session);
    }

    /// <summary>By the id that a day shows; null where no recording leads a session of that id.</summary>
    public static string? Of(WorkingConfiguration configuration, Archive archive, StoreSession session, string id) =>
        session.Activities.Get(id) is { } stored && configuration.People.TryGetValue(stored.Winner.Person, out var person)
            ? new SessionExplanation(configuration, archive, session, person).Write(stored.Date, (activity, _) => activity.Key == id)
            : null;

    /// <summary>Every session of the person that runs at a time of a date, else those whose time nothing tells; null without any, or where the person is unknown.</summary>
    /// <param name="date">Null: the last computed day.</param>
    /// <param name="time">By the clock of the session.</param>
    public static string? Of(WorkingConfiguration configuration, Archive archive, StoreSession session, string person, LocalDate? date, LocalTime time) =>
        configuration.People.TryGetValue(person, out var known) && (date ?? LastDay.Of(session, known.Id)?.Date) is { } on
            ? new SessionExplanation(configuration, archive, session, known).At(on, time)
            : null;

    private string? At(LocalDate date, LocalTime time) =>
        Write(date, (activity, recorded) => Runs(activity, recorded, time)) ?? Write(date, (activity, recorded) => recorded is null && activity.Start is null);

    /// <summary>Whether a session begins within the minute, or goes on then.</summary>
    private bool Runs(JoinedActivity activity, StoredActivity? recorded, LocalTime time)
    {
        if (recorded is { Session: { } told })
        {
            var start = told.Start.WithOffset(told.LocalOffset).LocalDateTime;
            var asked = start.Date + time;
            return asked.PlusMinutes(1) > start && asked <= told.End.WithOffset(told.LocalOffset).LocalDateTime;
        }

        return activity.Start is { } stated && stated.InZone(person.Zone).TimeOfDay is var begun && begun.Hour == time.Hour && begun.Minute == time.Minute;
    }

    private string? Write(LocalDate date, Func<JoinedActivity, StoredActivity?, bool> isMeant)
    {
        var recorded = session.Activities.OfPerson(person.Id, date, date).ToDictionary(activity => activity.Key, StringComparer.Ordinal);
        foreach (var activity in PersonTraining.Of(session, configuration, basis, person, date, date).Activities)
        {
            if (isMeant(activity, recorded.GetValueOrDefault(activity.Key)))
            {
                Append(activity, recorded.GetValueOrDefault(activity.Key));
            }
        }

        return text.Length == 0 ? null : text.ToString();
    }

    private void Append(JoinedActivity activity, StoredActivity? recorded)
    {
        if (text.Length > 0)
        {
            text.AppendLine();
        }

        text.AppendLine(CultureInfo.InvariantCulture, $"{OneLine.Of(person.Name)}, session {SessionText.Start(recorded)} {SessionText.Rest(activity)}");
        Line($"{(recorded is null ? "" : $"id {activity.Key}, ")}counts for {Words.Date(activity.Date)}");
        Head("read from");
        SessionText.AppendRecordings(text, session, recorded);
        foreach (var table in activity.Tables)
        {
            Line($"rows of the table {OneLine.Of(table)}");
        }

        var stimulus = StimulusOf(activity, recorded);
        var anchors = AnchorsOf(activity, stimulus.Exercises);
        Head("reference values");
        AppendAnchors(activity, anchors);
        Head("quantities");
        AppendQuantities(activity, recorded);
        AppendLoad(activity);
        AppendZones(recorded);
        Head("what it asked of the muscles");
        stimulus.Append(text);
        Head("measured and assumed");
        AppendEvidence(activity, anchors, stimulus);
        Head("not seen, or not known");
        foreach (var remark in activity.Remarks.Distinct(StringComparer.Ordinal).Concat(NotSeen(activity)).DefaultIfEmpty("nothing that LoadWatch would ask for"))
        {
            Line(OneLine.Of(remark));
        }
    }

    /// <summary>With the regions where it is not of all that the session went through.</summary>
    private static IEnumerable<string> NotSeen(JoinedActivity activity) => activity.Stimulus
        .SelectMany(region => region.NotSeen.Select(remark => (Remark: remark, region.Region)))
        .Distinct()
        .Where(one => !activity.Remarks.Contains(one.Remark))
        .GroupBy(one => one.Remark, one => BodyRegions.Word(one.Region), StringComparer.Ordinal)
        .Select(same => same.Count() == activity.Stimulus.Count ? same.Key : $"{string.Join(", ", same)}: {same.Key}");

    /// <summary>Those that are read of a session of its channels and its sport.</summary>
    /// <param name="exercises">Of its sets; empty: any.</param>
    private List<Anchor> AnchorsOf(JoinedActivity activity, IReadOnlyCollection<string> exercises)
    {
        var book = basis.AnchorsOf(person);
        IEnumerable<AnchorKind> kinds =
        [
            .. activity.UsableShare.ContainsKey(Channel.HeartRate)
                ? [AnchorKind.HeartRateRest, AnchorKind.HeartRateMax, AnchorKind.HeartRateVt1, AnchorKind.HeartRateVt2, AnchorKind.TrimpWeight, AnchorKind.TrimpExponent]
                : Array.Empty<AnchorKind>(),
            .. activity.Sport.Family == "cycling" && activity.UsableShare.ContainsKey(Channel.Power) ? [AnchorKind.BodyMass] : Array.Empty<AnchorKind>(),
        ];
        return
        [
            .. kinds.Select(kind => book.On(activity.Date, person.Id, kind)).OfType<Anchor>(),
            .. MaximaOf(activity)?.Read ?? [],
            .. activity[QuantityNames.Sets] is null ? [] : Maxima(book, activity.Date, exercises),
        ];
    }

    /// <summary>As the stimulus reads them; null of a session without the channel.</summary>
    private MaximumReading? MaximaOf(JoinedActivity activity)
    {
        var book = basis.AnchorsOf(person);
        return ReadsSpeed(activity.Sport)
            ? activity.UsableShare.ContainsKey(Channel.Speed) ? MaximumReading.OfSpeed(book, activity.Date, person.Id) : null
            : activity.UsableShare.ContainsKey(Channel.Power) ? MaximumReading.OfPower(book, activity.Date, person.Id, activity.Sport) : null;
    }

    /// <summary>The maximal power or speed that holds but that the stimulus does not read, with the reason.</summary>
    private string? NotRead(JoinedActivity activity)
    {
        var book = basis.AnchorsOf(person);
        var held = ReadsSpeed(activity.Sport)
            ? book.On(activity.Date, person.Id, AnchorKind.SpeedMax)
            : book.On(activity.Date, person.Id, AnchorKind.PowerMax, activity.Sport);
        return held is not null && MaximaOf(activity)?.WhyNot(held) is { } why
            ? $"not read for the stimulus ({why}): {AnchorText.Of(held)}{(held.Kind == AnchorKind.SpeedMax ? "; read for shares of the best speed" : "")}"
            : null;
    }

    private static bool ReadsSpeed(Sport sport) => sport.IsOnFoot || sport.IsTeamSport;

    private IEnumerable<Anchor> Maxima(AnchorBook book, LocalDate date, IReadOnlyCollection<string> exercises) => book.Of(person.Id)
        .Where(anchor => anchor.Kind == AnchorKind.OneRepetitionMax && !(anchor.Date > date))
        .Where(anchor => exercises.Count == 0 || exercises.Contains(ExerciseWord.Canonical(anchor.Exercise)))
        .Select(anchor => book.On(date, person.Id, anchor.Kind, anchor.Exercise, anchor.Machine)!)
        .Distinct()
        .OrderBy(anchor => anchor.Exercise, StringComparer.Ordinal).ThenBy(anchor => anchor.Machine, StringComparer.Ordinal);

    private void AppendAnchors(JoinedActivity activity, List<Anchor> anchors)
    {
        foreach (var anchor in anchors)
        {
            Line(AnchorText.Of(anchor));
        }

        if (NotRead(activity) is { } notRead)
        {
            Line(notRead);
        }

        var byAge = activity.UsableShare.ContainsKey(Channel.HeartRate) && !anchors.Exists(anchor => anchor.Kind == AnchorKind.HeartRateMax)
            ? AnchorText.ByAge(person, activity.Date, configuration.Anchors.HeartRateMaxEquation)
            : null;
        if (byAge is not null)
        {
            Line(byAge);
        }
        else if (anchors.Count == 0)
        {
            Line("none that bears on such a session");
        }
    }

    private void AppendQuantities(JoinedActivity activity, StoredActivity? recorded)
    {
        var equations = configuration.Computation.Equations;
        var steps = recorded is not null && session.Activities.Histogram(recorded.Key, Channel.HeartRate) is { } heartRate
            ? new HeartRateSteps(heartRate, activity.Date, person, basis.AnchorsOf(person), equations)
            : null;
        var computed = (recorded?.Values.Quantities ?? []).Select(one => one.Name).ToHashSet(StringComparer.Ordinal);
        foreach (var quantity in activity.Quantities)
        {
            Line(QuantityText.Of(quantity));
            var giver = activity.StatedBy.GetValueOrDefault(quantity.Name);
            var formula = giver is null ? QuantityFormula.Of(quantity.Name, equations, person.AgeOn(activity.Date)) : null;
            Below(giver is not null ? $"as the table {OneLine.Of(giver)} states it" : formula is null ? "as a table states it" : $"formula  {formula.Formula}");
            if (formula is not null)
            {
                Below($"source   {formula.Source}");
            }

            foreach (var step in Steps(quantity.Name, activity, computed.Contains(quantity.Name) ? steps : null))
            {
                Below(step);
            }
        }
    }

    private static IEnumerable<string> Steps(string quantity, JoinedActivity activity, HeartRateSteps? steps) =>
        quantity == QuantityNames.FosterLoad && !activity.StatedBy.ContainsKey(quantity) && activity[QuantityNames.Rating] is { } rating && activity[QuantityNames.Minutes] is { } minutes
            ? [string.Create(CultureInfo.InvariantCulture, $"{rating:0.##} x {minutes:0.##} min")]
            : steps?.Of(quantity) ?? [];

    /// <summary>What the session counts for in the series of its group, and by which line, where it was converted.</summary>
    private void AppendLoad(JoinedActivity activity)
    {
        var group = configuration.GroupOf(person);
        var kept = session.Days.Before(person.Id, activity.Date.PlusDays(1), activity.Date).SelectMany(day => day.Sessions).FirstOrDefault(one => one.Key == activity.Key);
        if (kept is null)
        {
            return;
        }

        var load = kept.Load is { } known ? known.ToString("0.###", CultureInfo.InvariantCulture) + " " + LoadUnits.Of(group.LoadQuantity) : "unknown";
        var way = kept switch
        {
            { ConvertedFrom: null } => "",
            { LoadError: null } => $", {kept.ConvertedFrom} as it stands, in its own unit",
            _ => $", converted from {kept.ConvertedFrom}",
        };
        Line($"counts in the series of {group.LoadQuantity} with {load}{way}{(kept.AddsLoad ? "" : ", not added: counted elsewhere")}");
        if (kept is { ConvertedFrom: { } source, Load: { } value } && activity[source] is { } x && LineOf(activity.Date, kept) is { } line && line.Apply(x) == value)
        {
            Below(string.Create(CultureInfo.InvariantCulture, $"{line.Intercept:0.###} + {line.Slope:0.####} x {x:0.###}: least squares through {line.Pairs} own sessions that have both, {Words.Date(line.Since)} to {Words.Date(line.Before.PlusDays(-1))}; standard error {line.StandardError:0.###}"));
        }
    }

    private ConversionLine? LineOf(LocalDate date, DaySession kept)
    {
        var group = configuration.GroupOf(person);
        var first = date.PlusDays(1 - date.Day).PlusMonths(1 - LoadOrder.LastLineMonths - LoadConversion.Months);
        var before = session.Days.Before(person.Id, date, first).SelectMany(day => day.Sessions.Select(one => one.On(day.Date)));
        var order = new LoadOrder(
            group.LoadQuantity, group.LoadFallbacks, [.. before.Select(one => new SessionLoads(one.Date, one.Quantities))], person.HeartRateIsValidOn);
        return order.Choose(new SessionLoads(date, kept.On(date).Quantities))?.Line;
    }

    private void AppendZones(StoredActivity? recorded)
    {
        foreach (var zones in recorded?.Values.TimesInZone ?? [])
        {
            var unit = Words.Unit(zones.Channel);
            var times = zones.Seconds.Select((seconds, zone) => string.Create(CultureInfo.InvariantCulture, $"{seconds / 60:0.#} min {(zone == 0 ? $"below {zones.Bounds[0]:0.#}" : $"from {zones.Bounds[zone - 1]:0.#}")}"));
            Line($"{ChannelWords.Of(zones.Channel)} by {zones.Basis}, {unit}{(zones.Estimated ? " (estimated)" : "")}: {string.Join(", ", times)}");
        }
    }

    private StimulusText StimulusOf(JoinedActivity activity, StoredActivity? recorded)
    {
        var archived = recorded is null ? null : ArchivedSession.Stimulus(configuration, archive, session, basis, person, recorded.Merge);
        return new StimulusText(activity, archived, isUnreadable: recorded is not null && archived is null, configuration.Computation.Equations, person.AgeOn(activity.Date));
    }

    private void AppendEvidence(JoinedActivity activity, List<Anchor> anchors, StimulusText stimulus)
    {
        var measured = activity.UsableShare.Keys.Order().Select(ChannelWords.Of).Concat(anchors.Where(anchor => anchor.Source == AnchorSource.Measured).Select(Name)).ToList();
        Line($"measured, or stated as such: {(measured.Count == 0 ? "nothing" : string.Join(", ", measured))}");
        foreach (var anchor in anchors.Where(anchor => anchor.Source != AnchorSource.Measured))
        {
            Line($"{Words.Of(anchor.Source)}: {Name(anchor)}");
        }

        foreach (var anchor in anchors)
        {
            if (activity.Stimulus.Count > 0 && AnchorText.Error(anchor) is { } error)
            {
                Line($"assumed: {Name(anchor)} is within {error}");
            }
        }

        foreach (var grade in activity.Stimulus.Select(region => region.Grade).Distinct().Order())
        {
            Line($"grade {grade}: {StimulusFormula.Of(grade)}");
        }

        foreach (var assumption in stimulus.Assumptions())
        {
            Line($"assumed: {assumption}");
        }
    }

    private static string Name(Anchor anchor) => AnchorText.Name(anchor.Kind, anchor.Exercise, anchor.Machine);

    private void Head(string heading) => text.AppendLine(CultureInfo.InvariantCulture, $"  {heading}");

    private void Line(string line) => text.AppendLine(CultureInfo.InvariantCulture, $"    {line}");

    private void Below(string line) => text.AppendLine(CultureInfo.InvariantCulture, $"        {line}");
}
