using NodaTime;
using NodaTime.TimeZones;

namespace LoadWatch.Service.Configuration;

/// <summary>The zone of this machine.</summary>
public static class MachineZone
{
    /// <summary>The machine's zone in the zone database, or UTC where it has no name there.</summary>
    public static DateTimeZone Get()
    {
        try
        {
            return DateTimeZoneProviders.Tzdb.GetSystemDefault();
        }
        catch (DateTimeZoneNotFoundException)
        {
            return DateTimeZone.Utc;
        }
    }
}
