using LoadWatch.Delivery.Page;
using LoadWatch.Delivery.Pictures;
using LoadWatch.Notices;

namespace LoadWatch.Delivery.Mail;

/// <summary>
/// A brief as the HTML of a mail, in what the common mail programs show: plain blocks and tables, styles on the elements, bitmaps. It says what
/// <see cref="BriefText"/> says, sentence by sentence. Its pictures stand in it as data until the message is written, so one text freezes the whole of it (I-7).
/// </summary>
public static class MailRenderer
{
    private static readonly LiquidTemplate Template = new("Mail.mail");

    /// <summary>The same brief gives the same bytes, in every culture.</summary>
    /// <param name="pictures">Whether pictures can be drawn; null: as this machine can.</param>
    public static string Render(Brief brief, PictureProbe? pictures = null) => Template.Render(PageModel.Of(brief, pictures ?? PictureProbe.OfMachine));
}
