using System.Net;
using System.Net.Sockets;
using LoadWatch.Service.Commands;
using NodaTime;

namespace LoadWatch.Service.Tests.Commands;

public sealed class MailTestCommandTests
{
    private static readonly Instant Now = Instant.FromUtc(2026, 3, 1, 6, 30);

    [Fact]
    public void AServerThatIsNotThereIsSaidAndEndsWithItsOwnCode()
    {
        var (code, output, errors) = Run($"\"port\": {FreePort()}, {MailWorkplace.Sound}", "ada@example.org", "STAFF");

        Assert.Equal(ExitCode.Unavailable, code);
        Assert.StartsWith("Sending to staff by localhost, port ", output, StringComparison.Ordinal);
        Assert.StartsWith("Not sent, while connecting: ", errors, StringComparison.Ordinal);
        Assert.DoesNotContain("@", output + errors, StringComparison.Ordinal);
        Assert.DoesNotContain(MailWorkplace.Password, output + errors, StringComparison.Ordinal);
    }

    [Fact]
    public void AnUnknownContactIsAUsageErrorWithTheNearestOne()
    {
        var (code, _, errors) = Run(MailWorkplace.Sound, "ada@example.org", "stuff");

        Assert.Equal(ExitCode.Usage, code);
        Assert.StartsWith("\"stuff\" is not a contact; did you mean \"staff\"?", errors, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(MailWorkplace.Sound, "loadwatch.json names no mail address for staff")]
    [InlineData(null, "loadwatch.json names no mail server")]
    public void WithoutAServerOrAnAddressTheConfigurationIsNamed(string? mail, string expected)
    {
        var (code, _, errors) = Run(mail, "", "staff");

        Assert.Equal((ExitCode.Configuration, expected), (code, errors.TrimEnd()));
    }

    private static (int Code, string Output, string Errors) Run(string? mail, string address, string contact)
    {
        using var place = new MailWorkplace(mail, address);
        using var output = new StringWriter();
        using var errors = new StringWriter();
        var code = MailTestCommand.Run(place.Read(), contact, Now, output, errors);
        return (code, output.ToString(), errors.ToString());
    }

    private static int FreePort()
    {
        using var listener = new TcpListener(IPAddress.Loopback, 0);
        listener.Start();
        return ((IPEndPoint)listener.LocalEndpoint).Port;
    }
}
