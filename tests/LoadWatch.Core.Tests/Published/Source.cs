namespace LoadWatch.Tests.Published;

/// <summary>How a number was come by.</summary>
public enum Reading
{
    /// <summary>Read in the source itself.</summary>
    Read,

    /// <summary>Read in a page or paper that quotes the source.</summary>
    Quoted,

    /// <summary>Remembered and not read again: no evidence until somebody has.</summary>
    FromMemory,
}

/// <summary>Where a number stands.</summary>
/// <param name="Words">Authors, year, title, place.</param>
public sealed record Source(string Words, Reading Reading)
{
    public string How => Reading switch
    {
        Reading.Read => "read",
        Reading.Quoted => "quoted",
        _ => "from memory",
    };
}
