namespace LoadWatch.Decoding.References;

/// <summary>
/// Every kind in which LoadWatch and a reference are known to differ, with the property of the format that it is about. Each names the section of the protocol facts that it rests on, and has a test in
/// <see cref="DifferenceTests"/>; anything else that differs is an error of one of them.
/// </summary>
internal enum Difference
{
    /// <summary>Record headers: bits 4 and 5 of a data message's header mean nothing; fit-file-parser refuses the file.</summary>
    [Section(3, "record headers")]
    ReservedBitsOfAHeader,

    /// <summary>
    /// Compressed times: each is the next one behind the time before it, none where there is no such time, and a time in the message itself stands before it.
    /// fit-file-parser refuses a file without such a time and prefers the header's; GPSBabel counts from the last full time.
    /// </summary>
    [Section(3, "compressed times")]
    CompressedTimes,

    /// <summary>Definitions: the byte order is that of each definition; GPSBabel reads all with that of the newest.</summary>
    [Section(4, "definitions")]
    ByteOrderOfEachDefinition,

    /// <summary>Base types: the file's own type decides how bytes are read; fit-file-parser drops the field where it is not the profile's.</summary>
    [Section(5, "base types")]
    OtherBaseTypeThanTheProfile,

    /// <summary>Base types: of several values in a field for one, the first valid is taken; the references take the first, or all.</summary>
    [Section(5, "arrays and values that say nothing")]
    SeveralValuesInOne,

    /// <summary>Numbers: nought is a value; GPSBabel prints no heart rate, power or cadence of nought.</summary>
    [Section(6, "numbers, scale and offset")]
    NoughtIsAValue,

    /// <summary>Dates: a count below 0x10000000 is the device's uptime, and all bits set are no time; the references make dates of one or both.</summary>
    [Section(7, "dates and uptime")]
    NotADate,

    /// <summary>Components: field 8 of a record holds speed and distance in three bytes; the references leave them as bytes.</summary>
    [Section(10, "components")]
    PackedSpeedAndDistance,

    /// <summary>
    /// Developer fields: one that names a field of the profile stands in for it where that is absent, whatever it is called. The references leave it aside, and
    /// fit-file-parser lets one that is called like a field of the profile overwrite it.
    /// </summary>
    [Section(11, "developer fields")]
    DeveloperFields,

    /// <summary>Chained files: every part is read; the references stop behind the first.</summary>
    [Section(12, "chained parts")]
    FirstPartOnly,

    /// <summary>Records: of a wide and a narrow field for the same the wide one counts, with all its bits; GPSBabel takes the later, and 16 bits.</summary>
    [Section(14, "what a record means")]
    WideFields,

    /// <summary>Enumerations: a number without a word in one of the two tables.</summary>
    [Section(20, "enumerations")]
    WordOfANumber,
}

/// <summary>Where a difference belongs: number and subject of a section of the protocol facts.</summary>
[AttributeUsage(AttributeTargets.Field)]
internal sealed class SectionAttribute(int number, string subject) : Attribute
{
    public int Number => number;

    public string Subject => subject;
}
