namespace LoadWatch.Service.Verifications;

/// <param name="Originals">Objects of the archive that were read.</param>
/// <param name="Activities">Rows that were read.</param>
/// <param name="WithoutChecksum">Rows of before checksums were kept.</param>
/// <param name="Found">What rotted.</param>
public sealed record VerificationReport(int Originals, int Activities, int WithoutChecksum, IReadOnlyList<Rot> Found);

/// <param name="What">Full hash of an original, key of an activity, or <c>database</c>.</param>
/// <param name="Advice">What to do about it.</param>
public sealed record Rot(string What, string Sentence, string Advice);

/// <summary>What to do about each kind of rot.</summary>
internal static class Advice
{
    public const string Object = "put the file back from a backup, or let the same file arrive again: a whole copy takes the place of a rotten one";
    public const string Database = "keep a copy, and put the database back from a backup (deploy/README.md, Backing up and restoring)";
    public const string Rows = "loadwatch rebuild computes the rows anew from the originals";
}
