namespace LoadWatch.Storage;

/// <summary>Bytes that were reported as durable may not be. Stop, check the disk, start again.</summary>
public sealed class DurabilityLostException : Exception
{
    public DurabilityLostException(Exception cause)
        : base("the disk failed to keep what was written: nothing more is written until a restart", cause)
    {
    }

    public DurabilityLostException(string reason)
        : base($"{reason}: nothing more is written until a restart")
    {
    }
}
