using LoadWatch.Delivery.Log;
using LoadWatch.Notices;
using NodaTime;

namespace LoadWatch.Delivery.Tests.Log;

public sealed class NoticeFileTests : IDisposable
{
    private readonly DirectoryInfo temporary = Directory.CreateTempSubdirectory("loadwatch-notices-");

    private string March => Path.Combine(temporary.FullName, "notices-2026-03.txt");

    [Fact]
    public void ANoticeIsAppendedOnceHoweverOftenItIsDelivered()
    {
        var channel = new NoticeFile(temporary.FullName);
        Assert.Equal(ChannelOutcome.Delivered, channel.Deliver(Notice(1), "ada"));
        Assert.Equal(ChannelOutcome.Delivered, channel.Deliver(Notice(1), "ada"));
        Assert.Equal(ChannelOutcome.Delivered, channel.Deliver(Notice(2), "ada"));
        Assert.Equal(ChannelOutcome.Delivered, channel.Deliver(Notice(1), "ada"));
        Assert.Equal(
            [
                "2026-03-01 ada 1/3 [ada|brief|2026-03-01] Morning brief",
                "2026-03-01 ada 2/3 All quiet: 1 person, nothing to act on.",
                "2026-03-01 ada 3/3 Hélène says more.",
                "2026-03-02 ada 1/3 [ada|brief|2026-03-02] Morning brief",
                "2026-03-02 ada 2/3 All quiet: 1 person, nothing to act on.",
                "2026-03-02 ada 3/3 Hélène says more.",
            ],
            File.ReadAllLines(March));
    }

    /// <summary>After a flush that failed the system takes the bytes for written: another flush alone would say yes to what is not on the disk.</summary>
    [Fact]
    public void ANoticeThatIsFoundWholeIsWrittenOnceMoreInItsPlace()
    {
        NoticeFile.Append(temporary.FullName, Notice(1));
        NoticeFile.Append(temporary.FullName, Notice(2));
        var (whole, before) = (File.ReadAllBytes(March), DateTime.UnixEpoch);
        File.SetLastWriteTimeUtc(March, before);

        NoticeFile.Append(temporary.FullName, Notice(1));

        Assert.Equal(whole, File.ReadAllBytes(March));
        Assert.NotEqual(before, File.GetLastWriteTimeUtc(March));
    }

    [Fact]
    public void EveryMonthHasItsOwnFile()
    {
        NoticeFile.Append(temporary.FullName, Notice(31));
        NoticeFile.Append(temporary.FullName, Notice(1) with { Key = "ada|brief|2026-04-01", Date = new LocalDate(2026, 4, 1) });
        Assert.Equal(["notices-2026-03.txt", "notices-2026-04.txt"], temporary.EnumerateFiles().Select(file => file.Name).Order(StringComparer.Ordinal));
    }

    [Fact]
    public void ANoticeCutAtAnyByteIsWrittenAgainWhole()
    {
        NoticeFile.Append(temporary.FullName, Notice(1));
        var whole = File.ReadAllBytes(March);
        for (var kept = 0; kept < whole.Length; kept++)
        {
            File.WriteAllBytes(March, whole[..kept]);
            NoticeFile.Append(temporary.FullName, Notice(1));
            Assert.Equal(File.ReadAllLines(March)[^3..], NoticeLines.Of(Notice(1)));
            var length = new FileInfo(March).Length;
            NoticeFile.Append(temporary.FullName, Notice(1));
            Assert.Equal(length, new FileInfo(March).Length);
        }
    }

    [Fact]
    public void WhatStandsInTheFileIsNeverTouched()
    {
        File.WriteAllText(March, "a line of somebody's own without an end");
        NoticeFile.Append(temporary.FullName, Notice(1));
        Assert.StartsWith("a line of somebody's own without an end\n2026-03-01 ada 1/3 ", File.ReadAllText(March), StringComparison.Ordinal);
    }

    [Fact]
    public void OnlyTheOwnerReadsTheFile()
    {
        if (OperatingSystem.IsWindows())
        {
            Assert.Skip("no file modes on Windows");
            return;
        }

        NoticeFile.Append(temporary.FullName, Notice(1));
        Assert.Equal(UnixFileMode.UserRead | UnixFileMode.UserWrite, File.GetUnixFileMode(March));
    }

    [Fact]
    public void AFileThatSomebodyHoldsIsTriedAgainLater()
    {
        using (new FileStream(March, FileMode.CreateNew, FileAccess.ReadWrite, FileShare.None))
        {
            Assert.Equal(ChannelResult.TryAgain, NoticeFile.Append(temporary.FullName, Notice(1)).Result);
        }

        Assert.Equal(ChannelOutcome.Delivered, NoticeFile.Append(temporary.FullName, Notice(1)));
    }

    [Fact]
    public void AFolderInTheFilesPlaceIsAnOutcome()
    {
        Directory.CreateDirectory(March);
        Assert.Equal(ChannelResult.TryAgainSlowly, NoticeFile.Append(temporary.FullName, Notice(1)).Result);
    }

    public void Dispose() => temporary.Delete(recursive: true);

    private static Notice Notice(int day) => new(
        $"ada|brief|2026-03-{day:00}",
        "ada",
        new LocalDate(2026, 3, day),
        "Morning brief",
        "All quiet: 1 person, nothing to act on.\n\nHélène says\nmore.\n\nEVERYBODY\nrows\n",
        "<p>",
        NoticeReason.BriefDue);
}
