namespace LoadWatch.Notices;

/// <summary>What every brief explains and cautions, the same in text and on the page.</summary>
public static class ReadingNotes
{
    public static IReadOnlyList<ReadingNote> Terms { get; } =
    [
        new("Load", "the quantity that the group watches, summed over sessions; AU are units of no dimension: minutes "
            + "weighted by heart rate, or by the rating of effort. "
            + "The week is the last 7 days. Where some of them are unknown it stands as it is so far, with a plus, and is not divided by the usual."),
        new("Usual", "the mean week of the 21 days before those 7. \u201CTimes usual\u201D is the week divided by it."),
        new("Heavy-or-fast leg day", "a day with enough hard work of the legs (heavy sets, sprints, efforts well above a steady hard pace) to call on "
            + "the large, fast motor units. Estimated, never measured. \u201CLegs\u201D counts the days since the last one."),
        new("Known days", "days of the last 7 whose load is known. A rest day is known."),
        new("Picture", "a bar is the load of a day, the grey band the usual weeks spread over their days, a level line the mean of seven days, a dash rest. "
            + "A hollow square is a day of which nothing is known, a hollow bar with a stroke one whose load could not be computed. Below, a diamond "
            + "is heavy or fast leg work, a small hollow one that this is unknown."),
        new("Unknown", "nothing came in, or it could not be computed. It is never counted as nought, and alone it raises or clears "
            + "nothing but the line about missing recordings."),
    ];

    public static IReadOnlyList<string> Cautions { get; } =
    [
        "This page describes training data. It does not diagnose, does not foretell injury, clears nobody to train, and "
            + "is not meant for selection or contracts. Whether using it for patients is regulated where you are is for you to check. "
            + "The person and the responsible coach or clinician decide.",
        "Chest pain, fainting, palpitations, unusual breathlessness, severe headache, a swollen calf, a fall or a blow "
            + "to the head, new weakness: medical help at once.",
        "No hard work with fever. No catching up after a gap: sudden hard or lengthening work can break down muscle, and "
            + "dark urine is an emergency.",
        "Heavy straining needs a clinician\u2019s word with uncontrolled blood pressure, an aneurysm, recent surgery, a "
            + "hernia, fragile bones, eye disease or eye surgery, in pregnancy and after birth; so does hard work with "
            + "glucose-lowering drugs, in heat and under 18. Heart-rate figures do not hold under drugs that slow the heart, "
            + "with arrhythmia or a pacemaker.",
        "High-force work for older or ill people follows their clinician and local guidelines.",
    ];
}

/// <summary>One explained word.</summary>
public sealed record ReadingNote(string Term, string Meaning);
