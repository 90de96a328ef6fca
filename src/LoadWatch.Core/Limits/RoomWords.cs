using System.Globalization;
using LoadWatch.Loads;
using LoadWatch.Stimulus;

namespace LoadWatch.Limits;

/// <summary>What the limits leave open on a date, in the words of a sentence without a name.</summary>
public static class RoomWords
{
    private const string Meaning = "a figure to plan with, not a target and not a debt";

    /// <summary>What every place says that shows the figure: with it goes what it is meant for.</summary>
    public static string WithMeaning(TodaysRoom room) => room is { Load: not null, IsPassedAtRest: false } ? $"{Of(room)}: {Meaning}" : Of(room);

    /// <summary><c>inside the limits today: up to 84 AU (more would pass the limit of load ratio)</c>.</summary>
    public static string Of(TodaysRoom room)
    {
        var unit = LoadUnits.Of(room.LoadQuantity);
        return room switch
        {
            { Reason: { } reason } => $"no figure for today: {Of(reason)}",
            { IsPassedAtRest: true } => $"the limit of {Rule(room)} is passed today even without any load",
            { HeldBy: not null } => $"inside the limits today: up to {Number(room.Load)} {unit} (more would pass the limit of {Rule(room)})",
            _ => $"inside the limits today: up to {Number(room.Load)} {unit}, the largest day of the last 30",
        };
    }

    public static string Of(NoRoom reason) => reason switch
    {
        NoRoom.Absent => "away",
        NoRoom.Returning => "returning, with steps of its own",
        NoRoom.TooLittleKnown => "too few known days",
        NoRoom.NoTrainingDay => "no day with known load in the last 30",
        _ => throw new ArgumentOutOfRangeException(nameof(reason)),
    };

    /// <summary><c>heavy or fast leg work on 1 of the last 7 days, usually 2</c>.</summary>
    public static string Of(HeavyWeek week)
    {
        var usual = week.UsualDays is { } days ? $"usually {days.ToString("0.#", CultureInfo.InvariantCulture)}" : "the usual is not known yet";
        var reached = week.IsReached switch { true => ": reached", false => ": not reached", null => "" };
        return $"heavy or fast work of the {BodyRegions.Word(week.Region)} on {Number(week.Days)} of the last 7 days ({week.Known} known), {usual}{reached}";
    }

    private static string Rule(TodaysRoom room) => room.HeldBy!.Replace('_', ' ');

    /// <summary>Rounded down: the figure is a bound.</summary>
    private static string Number(double? value) => value is { } known ? Math.Floor(known).ToString("0", CultureInfo.InvariantCulture) : "unknown";
}
