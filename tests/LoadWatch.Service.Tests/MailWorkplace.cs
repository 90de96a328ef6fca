using LoadWatch.Service.Configuration;

namespace LoadWatch.Service.Tests;

/// <summary>A folder with a configuration whose contact has a mail address; the password's file is private.</summary>
internal sealed class MailWorkplace : IDisposable
{
    public const string Password = "c0rrect-h0rse-canary";

    public const string Sound = """
        "host": "localhost", "security": "starttls", "from": "LoadWatch <brief@example.org>", "user": "loadwatch", "password_file": "mail.secret"
        """;

    private readonly DirectoryInfo folder = Directory.CreateTempSubdirectory("loadwatch-mail-");

    /// <param name="mail">The inside of the section; null for none.</param>
    /// <param name="address">Of the contact.</param>
    /// <param name="contact">More keys of the contact.</param>
    public MailWorkplace(string? mail = Sound, string address = "ada@example.org", string contact = "")
    {
        Directory.CreateDirectory(At("inbox"));
        File.WriteAllText(At("roster.csv"), "person,name,group,birth_year,sex,time_zone\nann,Ann,squad,1990,f,\nben,Ben,squad,,,\n");
        File.WriteAllText(At("anchors.csv"), "person,date,anchor,value,unit,source,exercise\n");
        File.WriteAllText(At("mail.secret"), Password + "\n");
        Share(forOthers: false);
        var section = mail is null ? "" : $", \"mail\": {{ {mail} }}";
        File.WriteAllText(
            At("loadwatch.json"),
            $$"""{ "time_zone": "UTC", "contacts": [ { "id": "staff", "mail": {{System.Text.Json.JsonSerializer.Serialize(address)}}{{contact}} } ]{{section}} }""");
    }

    public string At(string name) => Path.Combine(folder.FullName, name);

    public WorkingConfiguration Read() => ConfigurationReader.Read(At("loadwatch.json"));

    public string Fault() => Assert.Single(Assert.Throws<ConfigurationException>(Read).Faults).ToString();

    public void Share(bool forOthers)
    {
        if (!OperatingSystem.IsWindows())
        {
            File.SetUnixFileMode(
                At("mail.secret"), UnixFileMode.UserRead | UnixFileMode.UserWrite | (forOthers ? UnixFileMode.OtherRead : UnixFileMode.None));
        }
    }

    public void Dispose() => folder.Delete(recursive: true);
}
