using CsCheck;

namespace LoadWatch.Tests;

public class SortedTests
{
    [Fact]
    public void TheFirstFromAValueOnIsTheOneThatLookingAtAllFinds() => Gen.Select(Gen.Int[0, 20].Array[0, 30], Gen.Int[-1, 21]).Sample((values, from) =>
    {
        Array.Sort(values);
        var first = Array.FindIndex(values, value => value >= from);

        Assert.Equal(first < 0 ? values.Length : first, Sorted.FirstFrom<int, int>(values, from, value => value));
    });
}
