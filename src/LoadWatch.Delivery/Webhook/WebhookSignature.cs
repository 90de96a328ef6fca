using System.Globalization;
using System.Security.Cryptography;
using System.Text;

namespace LoadWatch.Delivery.Webhook;

/// <summary>HMAC-SHA-256 (RFC 2104, FIPS 180-4) under the secret's UTF-8 bytes over the moment of sending, a line feed and the body.</summary>
public static class WebhookSignature
{
    /// <param name="sentAt">Seconds since 1970 UTC, as the header gives them.</param>
    /// <returns>64 lower-case hex digits.</returns>
    public static string Of(string secret, long sentAt, byte[] body)
    {
        byte[] signed = [.. Encoding.ASCII.GetBytes(sentAt.ToString(CultureInfo.InvariantCulture)), (byte)'\n', .. body];
        return Convert.ToHexStringLower(HMACSHA256.HashData(Encoding.UTF8.GetBytes(secret), signed));
    }
}
