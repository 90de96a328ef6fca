using System.CommandLine;
using System.Text.Json;
using System.Text.Json.Nodes;
using LoadWatch.Findings;
using LoadWatch.Notices;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Export;
using Spectre.Console;

namespace LoadWatch.Service.Commands;

/// <summary><c>loadwatch rules</c>: why each rule may ask for attention, what mutes it, and its limits.</summary>
public static class RulesCommand
{
    private static readonly JsonSerializerOptions Compact = new(ConfigurationJson.Options) { WriteIndented = false };

    public static Command Create()
    {
        var config = CommonOptions.Config();
        var whose = new Argument<string?>("WHOSE")
        {
            Description = "A group or a person, for the limits that are in force; left out: the common limits of the configuration.",
            Arity = ArgumentArity.ZeroOrOne,
        };
        var json = CommonOptions.Json();
        var command = new Command("rules", "Print the rules: cause, consequence, response, time to respond, who decides, what mutes what, limits.") { whose, config, json };
        command.SetAction(parsed => Run(parsed.GetValue(config)!, parsed.GetValue(whose), parsed.GetValue(json)));
        return command;
    }

    private static int Run(string configPath, string? whose, bool json)
    {
        var configuration = ConfigurationReader.Read(configPath);
        if (Limits(configuration, whose) is not { } limits)
        {
            var known = configuration.Groups.Keys.Concat(configuration.People.Keys);
            Console.Error.WriteLine($"\"{whose}\" is neither a group nor in the roster{Nearest.Hint(whose!, known)}");
            return ExitCode.Usage;
        }

        if (json)
        {
            Console.Out.WriteLine(Words.Lines(new JsonObject
            {
                ["whose"] = whose,
                ["rules"] = new JsonArray([.. RuleBook.All.Select(rule => Line(rule, limits))]),
                ["mutes"] = new JsonArray([.. RuleMutes.All.Select(mute => new JsonObject { ["by"] = mute.By, ["rules"] = List(mute.Rules), ["how"] = mute.How })]),
                ["fixed"] = List(FixedNumbers.All),
            }));
        }
        else
        {
            Print(limits, whose);
        }

        return ExitCode.Ok;
    }

    /// <summary>Null where the word is neither a group's nor a person's.</summary>
    private static RuleLimits? Limits(WorkingConfiguration configuration, string? whose) =>
        whose is null ? configuration.CommonLimits
            : configuration.Groups.TryGetValue(whose, out var group) ? group.Limits
            : configuration.People.TryGetValue(whose, out var person) ? configuration.GroupOf(person).Limits
            : null;

    private static JsonNode Line(IRule rule, RuleLimits limits)
    {
        var line = new JsonObject { ["rule"] = rule.Name, ["says"] = rule.Record.Says, ["of_health"] = rule.Record.IsOfHealth };
        foreach (var (name, text) in rule.Record.Fields(rule.Name))
        {
            line[name.Replace(' ', '_')] = text;
        }

        line["muted_by"] = List(RuleMutes.Of(rule.Name).Select(mute => mute.By));
        line["limits"] = LimitsOf(rule, limits);
        line["limits_hash"] = RuleBook.LimitsHash(rule.Name, limits);
        return line;
    }

    private static JsonArray List(IEnumerable<string> words) => [.. words.Select(word => JsonValue.Create(word))];

    private static JsonObject LimitsOf(IRule rule, RuleLimits limits)
    {
        var own = rule.LimitsOf(limits);
        return JsonSerializer.SerializeToNode(own, own.GetType(), ConfigurationJson.Options)!.AsObject();
    }

    private static void Print(RuleLimits limits, string? whose)
    {
        Console.Out.WriteLine(whose is null ? "Limits: those common to all groups." : $"Limits: those in force for {whose}.");
        foreach (var rule in RuleBook.All)
        {
            Console.Out.WriteLine();
            Console.Out.WriteLine($"{rule.Name}: {rule.Record.Says}{(rule.LimitsOf(limits).Enabled ? "" : " (off)")}");
            TableOutput.Write(OfRule(rule, limits));
        }

        Console.Out.WriteLine();
        Console.Out.WriteLine("What mutes what:");
        var table = new Table().AddColumns("by", "mutes", "what becomes of it");
        foreach (var mute in RuleMutes.All)
        {
            table.AddRow(Markup.Escape(mute.By), Markup.Escape(string.Join(", ", mute.Rules)), Markup.Escape(mute.How));
        }

        TableOutput.Write(table);
        Console.Out.WriteLine();
        Console.Out.WriteLine("Fixed for all of them:");
        foreach (var sentence in FixedNumbers.All)
        {
            Console.Out.WriteLine($"  {sentence}");
        }

        Console.Out.WriteLine();
        Console.Out.WriteLine("Rules describe change and stimulus, nothing else. Keys, units and ranges of the limits: config/README.md.");
    }

    private static Table OfRule(IRule rule, RuleLimits limits)
    {
        var table = new Table().NoBorder().HideHeaders().AddColumns("part", "text");
        var muted = string.Join("; ", RuleMutes.Of(rule.Name).Select(mute => mute.By));
        foreach (var (name, text) in rule.Record.Fields(rule.Name).Append(("muted by", muted.Length == 0 ? "nothing" : muted)).Append(("limits", Text(LimitsOf(rule, limits)))))
        {
            table.AddRow($"  {name}", Markup.Escape(text));
        }

        return table;
    }

    private static string Text(JsonObject limits) =>
        string.Join(", ", limits.Select(limit => $"{limit.Key} {(limit.Value is JsonValue value && value.GetValueKind() == JsonValueKind.String ? value.GetValue<string>() : limit.Value!.ToJsonString(Compact))}"));
}
