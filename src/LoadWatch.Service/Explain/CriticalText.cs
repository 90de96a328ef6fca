using System.Globalization;
using System.Text;
using LoadWatch.Findings;
using LoadWatch.People;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using NodaTime;

namespace LoadWatch.Service.Explain;

/// <summary>Critical power and speed of the two stretches up to a date, or why they cannot be compared.</summary>
internal static class CriticalText
{
    /// <summary>Nothing where no session shows a best of two minutes or more.</summary>
    public static void Append(StringBuilder text, WorkingConfiguration configuration, StoreSession session, Person person, LocalDate date)
    {
        var limits = configuration.GroupOf(person).Limits;
        var first = date.PlusDays(1 - (2 * limits.FallingCapacity.Days));
        var days = session.Days.Before(person.Id, date.PlusDays(1), first);
        var subject = new RuleSubject(person, days, limits)
        {
            Activities = [.. days.SelectMany(day => day.Sessions.Select(one => one.On(day.Date)))],
            BestMeans = session.Activities.BestMeans(person.Id, first, date),
        };
        foreach (var quantity in CriticalQuantity.All)
        {
            if (new CriticalStretches(subject, quantity).On(date) is { } reading)
            {
                text.AppendLine(CultureInfo.InvariantCulture, $"    {quantity.Words}: {OneLine.Of(reading.Words(quantity, limits.FallingCapacity))}");
            }
        }
    }
}
