using LoadWatch.Recordings;
using LoadWatch.Service.Export;
using LoadWatch.Storage;
using LoadWatch.Storage.Recordings;

namespace LoadWatch.Service.Arrivals;

/// <summary>The one arrival that somebody means who says whose a file is.</summary>
public static class MeantFile
{
    private const int MostNamed = 10;

    /// <summary>Why nothing can be assigned by this word, or null with the one arrival that is meant.</summary>
    public static string? Refusal(StoreSession session, string word, out Arrival? meant)
    {
        var found = MeantArrivals.Of(session, word);
        meant = found is [var only] ? only : null;
        return found switch
        {
            [] => $"\"{word}\" is no file known here",
            [{ Kind: "gzip" or "zip" } archive] => $"{Name(session, archive)} is an archive; assign the files in it: {Members(session, archive)}",
            [{ State: ArrivalState.Aside or ArrivalState.Refused } useless] =>
                $"{Name(session, useless)} has nothing to assign; it is {Words.Of(useless.State)}: {OneLine.Of(useless.Reason ?? "")}",
            [{ State: ArrivalState.Stored, Person: null } several] when session.Recordings.OfArrival(several.Sha).Count > 0 =>
                $"{Name(session, several)} holds recordings of several people, each of whom it names; an alias or a line in devices.csv tells whose one is",
            [_] => null,
            _ => $"\"{word}\" is more than one file; name one by its digits: {Names(session, found)}",
        };
    }

    /// <summary>The first digits of its hash, and the smallest of its names.</summary>
    public static string Name(StoreSession session, Arrival arrival) =>
        session.Sightings.Of(arrival.Sha) is [var first, ..] ? $"{arrival.Sha[..12]} ({OneLine.Of(first.Path)})" : arrival.Sha[..12];

    private static string Members(StoreSession session, Arrival archive) =>
        Names(session, session.Arrivals.All().Where(arrival => arrival.ParentSha == archive.Sha && arrival.Kind is not ("gzip" or "zip")).ToList());

    private static string Names(StoreSession session, IReadOnlyList<Arrival> arrivals)
    {
        var more = arrivals.Count > MostNamed ? $" and {arrivals.Count - MostNamed} more" : "";
        return string.Join(", ", arrivals.Take(MostNamed).Select(arrival => Name(session, arrival))) + more;
    }
}
