using System.Collections.Concurrent;
using LoadWatch.Service.Tests.Pipeline;
using NodaTime;

namespace LoadWatch.Service.Tests.Metamorphic;

/// <summary>
/// A content that gets its owner late, or another one, ends as if it had come to them at once: also one that shares its session with a second device (days 27 and
/// 31) or with an export of several people.
/// </summary>
public sealed class ReattributionTests
{
    private const string Answers = "late answers.csv";
    private const string Header = "date,person,answer,file";

    private static readonly ConcurrentDictionary<(string Name, string Owner), string> Ends = [];

    private static readonly Duration Step = Duration.FromMinutes(1);

    [Theory]
    [InlineData("watch 27.fit")]
    [InlineData("bike computer 27.fit")]
    [InlineData("watch 31.fit")]
    public void AssignedLaterIsAsIfFromTheStart(string name)
    {
        using var folder = TakenIn(Files(name, "anna"));

        folder.Assign(BytesOf(name), "bo");
        folder.Sweep();

        MetamorphicTests.AssertSame(FromTheStart(name, "bo"), Digested(folder));
    }

    [Theory]
    [InlineData("watch 27.fit")]
    [InlineData("watch 31.fit")]
    public void AnAnswerThatIsWithdrawnLeavesNothing(string name)
    {
        using var folder = TakenIn(Files(name, "anna"));
        using var never = TakenIn(Files(name, "anna"));
        var digits = WorkingFolder.Sha(BytesOf(name))[..12];
        Assert.Equal(Digested(never), Digested(folder));

        folder.PutTable(Answers, 0, Header, $"2026-06-01,bo,belongs_to,{digits}");
        folder.Sweep(WorkingFolder.Now + Step);
        Assert.Equal("bo", folder.Arrival(BytesOf(name))!.Person);
        foreach (var one in new[] { folder, never })
        {
            one.PutTable(Answers, 0, Header, "2026-06-01,emil,rest,");
            one.Sweep(WorkingFolder.Now + Step + Step);
        }

        MetamorphicTests.AssertSame(Digested(never), WithoutFirstAnswers(folder, digits));
    }

    [Theory]
    [InlineData("watch 27.fit")]
    [InlineData("bike computer 27.fit")]
    [InlineData("watch 31.fit")]
    public void AFileThatIsMovedIsAsIfFromTheStart(string name)
    {
        using var folder = TakenIn(Files(name, "anna"));

        File.Move(Path.Combine(folder.Inbox, "anna", name), Path.Combine(folder.Inbox, "bo", name));
        folder.Sweep(WorkingFolder.Now - Step);
        folder.Sweep();

        MetamorphicTests.AssertSame(FromTheStart(name, "bo"), Digested(folder));
    }

    [Fact]
    public void AFileOfNobodyThatIsMovedIntoAFolderIsAsIfFromTheStart()
    {
        const string name = "nobody 2.fit";
        using var folder = TakenIn(Files(name, ""));

        File.Move(Path.Combine(folder.Inbox, "club", name), Path.Combine(folder.Inbox, "bo", name));
        folder.Sweep();

        MetamorphicTests.AssertSame(FromTheStart(name, "bo"), Digested(folder));
    }

    [Fact]
    public void OneOfTwoClaimsThatIsTakenAwayIsAsIfItHadNeverBeen()
    {
        using var folder = TakenIn(Files("claimed.fit", "anna"));

        File.Delete(Path.Combine(folder.Inbox, "anna", "claimed.fit"));
        folder.Sweep();

        using var right = TakenIn([.. Files("claimed.fit", "anna").Where(file => file.Path != "anna/claimed.fit")]);
        MetamorphicTests.AssertSame(Digested(right), Digested(folder));
    }

    private static string FromTheStart(string name, string owner) => Ends.GetOrAdd((name, owner), asked =>
    {
        using var folder = TakenIn(Files(asked.Name, asked.Owner));
        return Digested(folder);
    });

    /// <summary>Anna, Bo and the club, no copies under other names.</summary>
    private static IReadOnlyList<Placed> Files(string name, string owner) =>
    [
        .. SquadFiles.Packed
            .Where(file => file.Owner is "anna" or "bo" or "" && !file.Name.StartsWith("copy", StringComparison.Ordinal))
            .Select(file => file.Name == name ? file with { Owner = owner } : file)
            .Select(file => new Placed(file.Path, file.Bytes)),
    ];

    private static byte[] BytesOf(string name) => SquadFiles.Packed.First(file => file.Name == name).Bytes;

    private static WorkingFolder TakenIn(IReadOnlyList<Placed> files)
    {
        var folder = SquadBase.Make();
        SquadBase.TakeIn(folder, files);
        return folder;
    }

    private static string Digested(WorkingFolder folder) => Digest.Of(folder, SquadBase.Shared.DerivedTables);

    /// <summary>The version of the answers that is withdrawn is a content of its own that came in; nothing else may tell of it.</summary>
    private static string WithoutFirstAnswers(WorkingFolder folder, string digits)
    {
        var first = WorkingFolder.Sha(Some.Text($"{Header}\n2026-06-01,bo,belongs_to,{digits}\n"));
        return string.Join('\n', Digested(folder).Split('\n').Where(line => !line.StartsWith(first, StringComparison.Ordinal)));
    }
}
