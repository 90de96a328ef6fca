using LoadWatch.Delivery.Mail;
using LoadWatch.Delivery.Page;
using LoadWatch.Delivery.Pictures;
using static LoadWatch.Tests.MorningExamples;

namespace LoadWatch.Delivery.Tests.Pictures;

/// <summary>A machine on which the drawing library cannot be loaded gets its briefs all the same; the words of each picture stand alone.</summary>
public sealed class PictureProbeTests
{
    public static TheoryData<Exception> OfLoading =>
    [
        new DllNotFoundException("Unable to load shared library 'libSkiaSharp'"),
        new BadImageFormatException("of another processor"),
        new EntryPointNotFoundException("of another version"),
        new TypeInitializationException("SkiaSharp.SKImageInfo", new DllNotFoundException("Unable to load shared library 'libSkiaSharp'")),
    ];

    [Theory]
    [MemberData(nameof(OfLoading))]
    public void ALibraryThatCannotBeLoadedMeansNoPictures(Exception fault)
    {
        var asked = 0;
        var probe = new PictureProbe(() =>
        {
            asked++;
            throw fault;
        });

        Assert.Null(probe.KnownTrouble);
        Assert.False(probe.CanDraw);
        Assert.False(probe.CanDraw);
        Assert.Equal(1, asked);
        Assert.Equal((fault.InnerException ?? fault).Message, probe.KnownTrouble);
    }

    [Fact]
    public void AFaultOfTheDrawingItselfIsNotTakenForOne()
    {
        Assert.Throws<InvalidOperationException>(() => new PictureProbe(() => throw new InvalidOperationException("a defect")).CanDraw);
        Assert.Throws<TypeInitializationException>(() => new PictureProbe(() => throw new TypeInitializationException("Some", new InvalidOperationException("a defect"))).CanDraw);
    }

    [Fact]
    public void ThisMachineDraws() => Assert.True(PictureProbe.OfMachine.CanDraw, PictureProbe.OfMachine.KnownTrouble);

    [Fact]
    public void ThePageHasTheWordsInsteadOfThePictures()
    {
        var brief = SquadBrief();
        var page = PageRenderer.Render(brief, Without());

        Assert.DoesNotContain("<figure>", page, StringComparison.Ordinal);
        Assert.Equal(4, brief.Flagged.Count);
        Assert.All(brief.Flagged, person => Assert.Contains($">{person.Picture!.Words}</p>", page, StringComparison.Ordinal));
    }

    [Fact]
    public void TheMailHasTheWordsInsteadOfThePictures()
    {
        var brief = SquadBrief();
        var mail = MailRenderer.Render(brief, Without());

        Assert.DoesNotContain("<img", mail, StringComparison.Ordinal);
        Assert.All(brief.Flagged, person => Assert.Contains($">{person.Picture!.Words}</p>", mail, StringComparison.Ordinal));
    }

    [Fact]
    public void WithPicturesTheWordsStandOnlyInThem()
    {
        var brief = SquadBrief();

        Assert.All(
            [PageRenderer.Render(brief), MailRenderer.Render(brief)],
            text => Assert.All(brief.Flagged, person => Assert.DoesNotContain($">{person.Picture!.Words}</p>", text, StringComparison.Ordinal)));
    }

    private static PictureProbe Without() => new(() => throw new DllNotFoundException("no library"));
}
