namespace LoadWatch.Decoding.References;

/// <summary>
/// Every kind in which LoadWatch and a reference are known to differ, with the property of the format that it is about. Each has a test in
/// <see cref="DifferenceTests"/>; anything else that differs is an error of one of them.
/// </summary>
internal enum Difference
{
    /// <summary>Chained files: the reference stops behind the first part (fit-file-parser) or reads the others as one track (GPSBabel).</summary>
    FirstPartOnly,

    /// <summary>Components: field 8 of a record holds speed and distance in three bytes; the references leave them as bytes.</summary>
    PackedSpeedAndDistance,

    /// <summary>Dates: a count below 0x10000000 is the device's uptime; the references make a date of the nineties of it.</summary>
    UptimeIsNoDate,

    /// <summary>Developer fields: one that names a field of the profile stands in for it where that is absent; the references leave it aside.</summary>
    DeveloperFieldStandsIn,

    /// <summary>Developer fields: names are not unique; fit-file-parser lets one that is called like a field of the profile overwrite it.</summary>
    DeveloperFieldOfTheSameName,

    /// <summary>Base types: the file's own type decides how bytes are read; fit-file-parser drops the field where it is not the profile's.</summary>
    OtherBaseTypeThanTheProfile,

    /// <summary>Base types: of several values in a field of one, the first valid is taken; the references take the first.</summary>
    SeveralValuesInOne,

    /// <summary>Record headers: bits 4 and 5 of a data message's header mean nothing; fit-file-parser refuses the file.</summary>
    ReservedBitsOfAHeader,

    /// <summary>Compressed times: without a time before it such a message has none; fit-file-parser refuses the file.</summary>
    CompressedTimeWithoutReference,

    /// <summary>Compressed times: a time in the message itself stands before that of its header; fit-file-parser takes the header's.</summary>
    OwnTimeUnderCompressedHeader,

    /// <summary>Enumerations: a number without a word in one of the two tables.</summary>
    WordOfANumber,
}
