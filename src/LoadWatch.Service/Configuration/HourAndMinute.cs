using NodaTime.Text;

namespace LoadWatch.Service.Configuration;

/// <summary>A time of day as configuration and commands write it: <c>18:30</c>.</summary>
internal static class HourAndMinute
{
    public static LocalTimePattern Pattern { get; } = LocalTimePattern.CreateWithInvariantCulture("HH:mm");
}
