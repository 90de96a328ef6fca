using LoadWatch.Recordings;

namespace LoadWatch.Activities;

public class SportMatchTests
{
    [Theory]
    [InlineData(null, "cycling", SportFit.Possible)]
    [InlineData("running", "running", SportFit.Same)]
    [InlineData("running", "running/trail", SportFit.Same)]
    [InlineData("running/trail", "running/trail", SportFit.Exact)]
    [InlineData("running/trail", "running/street", SportFit.Same)]
    [InlineData("soccer", "running", SportFit.Possible)]
    [InlineData("soccer", "team_sport", SportFit.Possible)]
    [InlineData("soccer", "generic", SportFit.Possible)]
    [InlineData("running", "soccer", SportFit.Possible)]
    [InlineData("generic", "rowing", SportFit.Possible)]
    [InlineData("soccer", "walking", SportFit.None)]
    [InlineData("soccer", "cycling", SportFit.None)]
    [InlineData("running", "cycling", SportFit.None)]
    [InlineData("cycling", "fitness_equipment/indoor_cycling", SportFit.Possible)]
    [InlineData("running", "fitness_equipment/treadmill", SportFit.Possible)]
    [InlineData("fitness_equipment/treadmill", "fitness_equipment/indoor_cycling", SportFit.None)]
    [InlineData("fitness_equipment", "fitness_equipment/indoor_cycling", SportFit.Same)]
    [InlineData("training/strength_training", "fitness_equipment", SportFit.Possible)]
    public void ATableMayTellOfARecordingOfTheSameFamilyOfSports(string? stated, string recorded, SportFit fit) =>
        Assert.Equal(fit, SportMatch.Of(stated is null ? null : Sport.Parse(stated), Sport.Parse(recorded)));

    [Theory]
    [InlineData("training/strength_training", 0, SportFit.Same)]
    [InlineData("training/cardio_training", 0, SportFit.Possible)]
    [InlineData("fitness_equipment", 0, SportFit.Possible)]
    [InlineData("generic", 0, SportFit.Possible)]
    [InlineData("generic", 3, SportFit.Same)]
    [InlineData("rowing", 3, SportFit.Same)]
    [InlineData("rowing", 0, SportFit.None)]
    [InlineData("running", 3, SportFit.None)]
    [InlineData("walking", 3, SportFit.None)]
    [InlineData("soccer", 0, SportFit.None)]
    [InlineData("cycling", 3, SportFit.None)]
    [InlineData("fitness_equipment/indoor_cycling", 0, SportFit.None)]
    public void SetsAreDoneInTheGymNeverInARunOrRide(string recorded, int ownSets, SportFit fit) =>
        Assert.Equal(fit, SportMatch.OfSets(Sport.Parse(recorded), ownSets));
}
