using LoadWatch.Service.Commands;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>A page is written when it could say something else, and always when it is not known whether it does.</summary>
public sealed class PageRewriteTests : IDisposable
{
    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Fact]
    public void WithoutNewsTheServiceLeavesAPageAlone()
    {
        folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday));
        using var workplace = Workplace.OpenToWork(folder.ConfigPath);
        var now = MachineClock.Now();
        workplace.NewSweep(now).Run(TestContext.Current.CancellationToken);
        Overwrite();

        workplace.NewSweep(now + Duration.FromSeconds(1)).Run(TestContext.Current.CancellationToken);
        Assert.Equal("overwritten", File.ReadAllText(Page));

        folder.Put("anna/ride2.fit", Some.Fit(Some.Yesterday, 200));
        workplace.NewSweep(now + Duration.FromSeconds(2)).Run(TestContext.Current.CancellationToken);
        Assert.NotEqual("overwritten", File.ReadAllText(Page));
    }

    [Fact]
    public void ANewProcessWritesEveryPageAnew()
    {
        folder.Sweep();
        Overwrite();

        folder.Sweep();

        Assert.NotEqual("overwritten", File.ReadAllText(Page));
    }

    private string Page => Path.Combine(folder.Root, "pages", "staff.html");

    private void Overwrite() => File.WriteAllText(Page, "overwritten");
}
