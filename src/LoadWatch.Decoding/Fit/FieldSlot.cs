namespace LoadWatch.Decoding.Fit;

/// <summary>Where one field lies in the messages of a definition.</summary>
/// <param name="Offset">From the first byte behind the message's header.</param>
internal readonly record struct FieldSlot(byte Number, FitBaseType Type, int Offset, int Size)
{
    /// <summary>Whole values; 0 where the size does not divide or the type is unknown: such a field is not read.</summary>
    public int Count => Type.Size() is var size and > 0 && Size % size == 0 ? Size / size : 0;
}
