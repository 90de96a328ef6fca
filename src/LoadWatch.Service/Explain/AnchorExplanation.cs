using System.Globalization;
using System.Text;
using LoadWatch.Anchors;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Export;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using NodaTime;

namespace LoadWatch.Service.Explain;

/// <summary>One reference value of a person: which one holds on a date, which others there are, what own sessions show, and what rests on it.</summary>
public static class AnchorExplanation
{
    /// <summary>Null where the person or the kind is unknown.</summary>
    /// <param name="date">Null: the last computed day, or without any the first date of all that the value may hold on.</param>
    public static string? Of(WorkingConfiguration configuration, StoreSession session, string person, string kind, LocalDate? date)
    {
        if (!configuration.People.TryGetValue(person, out var known) || Kind(kind) is not { } info)
        {
            return null;
        }

        var basis = TableBasis.Of(configuration, session);
        var book = basis.AnchorsOf(known);
        var all = book.Of(known.Id).Where(anchor => anchor.Kind == info.Kind).ToList();
        var on = date ?? LastDay.Of(session, known.Id)?.Date ?? all.Max(anchor => anchor.Date) ?? LocalDate.MinIsoValue;
        var text = new StringBuilder();
        text.AppendLine(CultureInfo.InvariantCulture, $"{OneLine.Of(known.Name)}, {info.Name} ({ReferenceWords.Of(info.Kind)}){(on == LocalDate.MinIsoValue ? "" : $" on {Words.Date(on)}")}");
        AppendHolding(text, known, book, info.Kind, all, on);
        var observed = basis.ObservedOf(known).Where(one => one.Kind == info.Kind).ToList();
        AppendObserved(text, basis, known, observed, on);
        TrialText.Append(text, session, known, info.Kind, observed, on);
        text.AppendLine(CultureInfo.InvariantCulture, $"    plausible from {info.Lowest.ToString("0.###", CultureInfo.InvariantCulture)} to {AnchorText.Value(info.Highest, info.Kind)}; a measured value goes before one from own sessions, that before one by an equation");
        text.AppendLine(CultureInfo.InvariantCulture, $"    rests on it: {RestsOn(info.Kind)}");
        return text.ToString();
    }

    /// <summary>The kind of a name as <c>anchors.csv</c> writes it, or null.</summary>
    public static AnchorKindInfo? Kind(string name) => AnchorKinds.All.FirstOrDefault(kind => kind.Name == name);

    private static void AppendHolding(StringBuilder text, Person person, AnchorBook book, AnchorKind kind, List<Anchor> all, LocalDate on)
    {
        var readings = Readings(person, book, kind, all, on);
        foreach (var same in all.GroupBy(anchor => (anchor.Sport, anchor.Exercise, anchor.Machine)).OrderBy(same => $"{same.Key}", StringComparer.Ordinal))
        {
            var held = Held(book, same.First(), on);
            foreach (var anchor in same.OrderByDescending(anchor => readings.Exists(reading => reading.Maximum == anchor)).ThenByDescending(anchor => anchor == held).ThenByDescending(anchor => anchor.Date))
            {
                var use = anchor.Date > on ? "not yet" : Use(anchor, held, readings);
                text.AppendLine(CultureInfo.InvariantCulture, $"    {use}: {AnchorText.Of(anchor.Source == AnchorSource.Observed ? anchor with { Note = null } : anchor)}{(AnchorText.Error(anchor) is { } error ? $"; taken to be within {error}" : "")}");
            }
        }

        if (all.Exists(anchor => anchor.Date is null || anchor.Date <= on))
        {
            return;
        }

        var byAge = kind == AnchorKind.HeartRateMax && on > LocalDate.MinIsoValue ? AnchorText.ByAge(person, on, book.HeartRateMaxEquation) : null;
        text.AppendLine(CultureInfo.InvariantCulture, $"    {(byAge is null ? "none holds" : $"none is stated; holds: {byAge}")}");
    }

    /// <summary>Those of every sport that the person has a value for; nothing of a kind that holds whatever its age.</summary>
    private static List<MaximumReading> Readings(Person person, AnchorBook book, AnchorKind kind, List<Anchor> all, LocalDate on) => kind switch
    {
        AnchorKind.PowerMax =>
        [
            .. book.Of(person.Id)
                .Where(anchor => anchor.Kind is AnchorKind.PowerMax or AnchorKind.CriticalPower)
                .Select(anchor => anchor.Sport ?? "cycling").Distinct(StringComparer.Ordinal)
                .Select(sport => MaximumReading.OfPower(book, on, person.Id, Recordings.Sport.Parse(sport))),
        ],
        AnchorKind.SpeedMax when all.Count > 0 => [MaximumReading.OfSpeed(book, on, person.Id)],
        _ => [],
    };

    private static string Use(Anchor anchor, Anchor? held, List<MaximumReading> readings)
    {
        if (readings.Count == 0 || readings.Exists(reading => reading.Maximum == anchor))
        {
            return readings.Count > 0 || anchor == held ? "holds" : "not used";
        }

        var why = $"not read for the stimulus ({string.Join("; ", readings.Select(reading => reading.WhyNot(anchor)).Distinct(StringComparer.Ordinal))})";
        return anchor == held && anchor.Kind == AnchorKind.SpeedMax ? $"holds for shares of the best speed, {why}" : why;
    }

    private static Anchor? Held(AnchorBook book, Anchor one, LocalDate on) => one.Sport is { } sport
        ? book.On(on, one.Person, one.Kind, Recordings.Sport.Parse(sport))
        : book.On(on, one.Person, one.Kind, one.Exercise, one.Machine);

    private static void AppendObserved(StringBuilder text, TableBasis basis, Person person, List<ObservedAnchor> observed, LocalDate on)
    {
        foreach (var one in observed)
        {
            var stands = one.From <= on && !observed.Exists(other => other.Of == one.Of && other.From > one.From && other.From <= on);
            text.AppendLine(CultureInfo.InvariantCulture, $"    from own sessions of the 12 months before {Words.Date(one.From)}: {AnchorText.Value(one.Value, one.Kind)} within {AnchorText.Value(one.Error, one.Kind)}, last shown on {Words.Date(one.ShownOn)}: {OneLine.Of(one.Basis)}{(stands ? AnchorText.Age(one, on) : "")}");
        }

        ReferenceExplanation.AppendContradictions(text, on, observed, basis.StatedOf(person));
    }

    private static string RestsOn(AnchorKind kind) => kind switch
    {
        AnchorKind.HeartRateRest => "training impulse, zones of heart-rate reserve, stimulus by heart rate",
        AnchorKind.HeartRateMax => "training impulse, loads by zones of the maximum, zones of heart-rate reserve, stimulus by heart rate",
        AnchorKind.HeartRateVt1 => "load by ventilatory thresholds, zones of heart rate",
        AnchorKind.HeartRateVt2 => "load by ventilatory thresholds, zones of heart rate, stimulus by heart rate",
        AnchorKind.TrimpWeight or AnchorKind.TrimpExponent => "training impulse of own weighting",
        AnchorKind.CriticalPower => "zones of power, stimulus by power",
        AnchorKind.WPrime => "stimulus by power: what is left above critical power",
        AnchorKind.PowerMax => "stimulus by power: hard bouts and the largest class",
        AnchorKind.CriticalSpeed => "stimulus by speed on foot",
        AnchorKind.DPrime => "stimulus by speed on foot: what is left above critical speed",
        AnchorKind.SpeedMax => "stimulus by speed on foot: hard bouts and the largest class; shares of the best speed",
        AnchorKind.OneRepetitionMax => "stimulus by sets",
        AnchorKind.BodyMass => "minutes of moderate and vigorous effort on a bicycle by power; sit-to-stand power in W",
        AnchorKind.Height => "sit-to-stand power",
        _ => "nothing that is computed of sessions",
    };
}
