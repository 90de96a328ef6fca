using NodaTime;

namespace LoadWatch.Service.Demo;

/// <summary>One file of the demo's folder.</summary>
/// <param name="Path">Below the folder, <c>/</c> between folders.</param>
/// <param name="Modified">The time that the file carries.</param>
internal sealed record DemoFile(string Path, byte[] Bytes, Instant Modified);
