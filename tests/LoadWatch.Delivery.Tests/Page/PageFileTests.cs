using LoadWatch.Delivery.Page;
using LoadWatch.Notices;
using NodaTime;

namespace LoadWatch.Delivery.Tests.Page;

public sealed class PageFileTests : IDisposable
{
    private readonly DirectoryInfo temporary = Directory.CreateTempSubdirectory("loadwatch-pages-");

    private string Folder => Path.Combine(temporary.FullName, "pages");

    [Fact]
    public void ANoticeBecomesTheNewestPageAndADatedOne()
    {
        Assert.Equal(ChannelOutcome.Delivered, new PageFile(Folder).Deliver(Notice(1, "<p>one"), "ada"));
        Assert.Equal(ChannelOutcome.Delivered, new PageFile(Folder).Deliver(Notice(2, "<p>two"), "ada"));
        Assert.Equal(["ada-2026-03-01.html", "ada-2026-03-02.html", "ada.html", "ada~past.html"], Names());
        Assert.Equal("<p>two", Read("ada.html"));
        Assert.Equal("<p>one", Read("ada-2026-03-01.html"));
    }

    [Fact]
    public void ALateNoticeDoesNotCoverAYoungerPage()
    {
        new PageFile(Folder).Deliver(Notice(2, "<p>two"), "ada");
        new PageFile(Folder).Deliver(Notice(1, "<p>one"), "ada");
        Assert.Equal("<p>two", Read("ada.html"));
        Assert.Equal("<p>one", Read("ada-2026-03-01.html"));
    }

    [Fact]
    public void OnlyTheOwnerReadsPagesAndTheirFolder()
    {
        if (OperatingSystem.IsWindows())
        {
            Assert.Skip("no file modes on Windows");
            return;
        }

        PageFile.Write(Folder, "ada", "<p>");
        Assert.Equal(UnixFileMode.UserRead | UnixFileMode.UserWrite, File.GetUnixFileMode(Path.Combine(Folder, "ada.html")));
        Assert.Equal(UnixFileMode.UserRead | UnixFileMode.UserWrite, File.GetUnixFileMode(Path.Combine(Folder, "ada~past.html")));
        Assert.Equal(UnixFileMode.UserRead | UnixFileMode.UserWrite | UnixFileMode.UserExecute, File.GetUnixFileMode(Folder));
    }

    [Fact]
    public void AReaderWhoHasTheOldPageOpenKeepsItWhole()
    {
        Assert.SkipWhen(OperatingSystem.IsWindows(), "an open file cannot be replaced on Windows");
        PageFile.Write(Folder, "ada", "<p>old page");
        using var open = new StreamReader(Path.Combine(Folder, "ada.html"));
        Assert.Equal(ChannelOutcome.Delivered, PageFile.Write(Folder, "ada", "<p>new"));
        Assert.Equal("<p>old page", open.ReadToEnd());
        Assert.Equal("<p>new", Read("ada.html"));
    }

    [Fact]
    public void WhatAnInterruptedWriteLeftIsReplaced()
    {
        Directory.CreateDirectory(Folder);
        File.WriteAllText(Path.Combine(Folder, "ada.html.part"), "<p>ha");
        Assert.Equal(ChannelOutcome.Delivered, PageFile.Write(Folder, "ada", "<p>whole"));
        Assert.Equal(["ada.html", "ada~past.html"], Names());
        Assert.Equal("<p>whole", Read("ada.html"));
    }

    [Theory]
    [InlineData("../ada")]
    [InlineData("a/b")]
    [InlineData("a\\b")]
    [InlineData("")]
    [InlineData(".ada")]
    [InlineData("a\u0000b")]
    [InlineData("a:b")]
    public void AnIdThatIsNoFileNameIsRefused(string id)
    {
        Assert.Equal(ChannelResult.Failed, PageFile.Write(Folder, id, "<p>").Result);
        Assert.Equal(ChannelResult.Failed, new PageFile(Folder).Deliver(Notice(1, "<p>") with { ContactId = id }, id).Result);
        Assert.Empty(temporary.EnumerateFileSystemInfos());
    }

    [Fact]
    public void AFolderThatCannotBeMadeIsAnOutcome()
    {
        File.WriteAllText(Folder, "a file where the folder should be");
        var outcome = PageFile.Write(Folder, "ada", "<p>");
        Assert.Equal(ChannelResult.TryAgain, outcome.Result);
        Assert.NotEqual("", outcome.Reason);
    }

    public void Dispose() => temporary.Delete(recursive: true);

    private static Notice Notice(int day, string html) =>
        new($"ada|brief|2026-03-{day:00}", "ada", new LocalDate(2026, 3, day), "Morning brief", "text", html, NoticeReason.BriefDue);

    private string Read(string name) => File.ReadAllText(Path.Combine(Folder, name));

    private IEnumerable<string> Names() => new DirectoryInfo(Folder).EnumerateFiles().Select(file => file.Name).Order(StringComparer.Ordinal);
}
