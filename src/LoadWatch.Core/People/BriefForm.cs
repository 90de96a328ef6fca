namespace LoadWatch.People;

/// <summary>A part of a brief that a contact may have or not.</summary>
public enum BriefForm
{
    /// <summary>Who is to be looked at, what came back to the usual, and the groups in tables.</summary>
    Daily,

    /// <summary>The week of the groups, what has stood unseen for long, and who lost heavy or fast leg work: with the first brief of a week.</summary>
    Weekly,

    /// <summary>Whom to call, ten at most, on one sheet: with the first brief of a week.</summary>
    CallList,

    /// <summary>Who is planned today, session by session, on one sheet each with room for a pen.</summary>
    ClassSheet,
}
