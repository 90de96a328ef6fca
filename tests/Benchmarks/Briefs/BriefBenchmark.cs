using System.Diagnostics;
using System.Globalization;
using LoadWatch.Delivery.Mail;
using LoadWatch.Delivery.Page;
using LoadWatch.Notices;
using LoadWatch.Service.Commands;
using NodaTime;

namespace LoadWatch.Benchmarks.Briefs;

/// <summary>What a morning's briefs take for 80 and for 2,000 people with a year of stored days, pictures and mails included: the first of a process, and those after it.</summary>
internal static class BriefBenchmark
{
    public const string Name = "brief";

    private static readonly (int People, double Seconds)[] Wanted = [(80, 3), (2000, 30)];

    public static int Run()
    {
        var folder = Directory.CreateTempSubdirectory("loadwatch-brief-").FullName;
        try
        {
            Console.Out.WriteLine("| people | contact | read and built | text and page | mail | page | should be |\n| --- | --- | --- | --- | --- | --- | --- |");
            return Wanted.All(size => Run(new ClinicYear(Path.Combine(folder, size.People.ToString(CultureInfo.InvariantCulture)), size.People), size.Seconds)) ? 0 : 1;
        }
        finally
        {
            Directory.Delete(folder, recursive: true);
        }
    }

    private static bool Run(ClinicYear clinic, double wanted)
    {
        clinic.Make();
        using var workplace = Workplace.OpenToWork(clinic.ConfigPath);
        clinic.Store(workplace.Store);
        var briefs = new Service.Pipeline.Briefs(workplace.Configuration, ClinicYear.Morning, [], []);
        var slowest = 0.0;
        foreach (var contact in workplace.Configuration.Contacts)
        {
            var watch = Stopwatch.StartNew();
            var brief = workplace.Store.Read(session => briefs.Build(session, contact));
            var built = watch.Elapsed.TotalSeconds;
            var length = BriefText.Write(brief).Length;
            var page = PageRenderer.Render(brief).Length;
            var written = watch.Elapsed.TotalSeconds;
            var mail = contact.Mail is null ? 0 : MailRenderer.Render(MailNames.Of(brief, contact.Names, workplace.Configuration.People.Values)).Length;
            var seconds = watch.Elapsed.TotalSeconds;
            slowest = Math.Max(slowest, seconds);
            Console.Out.WriteLine(string.Create(
                CultureInfo.InvariantCulture, $"| {clinic.People} | {contact.Id} | {built:0.00} s | {written - built:0.00} s | {(mail == 0 ? "" : $"{seconds - written:0.00} s, {mail / 1e6:0.0} MB")} | {(page + length) / 1e6:0.0} MB | under {wanted:0} s |"));
        }

        var all = Stopwatch.StartNew();
        var decided = workplace.Store.Write(briefs.Decide);
        Console.Out.WriteLine(string.Create(CultureInfo.InvariantCulture, $"| {clinic.People} | all {decided} decided and kept | {all.Elapsed.TotalSeconds:0.00} s | | | | |"));
        return slowest < wanted;
    }
}
