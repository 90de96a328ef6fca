using System.Reflection.Metadata;
using System.Reflection.Metadata.Ecma335;
using System.Reflection.PortableExecutable;

namespace LoadWatch.Storage.Tests.Dialects;

/// <summary>
/// One statement per command: the SQLite provider reports no error of a statement that follows one which returned rows. Every text that the
/// compiled assembly holds is looked at, so no statement can be missed.
/// </summary>
public sealed class SqlTextTests
{
    private static readonly string[] Verbs = ["SELECT ", "INSERT ", "UPDATE ", "DELETE ", "PRAGMA ", "CREATE ", "BEGIN", "COMMIT", "WITH "];

    [Fact]
    public void NoStatementOfTheStoreHoldsASecondOne()
    {
        var statements = TextsOf(typeof(Store).Assembly.Location).Where(IsSql).ToList();

        Assert.True(statements.Count > 40, $"only {statements.Count} statements were found");
        Assert.DoesNotContain(statements, HoldsTwo);
    }

    [Fact]
    public void TransactionsAreNeverBegunOrEndedByText() =>
        Assert.DoesNotContain(
            TextsOf(typeof(Store).Assembly.Location),
            text => text.StartsWith("BEGIN", StringComparison.Ordinal) || text.StartsWith("COMMIT", StringComparison.Ordinal));

    /// <summary>A row that comes back from an INSERT would be in the caller's hands before the commit that may fail.</summary>
    [Fact]
    public void NoStatementGivesAValueBackBeforeItsCommit() =>
        Assert.DoesNotContain(TextsOf(typeof(Store).Assembly.Location), text => IsSql(text) && text.Contains("RETURNING", StringComparison.Ordinal));

    [Fact]
    public void ASecondStatementWouldBeFound()
    {
        var own = TextsOf(typeof(SqlTextTests).Assembly.Location).Where(IsSql);

        Assert.Contains(own, text => text == Bad && HoldsTwo(text));
    }

    private static string Bad => "SELECT 1; INSERT INTO letters (text) VALUES ('a')";

    private static bool IsSql(string text) => Verbs.Any(verb => text.StartsWith(verb, StringComparison.Ordinal));

    private static bool HoldsTwo(string text) => text.Contains(';', StringComparison.Ordinal);

    private static List<string> TextsOf(string assembly)
    {
        using var file = new PEReader(File.OpenRead(assembly));
        var metadata = file.GetMetadataReader();
        var texts = new List<string>();
        for (var handle = MetadataTokens.UserStringHandle(1); !handle.IsNil; handle = metadata.GetNextHandle(handle))
        {
            texts.Add(metadata.GetUserString(handle));
        }

        return texts;
    }
}
