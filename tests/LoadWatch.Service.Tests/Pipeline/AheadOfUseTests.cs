using LoadWatch.Service.Pipeline;

namespace LoadWatch.Service.Tests.Pipeline;

public sealed class AheadOfUseTests
{
    [Fact]
    public void TheOrderStaysAndOneIsMadeAhead()
    {
        var made = 0;
        var used = new List<int>();
        foreach (var number in Numbers().OneAhead())
        {
            used.Add(number);
            Assert.InRange(made, number, number + 1);
        }

        Assert.Equal([1, 2, 3], used);

        IEnumerable<int> Numbers()
        {
            foreach (var number in new[] { 1, 2, 3 })
            {
                Interlocked.Exchange(ref made, number);
                yield return number;
            }
        }
    }

    [Fact]
    public void AnErrorComesWhereItsElementWould()
    {
        var used = new List<int>();
        var error = Assert.Throws<InvalidDataException>(() => used.AddRange(Failing().OneAhead()));
        Assert.Equal(("third", 2), (error.Message, used.Count));

        static IEnumerable<int> Failing()
        {
            yield return 1;
            yield return 2;
            throw new InvalidDataException("third");
        }
    }

    [Fact]
    public void WhoStopsEarlyWaitsForTheOneUnderWay()
    {
        var isOver = false;
        Assert.Equal(1, Numbers().OneAhead().First());
        Assert.True(isOver);

        IEnumerable<int> Numbers()
        {
            try
            {
                yield return 1;
                yield return 2;
                yield return 3;
            }
            finally
            {
                isOver = true;
            }
        }
    }
}
