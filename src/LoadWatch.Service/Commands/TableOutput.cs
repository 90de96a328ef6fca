using Spectre.Console;

namespace LoadWatch.Service.Commands;

/// <summary>Prints tables. A file or a pipe has no width: there no date or id is broken over two lines, and no line ends in blanks.</summary>
public static class TableOutput
{
    private const int WidthWithoutTerminal = 400;

    public static void Write(Table table)
    {
        if (!Console.IsOutputRedirected)
        {
            AnsiConsole.Write(table);
            return;
        }

        foreach (var line in Text(table).Split('\n'))
        {
            Console.Out.WriteLine(line.TrimEnd());
        }
    }

    private static string Text(Table table)
    {
        using var text = new StringWriter();
        var console = AnsiConsole.Create(new AnsiConsoleSettings { Ansi = AnsiSupport.No, ColorSystem = ColorSystemSupport.NoColors, Out = new AnsiConsoleOutput(text) });
        console.Profile.Width = WidthWithoutTerminal;
        console.Profile.Capabilities.Unicode = AnsiConsole.Profile.Capabilities.Unicode;
        console.Write(table);
        return text.ToString().TrimEnd();
    }
}
