using System.Buffers.Binary;
using System.Security.Cryptography;
using LoadWatch.Decoding.Fit;

namespace LoadWatch.Benchmarks.Imports;

/// <summary>
/// The least that any import of these files has to do, on one core: read, SHA-256, CRC-16, walk over the messages, copy the twelve fields of every record into
/// columns. Nothing is computed, kept or made durable. Buffers are used again.
/// </summary>
internal sealed class Floor
{
    private const int MostFields = 12;
    private const int RecordMessage = 20;

    private readonly Plan[] plans = [.. Enumerable.Range(0, 16).Select(_ => new Plan())];
    private readonly int[][] columns = [.. Enumerable.Range(0, MostFields).Select(_ => new int[1 << 14])];
    private readonly byte[] hash = new byte[SHA256.HashSizeInBytes];
    private byte[] buffer = new byte[1 << 20];

    public long Bytes { get; private set; }

    public long Records { get; private set; }

    public void Read(IEnumerable<string> paths)
    {
        foreach (var path in paths)
        {
            var length = ReadWhole(path);
            var bytes = buffer.AsSpan(0, length);
            SHA256.HashData(bytes, hash);
            if (FitCrc.Of(bytes) != 0)
            {
                throw new InvalidDataException($"{path} is damaged");
            }

            Records += Walk(bytes[bytes[0]..^2]);
            Bytes += length;
        }
    }

    private int ReadWhole(string path)
    {
        using var handle = File.OpenHandle(path);
        var length = (int)RandomAccess.GetLength(handle);
        if (buffer.Length < length)
        {
            buffer = new byte[length * 2];
        }

        for (var read = 0; read < length;)
        {
            read += RandomAccess.Read(handle, buffer.AsSpan(read, length - read), read);
        }

        return length;
    }

    private int Walk(ReadOnlySpan<byte> data)
    {
        var row = 0;
        while (data.Length > 0)
        {
            var plan = plans[data[0] & 15];
            if ((data[0] & 0x40) != 0)
            {
                data = plan.Define(data);
            }
            else
            {
                if (plan.IsRecord)
                {
                    Copy(plan, data[1..], row++);
                }

                data = data[(1 + plan.Length)..];
            }
        }

        return row;
    }

    private void Copy(Plan plan, ReadOnlySpan<byte> message, int row)
    {
        if (row == columns[0].Length)
        {
            for (var i = 0; i < columns.Length; i++)
            {
                Array.Resize(ref columns[i], row * 2);
            }
        }

        var offset = 0;
        for (var field = 0; field < plan.Fields; field++)
        {
            var size = plan.Sizes[field];
            columns[field][row] = size switch
            {
                4 => BinaryPrimitives.ReadInt32LittleEndian(message[offset..]),
                2 => BinaryPrimitives.ReadUInt16LittleEndian(message[offset..]),
                _ => message[offset],
            };
            offset += size;
        }
    }

    private sealed class Plan
    {
        public int[] Sizes { get; } = new int[MostFields];

        public int Fields { get; private set; }

        public int Length { get; private set; }

        public bool IsRecord { get; private set; }

        /// <returns>What is behind the definition.</returns>
        public ReadOnlySpan<byte> Define(ReadOnlySpan<byte> data)
        {
            Fields = data[5];
            Length = 0;
            IsRecord = BinaryPrimitives.ReadUInt16LittleEndian(data[3..]) == RecordMessage;
            for (var field = 0; field < Fields; field++)
            {
                Sizes[field] = data[7 + (3 * field)];
                Length += Sizes[field];
            }

            return data[(6 + (3 * Fields))..];
        }
    }
}
