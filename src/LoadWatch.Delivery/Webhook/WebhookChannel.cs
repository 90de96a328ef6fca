using System.Globalization;
using System.Net;
using System.Net.Http.Headers;
using LoadWatch.Delivery.Mail;
using LoadWatch.Notices;

namespace LoadWatch.Delivery.Webhook;

/// <summary>
/// Notices posted to a chat or ticket system. Redirects are not followed and answers are not read; a receiver knows a notice that comes twice by its key.
/// </summary>
/// <param name="clock">For the moment of sending alone: a receiver refuses what was recorded and is played again later.</param>
public sealed class WebhookChannel(WebhookSettings settings, TimeProvider clock) : INoticeChannel
{
    public const string ChannelName = "webhook";
    public const string KeyHeader = "LoadWatch-Notice";
    public const string SentAtHeader = "LoadWatch-Sent-At";
    public const string SignatureHeader = "LoadWatch-Signature";

    private const int HeaderKilobytesAtMost = 16;

    public string Name => ChannelName;

    /// <param name="recipient">The contact's id: an address may hold a secret of its own, so none is kept with the deliveries.</param>
    public ChannelOutcome Deliver(Notice notice, string recipient)
    {
        if (!settings.Addresses.TryGetValue(recipient, out var address))
        {
            return ChannelOutcome.TryAgainSlowly("the contact has no address to post to");
        }

        return settings.Secret is { } secret
            ? Post(notice, address, secret)
            : ChannelOutcome.TryAgainSlowly(settings.SecretMissing ?? "there is no secret to sign with");
    }

    private ChannelOutcome Post(Notice notice, Uri address, string secret)
    {
        using var limit = new CancellationTokenSource(settings.Timeout);
        using var client = new HttpClient(Handler(address)) { Timeout = Timeout.InfiniteTimeSpan };
        using var request = Request(notice, address, secret);
        try
        {
            using var answer = client.Send(request, HttpCompletionOption.ResponseHeadersRead, limit.Token);
            return WebhookTrouble.OutcomeOf(answer.StatusCode);
        }
        catch (Exception e) when (WebhookTrouble.OutcomeOf(e) is { } outcome)
        {
            return outcome with { Reason = OneLine.Of(outcome.Reason) };
        }
    }

    private HttpRequestMessage Request(Notice notice, Uri address, string secret)
    {
        var body = WebhookBody.Of(notice);
        var sentAt = clock.GetUtcNow().ToUnixTimeSeconds();
        var request = new HttpRequestMessage(HttpMethod.Post, address) { Content = new ByteArrayContent(body) };
        request.Content.Headers.ContentType = new MediaTypeHeaderValue("application/json");
        request.Headers.UserAgent.Add(new ProductInfoHeaderValue("LoadWatch", null));
        request.Headers.Add(KeyHeader, notice.Key);
        request.Headers.Add(SentAtHeader, sentAt.ToString(CultureInfo.InvariantCulture));
        request.Headers.Add(SignatureHeader, WebhookSignature.Of(secret, sentAt, body));
        return request;
    }

    private static SocketsHttpHandler Handler(Uri address) => new()
    {
        AllowAutoRedirect = false,
        UseCookies = false,
        UseProxy = !MailSettings.IsLoopback(address.IdnHost.Trim('[', ']')),
        AutomaticDecompression = DecompressionMethods.None,
        MaxResponseHeadersLength = HeaderKilobytesAtMost,
    };
}
