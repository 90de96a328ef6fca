namespace LoadWatch.Service.Commands;

/// <summary>What a command tells the one who started it, by the numbers of BSD's sysexits.</summary>
public static class ExitCode
{
    public const int Ok = 0;

    /// <summary>The command line is wrong.</summary>
    public const int Usage = 64;

    /// <summary>The database or the archive is damaged.</summary>
    public const int Data = 65;

    /// <summary>A server that is needed cannot be had, or refuses.</summary>
    public const int Unavailable = 69;

    /// <summary>A defect of LoadWatch.</summary>
    public const int Software = 70;

    /// <summary>Something could not be created.</summary>
    public const int CannotCreate = 73;

    /// <summary>Reading or writing failed.</summary>
    public const int InputOutput = 74;

    /// <summary>Try again later: another instance works on the same data.</summary>
    public const int TryLater = 75;

    /// <summary>Not allowed.</summary>
    public const int NoPermission = 77;

    /// <summary>The configuration is wrong, or the program is older than the database.</summary>
    public const int Configuration = 78;

    /// <summary>Stopped by a signal.</summary>
    public const int Interrupted = 130;
}
