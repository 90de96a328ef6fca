using System.Diagnostics;
using System.Net;
using LoadWatch.Recordings;
using LoadWatch.Service.Arrivals;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Pipeline;
using LoadWatch.Service.Tests.Pipeline;
using LoadWatch.Storage.Inboxes;
using NodaTime;
using WorkingFolder = LoadWatch.Service.Tests.Pipeline.WorkingFolder;

namespace LoadWatch.Service.Tests.Arrivals;

/// <summary>An inbox that is not mounted is an empty folder under the same name, and no event tells.</summary>
public sealed class InboxIdentityTests : IDisposable
{
    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    /// <summary>What decides: was it looked into before, at this path; is it another folder now; is it hollow.</summary>
    [Theory]
    [InlineData("leave", "8.1:1", true, true, true, true, true, false)]
    [InlineData("leave", "8.1:2", true, true, true, true, true, true)]
    [InlineData("leave", "8.1:2", false, true, true, true, true, true)]
    [InlineData("leave", "8.1:2", false, false, true, true, true, false)]
    [InlineData("leave", "8.1:2", false, true, false, true, true, false)]
    [InlineData("leave", "8.1:2", true, false, true, true, true, true)]
    [InlineData("leave", "8.1:2", true, true, false, false, true, false)]
    [InlineData("leave", "8.1:2", false, true, true, true, false, false)]
    [InlineData("leave", "8.1:2", true, true, true, true, false, true)]
    [InlineData("move", "8.1:2", false, true, true, true, true, false)]
    [InlineData("move", "8.1:2", true, true, true, true, true, true)]
    public void ADoubtIsAFolderThatIsAnotherAndHollow(string take, string id, bool isEmpty, bool lacksFiles, bool filesAreKnown, bool heldEntries, bool heldFiles, bool doubted)
    {
        var inbox = new Inbox("main", "/srv/inbox", Enum.Parse<TakeMode>(take, ignoreCase: true));
        var reason = InboxDoubt.Of(inbox, new InboxRoot("/srv/inbox", "8.1:1", heldEntries, heldFiles), id, isEmpty, () => lacksFiles, filesAreKnown);
        Assert.Equal(doubted, reason is not null);
        Assert.Null(InboxDoubt.Of(inbox, null, id, isEmpty, () => lacksFiles, filesAreKnown));
        Assert.Null(InboxDoubt.Of(inbox, new InboxRoot("/srv/other", "8.1:1", heldEntries, heldFiles), id, isEmpty, () => lacksFiles, filesAreKnown));
    }

    [Fact]
    public void AnEmptyMountPointIsNotTakenForTheInbox()
    {
        folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday));
        folder.Sweep();
        Unmount();

        var report = folder.Sweep();

        Assert.Equal(["inbox"], report.MissingInboxes);
        Assert.Contains("mounted", report.Looks[0].Away, StringComparison.Ordinal);
        Assert.Empty(Directory.EnumerateFileSystemEntries(folder.Inbox));
        Assert.Contains("cannot be looked into", File.ReadAllText(Path.Combine(folder.Root, "pages", "staff.html")), StringComparison.Ordinal);
        Mount();
        Assert.Empty(folder.Sweep().MissingInboxes);
    }

    /// <summary>Both have been silent for three weeks; the recordings of one come by the inbox that is away.</summary>
    [Fact]
    public void AnInboxThatIsAwayExplainsTheSilenceOfThoseWhoseRecordingsComeByIt()
    {
        AddSecondInbox();
        for (var back = 23; back < 45; back += 2)
        {
            folder.Put($"anna/{back}.fit", Some.Fit(Some.Yesterday.PlusDays(-back)));
            PutInSecond($"bo/{back}.fit", Some.Fit(Some.Yesterday.PlusDays(-back), 30));
        }

        folder.Sweep();
        Assert.Equal(["Anna Ahola", "Bo Björk"], Flagged());
        Unmount();

        Assert.Equal(["inbox"], folder.Sweep().MissingInboxes);
        Assert.Equal(["Bo Björk"], Flagged());
    }

    /// <summary>A name that is gone speaks no more, but not because its inbox is away.</summary>
    [Fact]
    public void NothingIsForgottenOfAnInboxThatIsAway()
    {
        var ride = Some.Fit(Some.Yesterday);
        AddSecondInbox();
        PutInSecond("bo/ride.fit", ride);
        folder.Put("anna/ride.fit", ride);
        folder.Sweep();
        Assert.Equal(ArrivalState.Held, folder.Arrival(ride)!.State);
        Unmount();

        folder.Sweep();

        Assert.Equal(ArrivalState.Held, folder.Arrival(ride)!.State);
        Assert.Equal(2, folder.Read((_, session) => session.Sightings.Of(WorkingFolder.Sha(ride))).Count);
    }

    [Fact]
    public void AFolderMadeAnewBecomesTheInboxByItsFirstFile()
    {
        folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday));
        folder.Sweep();
        Unmount();
        folder.Sweep();
        folder.Put("anna/other.fit", Some.Fit(Some.Yesterday, 7));

        var report = folder.Sweep();

        Assert.Empty(report.MissingInboxes);
        Assert.True(report.Looks[0].IsReplaced);
        Assert.Equal(2, folder.Arrivals().Count);
        Assert.Contains("inbox_replaced", folder.Read((_, session) => session.Audits.All()).Select(entry => entry.What));
        Assert.False(folder.Sweep().Looks[0].IsReplaced);
    }

    [Fact]
    public void AnInboxThatIsEmptiedByItsUsersIsStillTheInbox()
    {
        var ride = folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday));
        folder.Sweep();
        File.Delete(ride);
        Assert.Empty(folder.Sweep().MissingInboxes);
    }

    /// <summary>A share that holds no file any more and is mounted anew: another device, the same folders of people.</summary>
    [Fact]
    public void AnInboxThatItsUsersEmptiedIsStillTheInboxOnAnotherDevice()
    {
        var ride = folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday));
        folder.Sweep();
        File.Delete(ride);
        folder.Sweep();
        Unmount();
        Directory.CreateDirectory(Path.Combine(folder.Inbox, "anna"));

        var report = folder.Sweep();

        Assert.Empty(report.MissingInboxes);
        Assert.True(report.Looks[0].IsReplaced);
    }

    [Fact]
    [System.Runtime.Versioning.UnsupportedOSPlatform("windows")]
    public void AFolderThatMayNotBeLookedIntoIsTold()
    {
        Assert.SkipWhen(OperatingSystem.IsWindows() || Environment.IsPrivilegedProcess, "modes keep neither Windows nor the superuser out");
        folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday));
        foreach (var closed in new[] { "000", "400", "100" })
        {
            Shell($"chmod {closed} \"$0/anna\"");
            Assert.Equal("anna/", Assert.Single(folder.Sweep().Unreadable).Subject);
        }

        Shell("chmod 700 \"$0/anna\"");
        Assert.Empty(folder.Sweep().Unreadable);
        Assert.Single(folder.Arrivals());
    }

    [Fact]
    public void AMarkerThatIsNotThereMeansThatTheInboxIsNot()
    {
        folder.Write("loadwatch.json", File.ReadAllText(folder.ConfigPath).Replace("\"path\": \"inbox\"", "\"path\": \"inbox\", \"marker\": \"mounted.txt\"", StringComparison.Ordinal));
        Assert.Equal(["inbox"], folder.Sweep().MissingInboxes);
        Assert.Empty(Directory.EnumerateFileSystemEntries(folder.Inbox));
        folder.Put("mounted.txt", Some.Text("here"));
        folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday));

        var report = folder.Sweep();

        Assert.Empty(report.MissingInboxes);
        Assert.Equal(ArrivalState.Stored, Assert.Single(folder.Arrivals()).State);
    }

    [Theory]
    [InlineData("..")]
    [InlineData("a/b")]
    public void AMarkerIsOneName(string marker)
    {
        folder.Write("loadwatch.json", File.ReadAllText(folder.ConfigPath).Replace("\"path\": \"inbox\"", $"\"path\": \"inbox\", \"marker\": \"{marker}\"", StringComparison.Ordinal));
        Assert.Contains("marker", Assert.Throws<ConfigurationException>(() => ConfigurationReader.Read(folder.ConfigPath)).Message, StringComparison.Ordinal);
    }

    /// <summary>The whole line: one of two inboxes does not answer, the other is taken in.</summary>
    [Fact]
    public void AnInboxThatHangsHoldsUpNoOther()
    {
        using var never = new ManualResetEventSlim();
        var guard = new HangGuard(TimeSpan.FromMilliseconds(300));
        folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday));
        var inbox = new Inbox("inbox", folder.Inbox, TakeMode.Leave);
        var looks = guard.Run(
            ["dead", "inbox"],
            (name, progress) =>
            {
                if (name == "dead")
                {
                    never.Wait(TestContext.Current.CancellationToken);
                }

                return Inboxes.Look(inbox, new KnownInbox(), progress)!;
            },
            () => { });
        Assert.Null(looks[0]);
        Assert.Equal("anna/ride.fit", Assert.Single(looks[1]!.Changed).File.Path);
        never.Set();
    }

    [Fact]
    public void NamesThatAreNotUtf8AreCountedAndToldInOneLine()
    {
        Assert.SkipUnless(OperatingSystem.IsLinux(), "such names are made on Linux only");
        folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday));
        Shell("cd \"$0/anna\" && cp ride.fit $'\\xff\\xfe.fit' && cp ride.fit $'b\\xe9.fit' && mkdir $'f\\xfc' && cp ride.fit $'f\\xfc/ride.fit'");

        var line = Assert.Single(folder.Sweep().Unreadable);

        Assert.StartsWith("unreadable name: it is not UTF-8", line.Sentence, StringComparison.Ordinal);
        Assert.Contains("and 2 more like it", line.Sentence, StringComparison.Ordinal);
        Assert.Equal(ArrivalState.Stored, Assert.Single(folder.Arrivals()).State);
        Assert.Single(folder.Sweep(WorkingFolder.Now + Duration.FromMinutes(1)).Unreadable);
        Shell("cd \"$0/anna\" && rm -r $'\\xff\\xfe.fit' $'b\\xe9.fit' $'f\\xfc'"); // The runtime could not delete them.
    }

    [Fact]
    public void AWholeNameWithTheMarkOfALostByteIsTaken()
    {
        folder.Put("anna/odd\uFFFD.fit", Some.Fit(Some.Yesterday));
        Assert.Empty(folder.Sweep().Unreadable);
        Assert.Equal(ArrivalState.Stored, Assert.Single(folder.Arrivals()).State);
    }

    private void AddSecondInbox() => folder.Write("loadwatch.json", File.ReadAllText(folder.ConfigPath).Replace(
        "\"inboxes\": [", "\"inboxes\": [{ \"name\": \"second\", \"path\": \"second\" }, ", StringComparison.Ordinal));

    private void PutInSecond(string path, byte[] bytes)
    {
        var file = new FileInfo(Path.Combine(folder.Root, "second", path));
        file.Directory!.Create();
        File.WriteAllBytes(file.FullName, bytes);
        File.SetLastWriteTimeUtc(file.FullName, WorkingFolder.Now.ToDateTimeUtc().AddHours(-1));
    }

    /// <summary>Names under "To look at", in their order.</summary>
    private IEnumerable<string> Flagged() => File.ReadAllText(Path.Combine(folder.Root, "pages", "staff.html"))
        .Split("<header><h3>")
        .Skip(1)
        .Select(person => WebUtility.HtmlDecode(person[..person.IndexOf('<', StringComparison.Ordinal)]));

    private void Unmount()
    {
        Directory.Move(folder.Inbox, folder.Inbox + " away");
        Directory.CreateDirectory(folder.Inbox);
    }

    private void Mount()
    {
        Directory.Delete(folder.Inbox, recursive: true);
        Directory.Move(folder.Inbox + " away", folder.Inbox);
    }

    private void Shell(string script)
    {
        using var shell = Process.Start("bash", ["-c", script, folder.Inbox]);
        shell.WaitForExit();
        Assert.Equal(0, shell.ExitCode);
    }
}
