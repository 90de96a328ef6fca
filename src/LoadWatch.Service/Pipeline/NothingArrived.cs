using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Storage;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>The line of a brief that tells staff when the flow itself has run dry: quiet without new recordings is not quiet.</summary>
public static class NothingArrived
{
    /// <summary>Somebody who trains on three days a week has gaps of two. A choice.</summary>
    private static readonly Duration Long = Duration.FromDays(3);

    /// <summary>Null where something new came lately, or where nothing ever did: then the brief has no data and says so.</summary>
    public static BriefLine? Line(StoreSession session, Contact contact, Instant now) =>
        session.Sightings.Newest() is { } newest && now - newest >= Long
            ? new BriefLine(
                "Recordings",
                FormattableString.Invariant($"nothing has arrived since {BriefText.DateInWords(newest.InZone(contact.Zone).Date)}, in any inbox: if people trained, look at the upload"))
            : null;
}
