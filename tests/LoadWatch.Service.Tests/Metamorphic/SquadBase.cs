using LoadWatch.Service.Tests.Pipeline;
using NodaTime;

namespace LoadWatch.Service.Tests.Metamorphic;

/// <summary>The squad's files taken in at once: what every variation must end with. Made once.</summary>
internal sealed class SquadBase
{
    private static readonly Lazy<SquadBase> Made = new(() => new SquadBase());

    private SquadBase()
    {
        using var folder = Make();
        TakeIn(folder, AsPacked);
        using var copy = Make();
        TakeIn(copy, AsPacked);
        DerivedTables = Digest.DerivedTables(copy);
        Text = Digest.Of(folder, DerivedTables);
        Standing = [.. Digest.Standing(folder)];
    }

    public static SquadBase Shared => Made.Value;

    public static IReadOnlyList<Placed> AsPacked => [.. SquadFiles.Packed.Select(file => new Placed(file.Path, file.Bytes))];

    public IReadOnlyList<string> DerivedTables { get; }

    public string Text { get; }

    /// <summary>Alerts.</summary>
    public IReadOnlyList<string> Standing { get; }

    public static WorkingFolder Make()
    {
        var folder = new WorkingFolder(roster: SquadFiles.Roster);
        folder.Configure(SquadFiles.Layout);
        folder.Edit("loadwatch.json", "\"take\"", "\"file_pattern\": \"{person}_*\", \"take\"");
        folder.Write("devices.csv", SquadFiles.Devices);
        return folder;
    }

    /// <summary>Night by night, each with a sweep of its own, and at the end as of the same moment whatever the nights were.</summary>
    public static void TakeIn(WorkingFolder folder, IReadOnlyList<Placed> files)
    {
        foreach (var night in files.GroupBy(file => file.Night).OrderBy(night => night.Key))
        {
            folder.Fill(night.Select(file => (file.Path, file.Bytes)));
            if (files.Any(file => file.Night > 0))
            {
                folder.Sweep(WorkingFolder.Now - Duration.FromDays(Variations.Nights - 1 - night.Key) - Duration.FromMinutes(1));
            }
        }

        folder.Sweep();
    }
}
