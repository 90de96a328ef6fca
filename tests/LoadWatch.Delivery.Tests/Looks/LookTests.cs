using LoadWatch.Delivery.Mail;
using LoadWatch.Delivery.Page;
using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Tests;
using NodaTime;

namespace LoadWatch.Delivery.Tests.Looks;

/// <summary>Page, list of past pages and mail as a browser draws them: on a phone, at a desk, in light and dark, on paper.</summary>
public sealed class LookTests
{
    private static readonly Lazy<IReadOnlyList<Look>> All = new(() => Browser.LookAt(Pages()));

    public static TheoryData<string, string, string> Screens
    {
        get
        {
            var screens = new TheoryData<string, string, string>();
            foreach (var page in new[] { "squad", "class", "past", "mail", "desk", "every", "faulty" })
            {
                foreach (var size in new[] { "phone", "desk" })
                {
                    screens.Add(page, size, "light");
                    screens.Add(page, size, "dark");
                }
            }

            return screens;
        }
    }

    [Theory]
    [MemberData(nameof(Screens))]
    public void NothingReachesBeyondTheWindow(string page, string size, string colours)
    {
        var look = Seen(page, size, colours);

        if (page == "faulty")
        {
            Assert.NotEmpty(look.Beyond);
            return;
        }

        Assert.Equal(size == "phone" ? 360 : 1200, look.Width);
        Assert.True(look.Scrolled <= look.Width, $"{look.Scrolled} dots wide");
        Assert.Empty(look.Beyond);
    }

    [Theory]
    [MemberData(nameof(Screens))]
    public void TheCheckOfAccessFindsNothingSerious(string page, string size, string colours)
    {
        var look = Seen(page, size, colours);

        if (page == "faulty")
        {
            Assert.Contains(look.Faults, fault => fault.StartsWith("image-alt: ", StringComparison.Ordinal));
            Assert.Contains(look.Faults, fault => fault.StartsWith("color-contrast: ", StringComparison.Ordinal));
            return;
        }

        Assert.Empty(look.Faults);
    }

    [Theory]
    [InlineData("squad", "phone", 300)]
    [InlineData("squad", "desk", 330)]
    [InlineData("mail", "phone", 280)]
    [InlineData("mail", "desk", 330)]
    public void ThePicturesAreThereInASizeThatCanBeRead(string page, string size, double width)
    {
        var pictures = Seen(page, size, "light").Pictures;

        Assert.Equal(MorningExamples.SquadBrief().Flagged.Select(person => person.Picture!.Words), pictures.Select(picture => picture.Words));
        Assert.All(pictures, picture =>
        {
            Assert.InRange(picture.Width, width, 420);
            Assert.Equal(340.0 / 150, picture.Width / picture.Height, 0.02);
            Assert.InRange(picture.Drawn, 56, 1000);
        });
    }

    [Theory]
    [InlineData("squad")]
    [InlineData("class")]
    [InlineData("past")]
    [InlineData("mail")]
    public void DarkIsDarkAndLightIsLight(string page)
    {
        Assert.InRange(Brightness(Seen(page, "phone", "light").Paper!), 230, 255);
        Assert.InRange(Brightness(Seen(page, "phone", "dark").Paper!), 0, 50);
    }

    [Theory]
    [InlineData("squad", 12)]
    [InlineData("class", 12)]
    [InlineData("mail", 13)]
    public void NoLettersAreTooSmallForAPhone(string page, double dots) => Assert.InRange(Seen(page, "phone", "light").Smallest, dots, 20);

    [Theory]
    [InlineData("squad", 2)]
    [InlineData("class", 2)]
    [InlineData("past", 2)]
    public void ItPrintsOnAFewSheets(string page, int sheets) => Assert.InRange(Seen(page, "paper", null).Sheets, 1, sheets);

    /// <summary>Today's class of 24 with a note for most of them, and ten to call: one sheet of A4 each.</summary>
    [Theory]
    [InlineData("sheet", 1)]
    [InlineData("calls", 1)]
    [InlineData("desk", 2)]
    public void ClassAndCallListTakeOneSheetEach(string page, int sheets) => Assert.Equal(sheets, Seen(page, "paper", null).Sheets);

    private static Look Seen(string page, string size, string? colours)
    {
        Browser.SkipUnlessThere();
        return Assert.Single(All.Value, look => look.Page == page && look.Size == size && look.Colours == colours);
    }

    /// <summary>Mean of red, green and blue: <c>rgb(19, 26, 33)</c>.</summary>
    private static double Brightness(string colour) => colour[4..^1].Split(',').Average(part => int.Parse(part));

    private static Dictionary<string, string> Pages() => new()
    {
        ["squad"] = PageRenderer.Render(MorningExamples.SquadBrief()),
        ["class"] = PageRenderer.Render(MorningExamples.ClassBrief()),
        ["past"] = Past(),
        ["sheet"] = PageRenderer.Render(MorningExamples.BusyDesk(BriefForm.ClassSheet)),
        ["calls"] = PageRenderer.Render(MorningExamples.BusyDesk(BriefForm.CallList)),
        ["desk"] = PageRenderer.Render(MorningExamples.BusyDesk(BriefForm.ClassSheet, BriefForm.CallList)),
        ["every"] = PageRenderer.Render(MorningExamples.EveryForm()),
        ["mail"] = MailRenderer.Render(MorningExamples.SquadBrief()),
        ["faulty"] = "<!DOCTYPE html><html lang=\"en\"><head><title>Faulty</title></head><body><p style=\"color: #888; background: #999; width: 1300px\">Faint</p><img src=\"data:image/png;base64,iVBORw0KGgo=\"></body></html>",
    };

    private static string Past()
    {
        var folder = Directory.CreateTempSubdirectory("loadwatch-past-");
        try
        {
            var first = new LocalDate(2026, 1, 20);
            for (var day = 0; day < 41; day++)
            {
                var brief = MorningExamples.SquadBrief() with { Flagged = [], Groups = [], Date = first.PlusDays(day) };
                var notice = new Notice($"ada|brief|{brief.Date:uuuu-MM-dd}", "ada", brief.Date, "Morning brief", "", PageRenderer.Render(brief), NoticeReason.BriefDue);
                new PageFile(folder.FullName).Deliver(notice, "ada");
            }

            return File.ReadAllText(Path.Combine(folder.FullName, "ada~past.html"));
        }
        finally
        {
            folder.Delete(recursive: true);
        }
    }
}
