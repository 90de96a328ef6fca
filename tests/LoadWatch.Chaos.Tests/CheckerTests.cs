using System.Net.Sockets;
using System.Text;
using LoadWatch.Chaos.Digests;
using LoadWatch.Chaos.Inputs;
using LoadWatch.Chaos.Mail;
using LoadWatch.Chaos.Places;
using LoadWatch.Chaos.Processes;

namespace LoadWatch.Chaos.Tests;

/// <summary>The checks find what they are there to find.</summary>
public sealed class CheckerTests : IDisposable
{
    private readonly Nights nights = Nights.OneFile(Clock.Fixed, seed: 1);
    private readonly Place place = Place.Make(Binary.Find(), Clock.Fixed);

    public CheckerTests() => place.Prepare(nights);

    public void Dispose() => place.Dispose();

    [Fact]
    public void ALostSessionIsFound()
    {
        place.SweepWell();

        Assert.Contains("counts 0 times", Fault(() => TruthCheck.MustHold(place, nights.Truth)), StringComparison.Ordinal);
    }

    [Fact]
    public void ADoubledSessionAndAnotherLengthAreFound()
    {
        place.Fill(nights.Tonight);
        var other = nights.Truth.Sessions[0] with { Steps = [(100, 77)] };
        place.Put("anna/other.fit", Files.Fit(other with { Person = "anna" }));
        place.SweepWell();

        Assert.Contains("recorded sessions", Fault(() => TruthCheck.MustHold(place, nights.Truth)), StringComparison.Ordinal);
        nights.Truth.Happened(other);
        Assert.Contains(" s, not 77", Fault(() => TruthCheck.MustHold(place, nights.Truth)), StringComparison.Ordinal);
    }

    [Fact]
    public void ARowMoreAndARowLessAreFound()
    {
        place.SweepWell();
        var before = Digest.Of(place);
        place.Fill(nights.Tonight);
        place.SweepWell();
        var after = Digest.Of(place);

        after.MustEqual(after);
        Assert.Contains("has besides", Fault(() => after.MustEqual(before)), StringComparison.Ordinal);
        Assert.Contains("lacks", Fault(() => before.MustEqual(after)), StringComparison.Ordinal);
    }

    [Fact]
    public void ATornObjectOfTheArchiveIsFound()
    {
        var one = Directory.EnumerateFiles(Path.Combine(place.Data, "archive"), "*", SearchOption.AllDirectories).First();
        File.AppendAllText(one, "x");

        Assert.Contains("does not hold what it is named by", Fault(() => Digest.Of(place)), StringComparison.Ordinal);
    }

    [Fact]
    public void AHalfWrittenFileAndOneOpenToOthersAreFound()
    {
        if (OperatingSystem.IsWindows())
        {
            Assert.Skip("files have no modes here");
            return;
        }

        Leftovers.MustBeNone(place);
        var half = place.At("pages/brief.part");
        File.WriteAllText(half, "");
        Assert.Contains("brief.part", Fault(() => Leftovers.MustBeNone(place)), StringComparison.Ordinal);
        File.Delete(half);
        File.SetUnixFileMode(place.DatabasePath, UnixFileMode.UserRead | UnixFileMode.UserWrite | UnixFileMode.OtherRead);
        Assert.Contains("loadwatch.db", Fault(() => Leftovers.MustBeNone(place)), StringComparison.Ordinal);
    }

    [Fact]
    public void AMessageThatIsCutBeforeItsFinalDotDidNotCome()
    {
        using var server = new ScriptedServer();
        Say(server, "Subject: half\r\n\r\nwas to be lon");
        Say(server, "Subject: whole\r\n\r\ncame\r\n.\r\n");

        Assert.Equal("came", Assert.Single(server.Received).Content.Split('\n')[2].Trim());
    }

    /// <summary>Sends what a killed sender may have sent, and waits until the server read all of it and hung up.</summary>
    private static void Say(ScriptedServer server, string message)
    {
        using var client = new TcpClient("localhost", server.Port);
        var line = client.GetStream();
        line.Write(Encoding.ASCII.GetBytes("MAIL FROM:<a@example.org>\r\nRCPT TO:<b@example.org>\r\nDATA\r\n" + message));
        client.Client.Shutdown(SocketShutdown.Send);
        line.CopyTo(Stream.Null);
    }

    private static string Fault(Action check) => Assert.Throws<ChaosFailureException>(check).Message;
}
