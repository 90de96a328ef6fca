using System.Net;
using System.Net.Sockets;
using System.Security.Cryptography.X509Certificates;
using System.Text;
using LoadWatch.Delivery.Mail;
using LoadWatch.Notices;
using MimeKit;
using NodaTime;
using SmtpServer.Protocol;

namespace LoadWatch.Delivery.Tests.Mail;

/// <summary>Against a real server, so that what is proved holds on the wire.</summary>
public sealed class MailChannelTests : IDisposable
{
    private const string Ada = "ada@example.org";

    private readonly TestAuthority authority = new();
    private readonly X509Certificate2 certificate;

    public MailChannelTests() => certificate = authority.Issue("localhost");

    [Fact]
    public async Task ANoticeArrivesAsTextAndHtml()
    {
        await using var server = await MailServer.Start(certificate);

        Assert.Equal(ChannelOutcome.Delivered, Send(server));

        var message = Received(server, 0);
        Assert.Equal("Ottilie: well above.\n", message.TextBody!.ReplaceLineEndings("\n"));
        Assert.Equal("<p>Ottilie: well above.</p>\n", message.HtmlBody!.ReplaceLineEndings("\n"));
        Assert.Equal(Ada, Assert.Single(message.To.Mailboxes).Address);
    }

    [Fact]
    public async Task TlsFromTheFirstByteWorksToo()
    {
        await using var server = await MailServer.Start(certificate, tlsFromStart: true);

        Assert.Equal(ChannelOutcome.Delivered, Send(server, settings => settings with { Security = MailSecurity.Tls }));
    }

    [Fact]
    public async Task TheLoginIsTaken()
    {
        await using var server = await MailServer.Start(certificate, login: true);

        Assert.Equal(ChannelOutcome.Delivered, Send(server, WithLogin(MailServer.Password)));
    }

    [Theory]
    [InlineData("Another authority")]
    [InlineData("Test authority")]
    public async Task AnUntrustedCertificateIsRefusedAndTheNoticeKept(string trusted)
    {
        await using var server = await MailServer.Start(certificate);
        using var other = new TestAuthority(trusted);

        Assert.Equal(
            ChannelOutcome.TryAgain("the server's certificate comes from no trusted authority"),
            Send(server, settings => settings with { CertificateAuthorityFile = other.PemFile }));
        Assert.Empty(server.Seen.Messages);
    }

    [Fact]
    public async Task WithoutAFileOfAuthoritiesThoseOfTheMachineCount()
    {
        await using var server = await MailServer.Start(certificate);

        Assert.Equal(ChannelResult.TryAgain, Send(server, settings => settings with { CertificateAuthorityFile = null }).Result);
        Assert.Empty(server.Seen.Messages);
    }

    [Fact]
    public async Task ACertificateForAnotherHostIsRefused()
    {
        using var wrong = authority.Issue("mail.example.org");
        await using var server = await MailServer.Start(wrong);

        Assert.Equal(ChannelOutcome.TryAgain("the server's certificate is for another host name"), Send(server));
        Assert.Empty(server.Seen.Messages);
    }

    [Fact]
    public async Task ACertificateOutOfDateIsRefused()
    {
        using var old = authority.Issue("localhost", daysLeft: -1);
        await using var server = await MailServer.Start(old);

        Assert.Equal(ChannelOutcome.TryAgain("the server's certificate is out of date"), Send(server));
        Assert.Empty(server.Seen.Messages);
    }

    [Theory]
    [InlineData(MailSecurity.Starttls)]
    [InlineData(MailSecurity.Tls)]
    public async Task AServerWithoutTlsIsNeverSpokenToInTheClear(MailSecurity security)
    {
        await using var server = await MailServer.Start(certificate: null);

        var outcome = Send(server, settings => WithLogin(MailServer.Password)(settings) with { Security = security });

        Assert.Equal(ChannelResult.TryAgain, outcome.Result);
        Assert.Empty(server.Seen.Messages);
        Assert.Empty(server.Seen.Passwords);
    }

    [Fact]
    public async Task AStrippedStarttlsIsSaidInPlainWords()
    {
        await using var server = await MailServer.Start(certificate: null);

        Assert.Equal("the server does not offer STARTTLS, and nothing is sent in clear text", Send(server).Reason);
    }

    [Fact]
    public async Task ClearTextIsForThisMachineAlone()
    {
        await using var server = await MailServer.Start(certificate: null);

        Assert.Equal(ChannelOutcome.Delivered, Send(server, settings => settings with { Security = MailSecurity.None }));
        Assert.False(MailSettings.IsLoopback("mail.example.org"));
        Assert.False(MailSettings.IsLoopback("10.0.0.1"));
        Assert.True(MailSettings.IsLoopback("127.0.0.1"));
        Assert.True(MailSettings.IsLoopback("::1"));
    }

    [Fact]
    public async Task AWrongPasswordIsTriedAgainSlowlyAndNeverShown()
    {
        await using var server = await MailServer.Start(certificate, login: true);

        var outcome = Send(server, WithLogin("hunter2-canary"));

        Assert.Equal(ChannelResult.TryAgainSlowly, outcome.Result);
        Assert.StartsWith("the server refused user name and password", outcome.Reason, StringComparison.Ordinal);
        Assert.DoesNotContain("hunter2-canary", outcome.Reason, StringComparison.Ordinal);
        Assert.All(server.Seen.Passwords, password => Assert.Equal("hunter2-canary", password));
        Assert.NotEmpty(server.Seen.Passwords);
    }

    [Fact]
    public async Task AServerThatWantsALoginIsNotGivenUpForWantOfOne()
    {
        await using var server = await MailServer.Start(certificate, login: true);

        Assert.Equal(ChannelResult.TryAgainSlowly, Send(server).Result);
    }

    [Fact]
    public void AMissingPasswordIsSaidWithoutTroublingTheServer()
    {
        var settings = Settings(1) with { User = MailServer.User, PasswordMissing = "the credential is not here" };

        Assert.Equal(ChannelOutcome.TryAgainSlowly("the credential is not here"), new MailChannel(settings).Deliver(Notice(), Ada));
    }

    [Theory]
    [InlineData(421, ChannelResult.TryAgain)]
    [InlineData(450, ChannelResult.TryAgain)]
    [InlineData(451, ChannelResult.TryAgain)]
    [InlineData(452, ChannelResult.TryAgain)]
    [InlineData(550, ChannelResult.Failed)]
    [InlineData(552, ChannelResult.TryAgainSlowly)]
    [InlineData(554, ChannelResult.Failed)]
    public async Task TheAnswerToTheMessageDecides(int code, ChannelResult expected)
    {
        await using var server = await MailServer.Start(certificate, _ => new SmtpResponse((SmtpReplyCode)code, "as the test wants it"));

        var outcome = Send(server);

        Assert.Equal(expected, outcome.Result);
        Assert.Contains($"{code} as the test wants it", outcome.Reason, StringComparison.Ordinal);
    }

    // RFC 5321, section 4.2.3: 552 is exceeded storage allocation; 5.2.2 and 5.3.4 (RFC 3463) may follow, or nothing.
    [Fact]
    public async Task AFullMailboxIsKeptSinceItsOwnerMayEmptyIt()
    {
        await using var server = await MailServer.Start(certificate, _ => new SmtpResponse((SmtpReplyCode)552, "5.2.2 over quota"));

        Assert.Equal(ChannelOutcome.TryAgainSlowly("mailbox full or message too large: 552 5.2.2 over quota"), Send(server));
    }

    [Fact]
    public async Task ARefusedRecipientFailsWithoutItsAddressInTheReason()
    {
        await using var server = await MailServer.Start(certificate);

        var outcome = new MailChannel(Settings(server.Port)).Deliver(Notice(), Desk.Stranger);

        Assert.Equal(ChannelResult.Failed, outcome.Result);
        Assert.StartsWith("the server refused the recipient: 550 5.1.1 (address) no such user here", outcome.Reason, StringComparison.Ordinal);
        Assert.Empty(server.Seen.Messages);
    }

    [Fact]
    public async Task ARefusedSenderIsKeptSinceTheNextConfigurationMayNameAnother()
    {
        await using var server = await MailServer.Start(certificate);

        var outcome = Send(server, settings => settings with { From = Desk.Banned });

        Assert.Equal(ChannelResult.TryAgainSlowly, outcome.Result);
        Assert.StartsWith("the server refused the sender: 550 (address) may not send here", outcome.Reason, StringComparison.Ordinal);
    }

    [Fact]
    public async Task AMessageTooLargeForTheServerHasTheAnswerOfAFullMailboxAndIsKeptAsWell()
    {
        await using var server = await MailServer.Start(certificate, largest: 300);

        var outcome = Send(server);

        Assert.Equal(ChannelResult.TryAgainSlowly, outcome.Result);
        Assert.StartsWith("mailbox full or message too large: 552", outcome.Reason, StringComparison.Ordinal);
    }

    // RFC 1047 (Partridge, 1988): the sender cannot know, so the copy carries the same name.
    [Fact]
    public async Task AfterALineLostBehindTheFinalDotTheSameBytesAreSentAgain()
    {
        await using var server = await MailServer.Start(certificate, number => number == 1 ? Desk.HangUp : null);

        var first = Send(server);
        Assert.Equal(ChannelResult.TryAgain, first.Result);
        Assert.StartsWith("the connection was lost while the message was handed over, the server may have it", first.Reason, StringComparison.Ordinal);

        Assert.Equal(ChannelOutcome.Delivered, Send(server));
        Assert.Equal(2, server.Seen.Messages.Count);
        Assert.Equal(server.Seen.Messages[0], server.Seen.Messages[1]);
        Assert.Equal(Received(server, 0).MessageId, Received(server, 1).MessageId);
    }

    [Fact]
    public void AServerThatNeverSpeaksIsLeftAfterTheTimeLimit()
    {
        using var silent = new TcpListener(IPAddress.Loopback, 0);
        silent.Start();
        var settings = Settings(((IPEndPoint)silent.LocalEndpoint).Port) with { Timeout = TimeSpan.FromMilliseconds(300) };

        Assert.Equal(ChannelOutcome.TryAgain("the server took longer than the time limit"), new MailChannel(settings).Deliver(Notice(), Ada));
    }

    [Theory]
    [InlineData("220 x")]
    [InlineData("220-x\r\n")]
    public async Task AnEndlessGreetingIsCutBeforeItFillsTheMemory(string start)
    {
        using var endless = new TcpListener(IPAddress.Loopback, 0);
        endless.Start();
        var babbling = Babble(endless, start);

        var outcome = new MailChannel(Settings(((IPEndPoint)endless.LocalEndpoint).Port)).Deliver(Notice(), Ada);

        Assert.Equal(ChannelResult.TryAgain, outcome.Result);

        // What the two ends of a socket hold comes on top of what was read.
        Assert.InRange(await babbling, 0, 32 << 20);
    }

    [Fact]
    public void AServerThatIsNotThereIsTriedAgain()
    {
        using var gone = new TcpListener(IPAddress.Loopback, 0);
        gone.Start();
        var port = ((IPEndPoint)gone.LocalEndpoint).Port;
        gone.Stop();

        Assert.Equal(ChannelResult.TryAgain, new MailChannel(Settings(port)).Deliver(Notice(), Ada).Result);
    }

    [Fact]
    public async Task ALineEndInASubjectOrTextAddsNoHeaderAndNoRecipient()
    {
        await using var server = await MailServer.Start(certificate);
        var hostile = Notice() with
        {
            Subject = "Brief\r\nBcc: eve@example.org\r\n\r\nHello",
            Text = "Ann\r\n.\r\nMAIL FROM:<eve@example.org>\r\n..\r\nBcc: eve@example.org\r\n",
        };

        Assert.Equal(ChannelOutcome.Delivered, new MailChannel(Settings(server.Port)).Deliver(hostile, Ada));

        var message = Received(server, 0);
        Assert.Equal("Brief Bcc: eve@example.org Hello", message.Subject);
        Assert.DoesNotContain(message.Headers, header => header.Id == HeaderId.Bcc);
        Assert.Equal(hostile.Text, message.TextBody!.ReplaceLineEndings("\r\n"));
        Assert.Single(server.Seen.Messages);
    }

    [Theory]
    [InlineData("ada@example.org\r\nRCPT TO:<eve@example.org>")]
    [InlineData("ada@example.org, eve@example.org")]
    [InlineData("")]
    public void ARecipientThatIsNotOneAddressFailsBeforeTheServerIsReached(string recipient)
    {
        var report = new MailChannel(Settings(1)).Send(Notice(), recipient);

        Assert.Equal(ChannelResult.Failed, report.Outcome.Result);
        Assert.Equal(MailStage.Before, report.Stage);
    }

    [Fact]
    public void TheSettingsPrintWithoutThePassword() =>
        Assert.DoesNotContain(MailServer.Password, WithLogin(MailServer.Password)(Settings(25)).ToString(), StringComparison.Ordinal);

    public void Dispose()
    {
        certificate.Dispose();
        authority.Dispose();
    }

    /// <summary>Sends one line without an end until the other side goes.</summary>
    private static async Task<long> Babble(TcpListener listener, string start)
    {
        using var client = await listener.AcceptTcpClientAsync(TestContext.Current.CancellationToken);
        var bytes = Encoding.ASCII.GetBytes(string.Concat(Enumerable.Repeat(start.EndsWith('\n') ? start : start[^1..], 65536)));
        await client.GetStream().WriteAsync(Encoding.ASCII.GetBytes(start), TestContext.Current.CancellationToken);
        for (var sent = 0L; ; sent += bytes.Length)
        {
            try
            {
                await client.GetStream().WriteAsync(bytes, TestContext.Current.CancellationToken);
            }
            catch (IOException)
            {
                return sent;
            }
        }
    }

    private static Notice Notice() => new(
        "ada|brief|2026-03-01",
        "ada",
        new LocalDate(2026, 3, 1),
        "Morning brief, Sunday 1 March 2026: something to look at",
        "Ottilie: well above.\n",
        "<p>Ottilie: well above.</p>\n",
        NoticeReason.BriefDue)
    {
        Decided = Instant.FromUtc(2026, 3, 1, 5, 30),
    };

    private static Func<MailSettings, MailSettings> WithLogin(string password) =>
        settings => settings with { User = MailServer.User, Password = password };

    private static MimeMessage Received(MailServer server, int number)
    {
        using var bytes = new MemoryStream(server.Seen.Messages[number]);
        return MimeMessage.Load(bytes, TestContext.Current.CancellationToken);
    }

    private MailSettings Settings(int port) => new()
    {
        Host = "localhost",
        Port = port,
        From = "LoadWatch <brief@example.org>",
        CertificateAuthorityFile = authority.PemFile,
    };

    private ChannelOutcome Send(MailServer server, Func<MailSettings, MailSettings>? change = null) =>
        new MailChannel((change ?? (same => same))(Settings(server.Port))).Deliver(Notice(), Ada);
}
