using LoadWatch.Service.Arrivals;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;

namespace LoadWatch.Service.Pipeline;

/// <summary>Finds stored contents that are somebody else's by now, going once through all names.</summary>
public sealed class OwnerChanges(WorkingConfiguration configuration, StoreSession session)
{
    /// <returns>SHA-256 of each; those among them whose owner no name tells: their devices or rows may say otherwise now.</returns>
    public IReadOnlyList<string> Find()
    {
        var decided = session.Decisions.Assigned();
        var found = new List<string>();
        var names = new List<SeenName>();
        (string Sha, string? Person) current = ("", null);
        session.Sightings.EachStored((sha, person, inbox, path) =>
        {
            if (sha != current.Sha)
            {
                Judge();
                current = (sha, person);
            }

            names.Add(new SeenName(inbox, path));
        });
        Judge();
        return found;

        void Judge()
        {
            if (names.Count > 0 && IsOutdated(Attribution.Claims(decided.GetValueOrDefault(current.Sha)?.Person, names, configuration), current.Person))
            {
                found.Add(current.Sha);
            }

            names.Clear();
        }
    }

    /// <summary>A content of several people has no owner of its own, whoever its names name.</summary>
    private static bool IsOutdated(IReadOnlyList<string> claims, string? owner) =>
        owner is null || claims is not [var only] || only != owner;
}
