using LoadWatch.Loads;
using LoadWatch.People;

namespace LoadWatch.Service.Demo;

/// <summary>A part in the demo: who, how they train, what happens to them.</summary>
/// <param name="Age">Years in the year of the last date.</param>
public sealed record DemoPart(string Id, string Name, string Group, int Age, Sex Sex, WeekPlan Week, DemoPlot Plot = DemoPlot.Usual);

/// <summary>Everybody in the demo. Invented people of an invented place.</summary>
public static class DemoCast
{
    public const string Boat = "boat";
    public const string Class = "class";
    public const string Masters = "masters";

    /// <summary>The quantity that is a group's load.</summary>
    public static string LoadOf(string group) => group == Class ? QuantityNames.Sets : QuantityNames.BanisterTrimp;

    public static IReadOnlyList<DemoPart> All { get; } =
    [
        Rower("aino", "Aino Kaislaranta", 22, Sex.Female, WeekPlan.FiveRows, DemoPlot.RampUp),
        Rower("eero", "Eero Hallavuo", 24, Sex.Male, WeekPlan.FiveRows),
        Rower("elsa", "Elsa Tuulisalmi", 19, Sex.Female, WeekPlan.FourRowsTwoGyms),
        Rower("emil", "Emil Kivilauta", 27, Sex.Male, WeekPlan.FiveRows, DemoPlot.RampUp),
        Rower("helmi", "Helmi Routalampi", 21, Sex.Female, WeekPlan.ThreeDays),
        Rower("ilmari", "Ilmari Vaahtoniemi", 25, Sex.Male, WeekPlan.FourRowsTwoGyms, DemoPlot.EasyOnly),
        Rower("inka", "Inka Lumisola", 20, Sex.Female, WeekPlan.FiveRows),
        Rower("joel", "Joel Terhokari", 23, Sex.Male, WeekPlan.FiveRows),
        Rower("kaisa", "Kaisa Suvantoharju", 26, Sex.Female, WeekPlan.FourRowsTwoGyms),
        Rower("kalle", "Kalle Ahtosaari", 18, Sex.Male, WeekPlan.ThreeDays),
        Rower("lauri", "Lauri Viimakoski", 29, Sex.Male, WeekPlan.FiveRows),
        Rower("lotta", "Lotta Hiekkavirta", 22, Sex.Female, WeekPlan.FiveRows, DemoPlot.LongRow),
        Rower("matti", "Matti Jokiselkä", 24, Sex.Male, WeekPlan.FourRowsTwoGyms, DemoPlot.StrapFailed),
        Rower("milla", "Milla Usvalehto", 21, Sex.Female, WeekPlan.FiveRows),
        Rower("niilo", "Niilo Karikallas", 30, Sex.Male, WeekPlan.ThreeDays, DemoPlot.Ill),
        Rower("oona", "Oona Pilvilahde", 19, Sex.Female, WeekPlan.FourRowsTwoGyms, DemoPlot.SilentThirteenDays),
        Rower("otso", "Otso Kelovaara", 25, Sex.Male, WeekPlan.FiveRows),
        Rower("petra", "Petra Sarahiisi", 28, Sex.Female, WeekPlan.FiveRows),
        Rower("ronja", "Ronja Aallotar-Mäki", 20, Sex.Female, WeekPlan.ThreeDays),
        Rower("saku", "Saku Honkaluoto", 23, Sex.Male, WeekPlan.FourRowsTwoGyms, DemoPlot.LeftOnLaptop),
        Rower("sanni", "Sanni Kuuraniitty", 24, Sex.Female, WeekPlan.FiveRows),
        Rower("tuomas", "Tuomas Myrskyriutta", 27, Sex.Male, WeekPlan.FourRowsTwoGyms),
        Rower("veera", "Veera Sinirouta", 18, Sex.Female, WeekPlan.ThreeDays),
        Rower("vilho", "Vilho Tervakangas", 26, Sex.Male, WeekPlan.FiveRows),

        Member("aune", "Aune Katajistola", 72, Sex.Female, WeekPlan.ThreeClasses),
        Member("elvi", "Elvi Suopursula", 79, Sex.Female, WeekPlan.ThreeClasses, DemoPlot.ArmsForWeeks),
        Member("esko", "Esko Havupelto", 68, Sex.Male, WeekPlan.TwoClasses),
        Member("hilkka", "Hilkka Mesimarjanen", 74, Sex.Female, WeekPlan.ThreeClasses),
        Member("irja", "Irja Kellokanerva", 81, Sex.Female, WeekPlan.TwoClasses),
        Member("jorma", "Jorma Pihkapuro", 70, Sex.Male, WeekPlan.ThreeClasses, DemoPlot.ArmsForDays),
        Member("kerttu", "Kerttu Vanamovuori", 77, Sex.Female, WeekPlan.ThreeClasses, DemoPlot.SilentTwoWeeks),
        Member("lempi", "Lempi Orvokkala", 83, Sex.Female, WeekPlan.TwoClasses, DemoPlot.WeakGrip),
        Member("martta", "Martta Pajuranko", 69, Sex.Female, WeekPlan.ThreeClasses),
        Member("onni", "Onni Saunakorpi", 75, Sex.Male, WeekPlan.ThreeClasses),
        Member("raija", "Raija Harmaalepikko", 66, Sex.Female, WeekPlan.TwoClasses),
        Member("reino", "Reino Tuohisalo", 84, Sex.Male, WeekPlan.TwoClasses),
        Member("sirkka", "Sirkka Nurmilauha", 71, Sex.Female, WeekPlan.ThreeClasses),
        Member("toivo", "Toivo Kuusenjärvi", 78, Sex.Male, WeekPlan.ThreeClasses),
        Member("urho", "Urho Vasamäki", 67, Sex.Male, WeekPlan.TwoClasses),
        Member("vieno", "Vieno Kultaruoho", 73, Sex.Female, WeekPlan.ThreeClasses, DemoPlot.AwayAsTold),

        new("henri", "Henri Loivarinne", Masters, 58, Sex.Male, WeekPlan.ThreeRides),
    ];

    private static DemoPart Rower(string id, string name, int age, Sex sex, WeekPlan week, DemoPlot plot = DemoPlot.Usual) =>
        new(id, name, Boat, age, sex, week, plot);

    private static DemoPart Member(string id, string name, int age, Sex sex, WeekPlan week, DemoPlot plot = DemoPlot.Usual) =>
        new(id, name, Class, age, sex, week, plot);
}
