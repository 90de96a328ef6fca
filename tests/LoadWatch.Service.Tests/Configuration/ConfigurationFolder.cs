using System.Text;
using LoadWatch.Service.Configuration;

namespace LoadWatch.Service.Tests.Configuration;

/// <summary>A working folder of its own for one test, with a sound configuration to spoil.</summary>
internal sealed class ConfigurationFolder : IDisposable
{
    public const string Roster = """
        person,name,group,birth_year,sex,time_zone
        anna,Anna,squad,1990,f,
        ben,Ben,squad,,,

        """;

    public const string Anchors = """
        person,date,anchor,value,unit,source,exercise
        anna,,heart_rate_rest,50,bpm,,

        """;

    private readonly DirectoryInfo folder = Directory.CreateTempSubdirectory("loadwatch-config-");

    public ConfigurationFolder()
    {
        Directory.CreateDirectory(At("inbox"));
        Write("loadwatch.json", "{}");
        Write("roster.csv", Roster);
        Write("anchors.csv", Anchors);
    }

    public string At(string name) => Path.Combine(folder.FullName, name);

    public void Write(string name, string text) => Write(name, Encoding.UTF8.GetBytes(text));

    public void Write(string name, byte[] bytes) => File.WriteAllBytes(At(name), bytes);

    public WorkingConfiguration Read() => ConfigurationReader.Read(At("loadwatch.json"));

    /// <summary>The faults as a user sees them.</summary>
    public IReadOnlyList<string> Faults() => [.. Assert.Throws<ConfigurationException>(Read).Faults.Select(fault => fault.ToString())];

    /// <summary>The faults with one file replaced.</summary>
    public static IReadOnlyList<string> FaultsWith(string name, string text)
    {
        using var one = new ConfigurationFolder();
        one.Write(name, text);
        return one.Faults();
    }

    /// <summary>The configuration with one file replaced.</summary>
    public static WorkingConfiguration With(string name, string text)
    {
        using var one = new ConfigurationFolder();
        one.Write(name, text);
        return one.Read();
    }

    public void Dispose() => folder.Delete(recursive: true);
}
