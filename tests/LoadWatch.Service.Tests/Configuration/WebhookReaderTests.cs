using LoadWatch.Delivery.Webhook;
using LoadWatch.Service.Configuration;

namespace LoadWatch.Service.Tests.Configuration;

public sealed class WebhookReaderTests : IDisposable
{
    private const string Address = "https://chat.example.org/hooks/canary-of-the-address";
    private const string Secret = "canary-of-the-secret-0123456789abcdef";
    private const string Sound = "\"secret_file\": \"webhook.secret\"";

    private readonly MailWorkplace place = new(mail: null, address: "");

    public WebhookReaderTests() => Keep(Secret + "\n");

    [Fact]
    public void ASoundSectionGivesSettingsWithTheSecretOfTheFile()
    {
        Write(Address, Sound + ", \"timeout_seconds\": 12");

        var webhook = place.Read().Webhook!;

        Assert.Equal(("staff", new Uri(Address)), Assert.Single(webhook.Addresses.Select(pair => (pair.Key, pair.Value))));
        Assert.Equal((Secret, TimeSpan.FromSeconds(12)), (webhook.Secret, webhook.Timeout));
    }

    [Fact]
    public void TheSecretIsInNoTextAndTheAddressInNothingThatPrints()
    {
        Write(Address, Sound);

        var configuration = place.Read();

        Assert.DoesNotContain(Secret, configuration.Text, StringComparison.Ordinal);
        Assert.DoesNotContain("canary-of-the", configuration.Webhook!.ToString(), StringComparison.Ordinal);
    }

    [Fact]
    public void WithoutAnAddressThereIsNone()
    {
        Write("", Sound);

        Assert.Null(place.Read().Webhook);
    }

    [Fact]
    public void ASecretThatEverybodyCanReadIsAFault()
    {
        Assert.SkipWhen(OperatingSystem.IsWindows(), "file modes are of Unix");
        if (!OperatingSystem.IsWindows())
        {
            File.SetUnixFileMode(place.At("webhook.secret"), UnixFileMode.UserRead | UnixFileMode.UserWrite | UnixFileMode.OtherRead);
        }

        Write(Address, Sound);

        Assert.Equal("loadwatch.json:1: webhook.secret_file: \"webhook.secret\" can be read by everybody on this machine: chmod 600 it", place.Fault());
    }

    [Theory]
    [InlineData("", "does not hold one line with the secret")]
    [InlineData("one\ntwo", "does not hold one line with the secret")]
    [InlineData("canary-of-31-characters-0123456", "holds a secret that can be guessed: 32 characters at least")]
    public void AFileThatIsNoSecretIsAFaultThatDoesNotShowIt(string content, string expected)
    {
        Keep(content);
        Write(Address, Sound);

        var fault = place.Fault();

        Assert.Contains(expected, fault, StringComparison.Ordinal);
        Assert.DoesNotContain("canary", fault, StringComparison.Ordinal);
    }

    // systemd hands credentials to the service alone: a check by hand must not fail for want of them.
    [Fact]
    public void ACredentialIsMissedOnlyWhenSomethingIsPosted()
    {
        Assert.SkipWhen(Environment.GetEnvironmentVariable("CREDENTIALS_DIRECTORY") is not null, "these tests run as a service with credentials");
        Write(Address, "\"secret_credential\": \"hook\"");

        var webhook = place.Read().Webhook!;

        Assert.Equal((null, "the credential hook is given by systemd to the service only"), (webhook.Secret, webhook.SecretMissing));
    }

    [Theory]
    [InlineData(Address, "", "webhook.secret_file: a contact has an address to post to, so the secret that signs must be named")]
    [InlineData(Address, "\"secret_file\": \"webhook.secret\", \"secret_credential\": \"hook\"", "webhook.secret_file: secret_file and secret_credential are both named")]
    [InlineData(Address, "\"secret_credential\": \"../hook\"", "webhook.secret_credential: \"../hook\" is not the name of a credential")]
    [InlineData(Address, "\"secret\": \"x\"", "\"secret\" is not a key here")]
    [InlineData(Address, Sound + ", \"timeout_seconds\": 4", "webhook.timeout_seconds: 4 is outside 5 to 120")]
    [InlineData("http://chat.example.org/hooks/canary-of-the-address", Sound, "contacts[0].webhook: would send health data in clear text")]
    [InlineData("chat.example.org", Sound, "contacts[0].webhook: is not an address that begins with https://")]
    public void EveryFaultIsNamedWithItsPlace(string address, string section, string expected)
    {
        Write(address, section);

        var fault = place.Fault();

        Assert.StartsWith("loadwatch.json:1: ", fault, StringComparison.Ordinal);
        Assert.Contains(expected, fault, StringComparison.Ordinal);
        Assert.DoesNotContain("canary-of-the-address", fault, StringComparison.Ordinal);
    }

    public void Dispose() => place.Dispose();

    private void Write(string address, string section) => File.WriteAllText(
        place.At("loadwatch.json"),
        $$"""{ "time_zone": "UTC", "contacts": [ { "id": "staff", "webhook": "{{address}}" } ], "webhook": { {{section}} } }""");

    private void Keep(string secret)
    {
        File.WriteAllText(place.At("webhook.secret"), secret);
        if (!OperatingSystem.IsWindows())
        {
            File.SetUnixFileMode(place.At("webhook.secret"), UnixFileMode.UserRead | UnixFileMode.UserWrite);
        }
    }
}
