using System.Globalization;
using System.Text;
using LoadWatch.Limits;
using LoadWatch.People;
using LoadWatch.Service.Export;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using NodaTime;

namespace LoadWatch.Service.Explain;

/// <summary>What the limits left open on the morning of a date.</summary>
internal static class RoomText
{
    public static void Append(StringBuilder text, TodaysLimits limits, StoreSession session, Person person, IEnumerable<LocalDate> dates)
    {
        foreach (var room in dates.Select(date => limits.Of(session, person, date)).OfType<TodaysRoom>())
        {
            var largest = room is { LargestDay: { } load, LargestDayOn: { } on } ? string.Create(CultureInfo.InvariantCulture, $"; largest day of the 30 before {load:0.###} on {Words.Date(on)}") : "";
            text.AppendLine(CultureInfo.InvariantCulture, $"    the morning of {Words.Date(room.Date)}: {RoomWords.WithMeaning(room)}{largest}");
            foreach (var week in room.Regions)
            {
                text.AppendLine(CultureInfo.InvariantCulture, $"        {RoomWords.Of(week)}");
            }
        }
    }
}
