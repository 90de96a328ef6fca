using LoadWatch.Delivery.Mail;

namespace LoadWatch.Service.Tests.Configuration;

public sealed class MailReaderTests
{
    private const string From = "\"from\": \"brief@example.org\"";

    [Fact]
    public void ASoundSectionGivesSettingsWithThePasswordOfTheFile()
    {
        using var place = new MailWorkplace();

        var configuration = place.Read();

        var mail = configuration.Mail!;
        Assert.Equal(("localhost", 587, MailSecurity.Starttls, "loadwatch"), (mail.Host, mail.Port, mail.Security, mail.User));
        Assert.Equal(MailWorkplace.Password, mail.Password);
        Assert.Equal(TimeSpan.FromSeconds(30), mail.Timeout);
        Assert.Equal("ada@example.org", Assert.Single(configuration.Contacts).Mail);
    }

    [Fact]
    public void ThePasswordIsNeitherInTheKeptTextNorInWhatPrints()
    {
        using var place = new MailWorkplace();

        var configuration = place.Read();

        Assert.DoesNotContain(MailWorkplace.Password, configuration.Text, StringComparison.Ordinal);
        Assert.DoesNotContain(MailWorkplace.Password, configuration.ToString(), StringComparison.Ordinal);
    }

    [Fact]
    public void WithoutASectionMailIsOff()
    {
        using var place = new MailWorkplace(mail: null, address: "");

        Assert.Null(place.Read().Mail);
        Assert.Null(Assert.Single(place.Read().Contacts).Mail);
    }

    [Fact]
    public void ASecretThatEverybodyCanReadIsAFault()
    {
        Assert.SkipWhen(OperatingSystem.IsWindows(), "file modes are of Unix");
        using var place = new MailWorkplace();
        place.Share(forOthers: true);

        Assert.Equal("loadwatch.json:1: mail.password_file: \"mail.secret\" can be read by everybody on this machine: chmod 600 it", place.Fault());
    }

    [Theory]
    [InlineData("", "does not hold one line with the password")]
    [InlineData("\n\n", "does not hold one line with the password")]
    [InlineData("one\ntwo", "does not hold one line with the password")]
    public void AFileThatIsNotOnePasswordIsAFaultThatDoesNotShowIt(string content, string expected)
    {
        using var place = new MailWorkplace();
        File.WriteAllText(place.At("mail.secret"), content);

        var fault = place.Fault();

        Assert.Contains(expected, fault, StringComparison.Ordinal);
        Assert.DoesNotContain("two", fault, StringComparison.Ordinal);
    }

    [Fact]
    public void AMissingSecretIsAFault()
    {
        using var place = new MailWorkplace();
        File.Delete(place.At("mail.secret"));

        Assert.Contains("mail.password_file: \"mail.secret\" cannot be read: it is not there", place.Fault(), StringComparison.Ordinal);
    }

    // systemd hands credentials to the service alone: a check by hand must not fail for want of them.
    [Fact]
    public void ACredentialIsMissedOnlyWhenMailIsSent()
    {
        Assert.SkipWhen(Environment.GetEnvironmentVariable("CREDENTIALS_DIRECTORY") is not null, "these tests run as a service with credentials");
        using var place = new MailWorkplace($"\"host\": \"localhost\", {From}, \"user\": \"loadwatch\", \"password_credential\": \"smtp\"");

        var mail = place.Read().Mail!;

        Assert.Null(mail.Password);
        Assert.Equal("the credential smtp is given by systemd to the service only", mail.PasswordMissing);
    }

    [Theory]
    [InlineData($"\"host\": \"mail host\", {From}", "mail.host: \"mail host\" is not the name of a host")]
    [InlineData("\"host\": \"mail.example.org\"", "mail.from: \"\" is not one mailbox such as LoadWatch <brief@example.org>")]
    [InlineData("\"host\": \"mail.example.org\", \"from\": \"a@example.org\\r\\nBcc: b@example.org\"", "is not one mailbox")]
    [InlineData($"\"host\": \"mail.example.org\", {From}, \"security\": \"none\"", "mail.security: \"none\" sends health data in clear text")]
    [InlineData($"\"host\": \"mail.example.org\", {From}, \"security\": \"auto\"", "mail.security")]
    [InlineData($"\"host\": \"mail.example.org\", {From}, \"port\": 0", "mail.port: 0 is outside 1 to 65535")]
    [InlineData($"\"host\": \"mail.example.org\", {From}, \"user\": \"a\"", "mail.user: the user needs a password")]
    [InlineData($"\"host\": \"mail.example.org\", {From}, \"password_file\": \"mail.secret\"", "mail.user: a password is named, but no user")]
    [InlineData(
        $"\"host\": \"mail.example.org\", {From}, \"user\": \"a\", \"password_file\": \"mail.secret\", \"password_credential\": \"smtp\"", "one is enough")]
    [InlineData($"\"host\": \"mail.example.org\", {From}, \"user\": \"a\", \"password_credential\": \"../smtp\"", "is not the name of a credential")]
    [InlineData(
        $"\"host\": \"mail.example.org\", {From}, \"certificate_authority_file\": \"roster.csv\"",
        "mail.certificate_authority_file: \"roster.csv\" is not a readable file with a certificate in PEM form")]
    [InlineData($"\"host\": \"mail.example.org\", {From}, \"password\": \"a\"", "\"password\" is not a key here")]
    public void EveryFaultIsNamedWithItsPlace(string mail, string expected)
    {
        using var place = new MailWorkplace(mail);

        var fault = place.Fault();

        Assert.StartsWith("loadwatch.json:1: ", fault, StringComparison.Ordinal);
        Assert.Contains(expected, fault, StringComparison.Ordinal);
    }

    [Fact]
    public void AnAddressWithoutAServerIsAFault()
    {
        using var place = new MailWorkplace(mail: null);

        Assert.Contains("mail.host: a contact has a mail address, so the server that takes mail must be named", place.Fault(), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("ada")]
    [InlineData("ada@example.org, ben@example.org")]
    [InlineData("ada@example.org\r\nBcc: eve@example.org")]
    public void AnAddressThatIsNotOneIsAFault(string address)
    {
        using var place = new MailWorkplace(address: address);

        Assert.Contains("contacts[0].mail", place.Fault(), StringComparison.Ordinal);
    }
}
