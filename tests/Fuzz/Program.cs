using LoadWatch.Decoding.Fit;
using SharpFuzz;

// Gets a file on standard input and decodes it. What AFL++ changes is closed again with the right size and checksum, so that it reaches the messages.
Fuzzer.OutOfProcess.Run(stream =>
{
    using var memory = new MemoryStream();
    stream.CopyTo(memory);
    var bytes = memory.ToArray();
    FitDecoder.Decode(bytes);
    FitDecoder.Decode(bytes, salvages: true);
    FitDecoder.Decode(Closed(bytes));
});

static byte[] Closed(byte[] data)
{
    byte[] part = [14, 0x20, 0, 0, .. BitConverter.GetBytes(data.Length), .. ".FIT"u8, 0, 0, .. data];
    return [.. part, .. BitConverter.GetBytes(FitCrc.Of(part))];
}
