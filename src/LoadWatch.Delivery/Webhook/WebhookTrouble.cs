using System.Globalization;
using System.Net;
using System.Net.Sockets;

namespace LoadWatch.Delivery.Webhook;

/// <summary>The table of outcomes. Only what the receiver says of this notice fails for good; whatever concerns the way to it is kept and tried again.</summary>
internal static class WebhookTrouble
{
    public static ChannelOutcome OutcomeOf(HttpStatusCode status)
    {
        var code = ((int)status).ToString(CultureInfo.InvariantCulture);
        return (int)status switch
        {
            >= 200 and < 300 => ChannelOutcome.Delivered,
            >= 500 => ChannelOutcome.TryAgain($"the receiver asked to come back later: {code}"),
            400 or 409 or 413 or 415 or 422 => ChannelOutcome.Failed($"the receiver refused the notice: {code}"),
            408 or 425 or 429 => ChannelOutcome.TryAgainSlowly($"the receiver asked to come back later: {code}"),
            >= 400 => ChannelOutcome.TryAgainSlowly($"the receiver does not take notices as things stand: {code}"),
            >= 300 => ChannelOutcome.TryAgainSlowly($"the receiver names another address, and no redirect is followed: {code}"),
            _ => ChannelOutcome.TryAgain($"the receiver gave no answer that ends: {code}"),
        };
    }

    /// <returns>Null for an exception that is a defect.</returns>
    public static ChannelOutcome? OutcomeOf(Exception trouble) => trouble switch
    {
        OperationCanceledException or TimeoutException => ChannelOutcome.TryAgain("the receiver took longer than the time limit"),
        HttpRequestException { HttpRequestError: HttpRequestError.SecureConnectionError } => ChannelOutcome.TryAgain(
            "the receiver's certificate is not trusted, or no TLS could be agreed on"),
        HttpRequestException or IOException or SocketException => ChannelOutcome.TryAgain($"the receiver could not be reached: {trouble.Message}"),
        _ => null,
    };
}
