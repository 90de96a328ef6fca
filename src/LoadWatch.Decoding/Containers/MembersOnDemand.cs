using System.Collections;

namespace LoadWatch.Decoding.Containers;

/// <summary>Members that are unpacked when they are asked for; none is kept.</summary>
internal sealed class MembersOnDemand(int count, Func<int, ContainerMember> unpack) : IReadOnlyList<ContainerMember>
{
    public int Count => count;

    public ContainerMember this[int index] => unpack(index);

    public IEnumerator<ContainerMember> GetEnumerator()
    {
        for (var index = 0; index < count; index++)
        {
            yield return unpack(index);
        }
    }

    IEnumerator IEnumerable.GetEnumerator() => GetEnumerator();
}
