using LoadWatch.Service.Commands;

namespace LoadWatch.Service.Health;

/// <summary>The exit code that the running service will end with: 0 until something ends it that should not have. The first reason stands.</summary>
public sealed class ServiceEnd
{
    private int code = ExitCode.Ok;

    public int Code => Volatile.Read(ref code);

    /// <param name="exitCode">Of <see cref="ExitCode"/>.</param>
    public void Fail(int exitCode) => Interlocked.CompareExchange(ref code, exitCode, ExitCode.Ok);
}
