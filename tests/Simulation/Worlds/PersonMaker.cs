using LoadWatch.People;
using LoadWatch.Plans;
using NodaTime;

namespace LoadWatch.Simulation.Worlds;

/// <summary>Lives one person's season.</summary>
internal sealed class PersonMaker(Person person, Habits habits, Noise noise, GroupCalendar calendar, Chance chance)
{
    /// <summary>Days around an episode in which nothing else befalls the person: it would be there to hide it.</summary>
    private const int ClearBefore = 42;

    private const int ClearAfter = 21;
    private const double NeverFastShare = 1.0 / 15;
    private const double SwapShare = 0.3;

    private readonly List<TrueSession> sessions = [];

    /// <param name="extra">An episode, or an absence.</param>
    public TruePerson Make(Happening? extra, int index)
    {
        var week = habits.Weeks[index % habits.Weeks.Count];
        var happenings = Happenings(extra is { Kind: HappeningKind.DoubleSession } ? OnATrainingDay(extra, week) : extra).ToList();
        var size = habits.Size * chance.Stream("size").Factor(0.2);
        var swap = Swap(chance.Stream("swap"));
        for (var date = calendar.First; date <= calendar.Last; date = date.PlusDays(1))
        {
            if (SlotOn(week, date) is { } slot && Session(slot, date, size, happenings) is { } session)
            {
                sessions.Add(session with { Recorded = Record(session, swap, happenings) });
            }
        }

        return new TruePerson(person, sessions, [.. Told(week, happenings)], happenings);
    }

    /// <summary>The first date of another device.</summary>
    private LocalDate Swap(Chance swap) =>
        swap.Happens(SwapShare) ? calendar.First.PlusDays(swap.Below(Period.DaysBetween(calendar.First, calendar.Last))) : LocalDate.MaxIsoValue;

    private Happening OnATrainingDay(Happening extra, IReadOnlyList<Slot> week)
    {
        var date = extra.From;
        while (SlotOn(week, date) is not { Word: not PlanWord.Match })
        {
            date = date.PlusDays(1);
        }

        return extra with { From = date, To = date };
    }

    private IEnumerable<Happening> Happenings(Happening? extra)
    {
        var clear = extra is null ? null : extra with { From = extra.From.PlusDays(-ClearBefore), To = extra.To.PlusDays(ClearAfter) };
        foreach (var travel in calendar.Travels.Where(_ => habits.IsPlanned).Where(travel => clear is null || travel.To < clear.From || travel.From > clear.To))
        {
            yield return travel;
        }

        var illness = chance.Stream("illness");
        for (var from = calendar.First.PlusDays(30 + illness.Below(150)); from.PlusDays(10) <= calendar.Last; from = from.PlusDays(100 + illness.Below(150)))
        {
            var ill = new Happening(HappeningKind.Ill, from, from.PlusDays(illness.Between(2, 9)));
            if (clear is null || ill.To < clear.From || ill.From > clear.To)
            {
                yield return ill;
            }
        }

        if (extra is null && chance.Stream("never fast").Happens(NeverFastShare))
        {
            yield return new Happening(HappeningKind.NeverFast, calendar.First, calendar.Last);
        }
        else if (extra is not null)
        {
            yield return extra;
        }
    }

    /// <summary>A moved match is played a day later; the day that is planned for it is off.</summary>
    private Slot? SlotOn(IReadOnlyList<Slot> week, LocalDate date)
    {
        var moved = calendar.MovedWeeks.Contains(Period.DaysBetween(calendar.First, date) / 7);
        var match = week.FirstOrDefault(slot => slot.Word == PlanWord.Match);
        return moved && match is not null && date.DayOfWeek == match.Day ? null
            : moved && match is not null && date.DayOfWeek == match.Day + 1 ? match
            : week.FirstOrDefault(slot => slot.Day == date.DayOfWeek);
    }

    private TrueSession? Session(Slot slot, LocalDate date, double size, List<Happening> happenings)
    {
        var distance = chance.Stream("distance", date).Factor(noise.DistanceDeviation);
        var rest = chance.Stream("load", date).Factor(Math.Sqrt(Math.Max(0, (noise.LoadDeviation * noise.LoadDeviation) - (noise.DistanceDeviation * noise.DistanceDeviation))));
        var hard = chance.Stream("hard efforts", date).Between(slot.HardLow, slot.HardHigh);
        var gone = chance.Stream("gone", date).Happens(0.5);
        var factor = 1.0;
        foreach (var happening in happenings.Where(one => one.Covers(date) || (one.Kind == HappeningKind.Fade && date > one.To)))
        {
            switch (happening.Kind)
            {
                case HappeningKind.Ill or HappeningKind.AwayUntold:
                case HappeningKind.Travel when gone:
                    return null;
                case HappeningKind.Travel:
                    factor *= 0.6;
                    break;
                case HappeningKind.DoubleWeek:
                    factor *= 2;
                    break;
                case HappeningKind.Fade:
                    factor *= 1 - (0.6 * Math.Min(1, (Period.DaysBetween(happening.From, date) + 1) / 28.0));
                    break;
                case HappeningKind.NothingHeavy or HappeningKind.NeverFast:
                    hard = Math.Min(hard, 1);
                    break;
                default:
                    break;
            }
        }

        var session = new TrueSession(date, size * slot.Weight * distance * rest * factor, slot.Metres * distance * factor, hard, slot.Word == PlanWord.Match);
        return happenings.Exists(one => one.Kind == HappeningKind.DoubleSession && one.Covers(date)) ? Doubled(session) : session;
    }

    private TrueSession Doubled(TrueSession session)
    {
        var before = sessions.FindAll(one => one.Date >= session.Date.PlusDays(-30));
        return session with { Load = 2 * before.Max(one => one.Load), Metres = session.Metres is null ? null : 2 * before.Max(one => one.Metres) };
    }

    /// <summary>The one session of an episode leaves a recording: what left none, nothing can find.</summary>
    private Record? Record(TrueSession session, LocalDate swap, List<Happening> happenings)
    {
        var sensor = chance.Stream("sensor", session.Date);
        var transfer = chance.Stream("transfer", session.Date);
        var (missing, fault, unusable, late, days) = (
            chance.Stream("missing", session.Date).Happens(noise.Missing),
            sensor.Happens(noise.Faults),
            sensor.Happens(0.8),
            transfer.Happens(noise.Late),
            transfer.Between(1, noise.LateDays));
        var sure = happenings.Exists(one => one.Kind == HappeningKind.DoubleSession && one.Covers(session.Date));
        var load = (sure, fault, unusable) switch
        {
            (false, true, true) => (double?)null,
            (false, true, false) => 1.3 * session.Load,
            _ => session.Load,
        };
        return missing && !sure ? null : new Record(load, ReadOut(late ? session.Date.PlusDays(days) : session.Date), session.Date < swap ? "device 1" : "device 2");
    }

    /// <summary>The next date on which the device is read out.</summary>
    private LocalDate ReadOut(LocalDate date)
    {
        var days = Period.DaysBetween(calendar.First, date) + chance.Stream("read out").Below(noise.SyncDays);
        return date.PlusDays((noise.SyncDays - (days % noise.SyncDays)) % noise.SyncDays);
    }

    private IEnumerable<Told> Told(IReadOnlyList<Slot> week, List<Happening> happenings)
    {
        for (var date = calendar.First; habits.IsPlanned && date <= calendar.Last; date = date.PlusDays(1))
        {
            if (week.FirstOrDefault(slot => slot.Day == date.DayOfWeek) is { } slot && !happenings.Exists(one => one.Kind == HappeningKind.Travel && one.Covers(date)))
            {
                yield return Entry(slot.Word, date, date, expected: true);
            }
        }

        foreach (var one in happenings)
        {
            if (one.Kind == HappeningKind.Travel)
            {
                yield return Entry(PlanWord.Travel, one.From, one.To, expected: false);
            }
            else if (one.Kind == HappeningKind.Ill)
            {
                yield return new Told(one.From.PlusDays(1), one.From, one.To, null, new Absence(AbsenceWord.Ill, one.From, one.To));
            }
        }
    }

    private Told Entry(PlanWord word, LocalDate from, LocalDate until, bool expected) =>
        new(calendar.First, from, until, new PlanEntry(word, from, until, null, null, expected, null), null);
}
