using LoadWatch.Service.Arrivals;

namespace LoadWatch.Service.Tests.Arrivals;

/// <summary>A folder that never answers, as a dead share does not, holds up nobody else.</summary>
public sealed class HangGuardTests : IDisposable
{
    private readonly ManualResetEventSlim answer = new();
    private readonly HangGuard guard = new(TimeSpan.FromMilliseconds(400));
    private int begun;

    public void Dispose() => answer.Dispose();

    [Fact]
    public void OthersAreAnsweredWhileOneHangs()
    {
        var answers = guard.Run(["dead", "alive"], Work, () => { });
        Assert.Equal([null, "alive"], answers);
        answer.Set();
    }

    [Fact]
    public void WhatHangsIsNotBegunAgainUntilItHasReturned()
    {
        guard.Run(["dead"], Work, () => { });
        Assert.Equal([null], guard.Run(["dead"], Work, () => { }));
        Assert.Equal(1, begun);
        answer.Set();
        Assert.True(SpinWait.SpinUntil(() => guard.Run(["dead"], Work, () => { })[0] == "dead", TimeSpan.FromSeconds(30)));
        Assert.Equal(2, begun);
    }

    [Fact]
    public void SlowWorkThatGetsOnIsWaitedFor()
    {
        var heard = 0;
        var answers = guard.Run(
            ["slow"],
            (name, progress) =>
            {
                for (var i = 0; i < 8; i++)
                {
                    answer.Wait(TimeSpan.FromMilliseconds(150));
                    progress();
                }

                return name;
            },
            () => heard++);
        Assert.Equal(["slow"], answers);
        Assert.True(heard > 0, "nobody was told that it gets on");
    }

    [Fact]
    public void AFailureIsTheCallers() => Assert.Throws<InvalidOperationException>(
        () => guard.Run<string>(["broken"], (_, _) => throw new InvalidOperationException("a defect"), () => { }));

    private string Work(string name, Action progress)
    {
        if (name == "dead")
        {
            Interlocked.Increment(ref begun);
            answer.Wait(TestContext.Current.CancellationToken);
        }

        return name;
    }
}
