using Spectre.Console;

namespace LoadWatch.Service.Commands;

/// <summary>Prints tables. A file or a pipe has no width: there no date or id is broken over two lines.</summary>
public static class TableOutput
{
    private const int WidthWithoutTerminal = 400;

    public static void Write(Table table)
    {
        if (Console.IsOutputRedirected)
        {
            AnsiConsole.Profile.Width = WidthWithoutTerminal;
        }

        AnsiConsole.Write(table);
    }
}
