using LoadWatch.Notices;
using NodaTime;

namespace LoadWatch.Delivery.Pictures;

/// <summary>
/// Whether pictures can be drawn here. The drawing library has a native part, which an unusual machine may lack, or not be able to load: then a brief is written all the same, and the words of
/// each picture stand alone. Asked once, before the first picture.
/// </summary>
/// <param name="draw">Draws something.</param>
public sealed class PictureProbe(Action draw)
{
    private readonly Lazy<string?> trouble = new(() => Trouble(draw));

    /// <summary>Of this machine.</summary>
    public static PictureProbe OfMachine { get; } = new(() => PersonDrawing.Png(new PersonPicture([new BriefDay(new LocalDate(2026, 1, 1), Known: false, Load: null, HeavyLegs: null)], [], Usual: null, "AU")));

    public bool CanDraw => trouble.Value is null;

    /// <summary>Why nothing can be drawn; null where it can, and where nobody has asked yet.</summary>
    public string? KnownTrouble => trouble.IsValueCreated ? trouble.Value : null;

    /// <summary>A fault of the drawing itself is none of the machine's: it is not taken for one.</summary>
    private static string? Trouble(Action draw)
    {
        try
        {
            draw();
            return null;
        }
        catch (Exception missing) when (IsOfLoading(missing))
        {
            return OneLine.Of(missing.GetBaseException().Message);
        }
    }

    /// <summary>Missing, of another processor or another version; the second use of a class that could not be made says so itself.</summary>
    private static bool IsOfLoading(Exception fault) => fault is DllNotFoundException or BadImageFormatException or EntryPointNotFoundException
        || (fault is TypeInitializationException { InnerException: { } inner } && IsOfLoading(inner));
}
