using LoadWatch.Chaos.Inputs;
using LoadWatch.Chaos.Places;
using LoadWatch.Chaos.Processes;

namespace LoadWatch.Chaos.Scenarios;

/// <summary>Real disks that are full, of bytes and of files, and limits on them: section D of the catalogue.</summary>
public static class FullDisks
{
    private const int Sizes = 6;
    private const int SizesOfLong = 40;

    private static readonly int[] Ends = [0, 73, 74];

    public static IReadOnlyList<Scenario> All { get; } =
    [
        new("full-disk", "D57 D60", "The disk of the data folder fills up after so many bytes, for sizes from none to enough: rolled back, ended with 74 where it must, and right at the next sweep.", Bytes, Needs.Mounting),
        new("no-inodes", "D58", "No room for another file on the disk of the data folder, from the first file to the last.", Inodes, Needs.Mounting),
        new("full-outputs", "D57", "The disk of pages and notices is full: the values are in, and what was to be told is told once there is room.", Outputs, Needs.Mounting),
        new("file-size-limit", "D58", "No file may grow beyond a limit: ended, and right at the next sweep.", FileSize),
    ];

    private static void Bytes(Trial trial) => EachSize(trial, Enumerable.Range(0, trial.IsLong ? SizesOfLong : Sizes), (disk, needed, size) =>
        disk.LeaveBytes(needed.Bytes * size / (trial.IsLong ? SizesOfLong : Sizes)));

    private static void Inodes(Trial trial) => EachSize(trial, [0, 1, 2, 4], (disk, _, size) => disk.LeaveInodes(size));

    private static void EachSize(Trial trial, IEnumerable<int> sizes, Action<SmallDisk, (long Bytes, long Inodes), int> shrink)
    {
        var nights = Nights.Full(Clock.Fixed, trial.Seed);
        using var prepared = trial.Prepared(nights, Clock.Fixed, new PlaceOptions(Take: "move"));
        var undisturbed = Trial.Undisturbed(prepared, nights);
        prepared.Fill(nights.Tonight);
        var needed = NeededBy(prepared);
        Parallel.ForEach(sizes, Trial.TwoAtOnce, size => Trial.Named($"size {size}", () =>
        {
            using var place = prepared.Copy();
            using (var disk = new SmallDisk(place.Data))
            {
                shrink(disk, needed, size);
                MustEndAsPromised(trial, place.StartUnder(disk.Words, place.SweepWords).WaitForEnd());
                disk.MakeAmple();
                disk.BringBack();
            }

            Trial.MustConverge(place, undisturbed);
            trial.Survived();
        }));
    }

    private static (long Bytes, long Inodes) NeededBy(Place prepared)
    {
        using var place = prepared.Copy();
        using var disk = new SmallDisk(place.Data);
        var (bytes, inodes) = (disk.UsedBytes, disk.UsedInodes);
        Place.MustEndWell(place.StartUnder(disk.Words, place.SweepWords).WaitForEnd());
        return (disk.UsedBytes - bytes, disk.UsedInodes - inodes);
    }

    private static void Outputs(Trial trial)
    {
        var nights = Nights.OneFile(Clock.Fixed, trial.Seed);
        using var place = trial.Prepared(nights, Clock.Fixed);
        var undisturbed = Trial.Undisturbed(place, nights);
        place.Fill(nights.Tonight);
        foreach (var folder in new[] { "pages", "notices" })
        {
            using var here = place.Copy();
            Directory.CreateDirectory(here.At(folder));
            using (var disk = new SmallDisk(here.At(folder)))
            {
                disk.LeaveBytes(0);
                MustEndAsPromised(trial, here.StartUnder(disk.Words, here.SweepWords).WaitForEnd());
                disk.MakeAmple();
                disk.BringBack();
            }

            here.SkipWaits();
            Trial.Named(folder, () => Trial.MustConverge(here, undisturbed));
            trial.Survived();
        }
    }

    private static void FileSize(Trial trial)
    {
        var nights = Nights.OneFile(Clock.Fixed, trial.Seed);
        using var prepared = trial.Prepared(nights, Clock.Fixed);
        var undisturbed = Trial.Undisturbed(prepared, nights);
        prepared.Fill(nights.Tonight);
        foreach (var limit in new[] { 1000, 4096, 20_000, 100_000 })
        {
            using var place = prepared.Copy();
            string[] limited = ["prlimit", FormattableString.Invariant($"--fsize={limit}")];

            // Else the runtime maps more than that at its start, and nothing of the sweep is reached.
            var ended = place.StartUnder(limited, place.SweepWords, ("DOTNET_EnableWriteXorExecute", "0")).WaitForEnd();
            trial.Figure($"ended with {ended.Code}", 1);
            Trial.Named($"{limit} bytes", () => Trial.MustConverge(place, undisturbed));
            trial.Survived();
        }
    }

    private static void MustEndAsPromised(Trial trial, Ended ended)
    {
        trial.Figure($"ended with {ended.Code}", 1);
        if (!Ends.Contains(ended.Code))
        {
            throw new ChaosFailureException($"ended with {ended.Code}: {ended.Said}");
        }
    }
}
