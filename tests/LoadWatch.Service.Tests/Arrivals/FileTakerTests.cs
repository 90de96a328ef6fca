using LoadWatch.Service.Arrivals;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Tests.Pipeline;
using LoadWatch.Storage;
using LoadWatch.Storage.Archives;
using NodaTime;
using WorkingFolder = LoadWatch.Service.Tests.Pipeline.WorkingFolder;

namespace LoadWatch.Service.Tests.Arrivals;

public sealed class FileTakerTests : IDisposable
{
    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    /// <summary>Decoders that are not there stand for whatever goes wrong once the copy is made.</summary>
    [Fact]
    public void NoCopyIsLeftWhereSomethingGoesWrongBehindIt()
    {
        var path = folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday), age: Duration.Zero);
        var configuration = ConfigurationReader.Read(folder.ConfigPath);
        var data = DataFolder.Open(folder.Data);
        var taker = new FileTaker(configuration, new Archive(data), null!, WorkingFolder.Now);

        Assert.Throws<NullReferenceException>(() => taker.Take(new FoundFile(configuration.Inboxes[0], "anna/ride.fit", path)));

        Assert.Empty(Directory.EnumerateFiles(data.IncomingPath));
    }
}
