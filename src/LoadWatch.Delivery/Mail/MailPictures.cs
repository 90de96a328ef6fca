using System.Globalization;
using System.Text.RegularExpressions;
using MimeKit;

namespace LoadWatch.Delivery.Mail;

/// <summary>Takes the pictures out of a mail's HTML, since most mail programs show none that stands in it as data: each becomes a part that the HTML names.</summary>
internal static partial class MailPictures
{
    /// <param name="digest">Of the message; names the parts, so that the same message has the same names.</param>
    /// <param name="parts">Takes the pictures, in the order of the HTML.</param>
    /// <returns>The HTML that names them.</returns>
    public static string TakeOut(string html, string digest, List<MimePart> parts) => Data().Replace(html, match =>
    {
        var part = Part(Convert.FromBase64String(match.Groups["data"].Value), parts.Count + 1, digest);
        parts.Add(part);
        return $"<img src=\"cid:{part.ContentId}\"";
    });

    private static MimePart Part(byte[] picture, int place, string digest)
    {
        var name = string.Create(CultureInfo.InvariantCulture, $"picture{place}");
        return new MimePart("image", "png")
        {
            ContentId = $"{name}.{digest}@loadwatch",
            ContentDisposition = new ContentDisposition(ContentDisposition.Inline) { FileName = $"{name}.png" },
            ContentTransferEncoding = ContentEncoding.Base64,
            Content = new MimeContent(new MemoryStream(picture)),
        };
    }

    // Values are encoded, so no text of a brief can hold this.
    [GeneratedRegex("<img src=\"data:image/png;base64,(?<data>[A-Za-z0-9+/=]+)\"", RegexOptions.CultureInvariant | RegexOptions.ExplicitCapture | RegexOptions.NonBacktracking)]
    private static partial Regex Data();
}
