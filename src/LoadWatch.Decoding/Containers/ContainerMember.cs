using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Containers;

/// <summary>A member of a container: its bytes, or why it cannot be had.</summary>
/// <param name="Name">A label to show and to match; never a path to write to. May repeat, may hold <c>..</c> or a drive.</param>
/// <param name="Bytes">Checked against size and CRC-32; empty where there is a problem.</param>
/// <param name="Problem">Null for a whole member. The other members are not touched by it.</param>
public sealed record ContainerMember(string Name, ReadOnlyMemory<byte> Bytes, Problem? Problem = null);

/// <summary>What a container holds.</summary>
/// <param name="Members">Each is unpacked when it is asked for, and again when it is asked for again.</param>
/// <param name="Problems">Why the container as a whole is refused; then there are no members.</param>
public sealed record Unpacked(IReadOnlyList<ContainerMember> Members, IReadOnlyList<Problem> Problems)
{
    internal static Unpacked Refused(string reason, long byteOffset) =>
        new([], [new Problem(ProblemSeverity.Error, reason, ByteOffset: byteOffset)]);
}
