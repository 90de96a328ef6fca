using System.CommandLine;
using System.CommandLine.Parsing;
using LoadWatch.Service.Configuration;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Service.Commands;

/// <summary>Options that several commands share.</summary>
public static class CommonOptions
{
    public static Option<string> Config() => new("--config", "-c")
    {
        Description = "The configuration file.",
        DefaultValueFactory = _ => "loadwatch.json",
        HelpName = "FILE",
    };

    public static Option<bool> Json() => new("--json") { Description = "Print JSON for programs." };

    public static Option<string?> By() => new("--by") { Description = "Who decides.", HelpName = "NAME" };

    public static Option<string?> Note() => new("--note") { Description = "Why, for whoever reads it later.", HelpName = "TEXT" };

    /// <summary>A date such as 2026-03-31; nothing else is taken.</summary>
    public static Option<LocalDate?> Date(string name, string description) => new(name)
    {
        Description = description,
        HelpName = "DATE",
        CustomParser = ParseDate,
    };

    /// <summary>A moment with offset such as 2026-03-31T06:30:00+02:00.</summary>
    public static Option<Instant?> Moment(string name, string description) => new(name)
    {
        Description = description,
        HelpName = "TIME",
        CustomParser = ParseMoment,
    };

    /// <summary>A time of day such as 18:30.</summary>
    public static Option<LocalTime?> TimeOfDay(string name, string description) => new(name)
    {
        Description = description,
        HelpName = "TIME",
        CustomParser = ParseTimeOfDay,
    };

    private static LocalDate? ParseDate(ArgumentResult argument)
    {
        var parsed = LocalDatePattern.Iso.Parse(argument.Tokens[0].Value);
        if (parsed.Success)
        {
            return parsed.Value;
        }

        argument.AddError($"\"{argument.Tokens[0].Value}\" is not a date such as 2026-03-31");
        return null;
    }

    private static LocalTime? ParseTimeOfDay(ArgumentResult argument)
    {
        var parsed = HourAndMinute.Pattern.Parse(argument.Tokens[0].Value);
        if (parsed.Success)
        {
            return parsed.Value;
        }

        argument.AddError($"\"{argument.Tokens[0].Value}\" is not a time of day such as 18:30");
        return null;
    }

    private static Instant? ParseMoment(ArgumentResult argument)
    {
        var parsed = OffsetDateTimePattern.Rfc3339.Parse(argument.Tokens[0].Value);
        if (parsed.Success)
        {
            return parsed.Value.ToInstant();
        }

        argument.AddError($"\"{argument.Tokens[0].Value}\" is not a time such as 2026-03-31T06:30:00+02:00");
        return null;
    }
}
