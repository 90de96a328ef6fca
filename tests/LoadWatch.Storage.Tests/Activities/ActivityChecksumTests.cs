using LoadWatch.Activities;
using LoadWatch.Capacity;
using LoadWatch.Quality;
using LoadWatch.Recordings;
using LoadWatch.Storage.Activities;
using Microsoft.Data.Sqlite;

namespace LoadWatch.Storage.Tests.Activities;

/// <summary>The engine finds no flipped bit of a value; the row's own checksum does.</summary>
public sealed class ActivityChecksumTests : StoreTest
{
    public ActivityChecksumTests(SharedFolder shared)
        : base(shared)
    {
        AddRecording(1);
        AddRecording(2);
        Store.Write(session =>
        {
            session.Activities.Put(Full(1));
            session.Activities.Put(Full(2));
        });
    }

    [Fact]
    public void WhatWasWrittenIsSound() => Assert.Equal([true, true], Checked().Select(activity => activity.IsSound));

    [Fact]
    public void TheSameValuesHaveTheSameChecksum()
    {
        var before = Checked();
        Store.Write(session => session.Activities.Put(Full(1)));
        Assert.Equal(before, Checked());
        Assert.NotEqual(before[0].Checksum, before[1].Checksum);
    }

    [Theory]
    [InlineData("UPDATE activity SET heart_rate_max_bpm = heart_rate_max_bpm + 1")]
    [InlineData("UPDATE activity SET power_max_watts = 0.30000000000000001")]
    [InlineData("UPDATE activity SET power_mean_watts = 0")]
    [InlineData("UPDATE activity SET quantities = replace(quantities, '1', '9')")]
    [InlineData("UPDATE activity SET remarks = '[]'")]
    [InlineData("UPDATE activity SET cuts = '[]'")]
    [InlineData("UPDATE activity SET date = '2026-03-09'")]
    [InlineData("UPDATE histogram SET bins = X'0401'")]
    [InlineData("DELETE FROM histogram")]
    [InlineData("UPDATE best_mean SET means = zeroblob(8)")]
    [InlineData("DELETE FROM best_mean")]
    public void AChangedCellIsFoundThoughTheEngineFindsNothing(string change)
    {
        Run(change);

        Assert.Empty(Store.Check());
        Assert.Contains(false, Checked().Select(activity => activity.IsSound));
    }

    [Fact]
    public void ARowOfBeforeChecksumsWereKeptIsNeitherSoundNorRotten()
    {
        Run("UPDATE activity SET checksum = NULL");
        Assert.Equal([null, null], Checked().Select(activity => activity.IsSound));
    }

    [Fact]
    public void PagesGoThroughAllOfThem()
    {
        var first = Assert.Single(Store.Read(session => session.Activities.Check("", 1)));
        var second = Assert.Single(Store.Read(session => session.Activities.Check(first.Key, 1)));
        Assert.Empty(Store.Read(session => session.Activities.Check(second.Key, 1)));
        Assert.Equal(Checked(), [first, second]);
    }

    private static StoredActivity Full(int number)
    {
        var histogram = new Histogram();
        histogram.Add(120, 1000);
        histogram.Add(121, 300);
        return Some.Activity(number) with
        {
            Values = new ActivityValues
            {
                HeartRateMaxBpm = 181,
                PowerMaxWatts = 0.1 + 0.2,
                Histograms = new Dictionary<Channel, Histogram> { [Channel.HeartRate] = histogram, [Channel.Power] = histogram },
                BestMeans = new Dictionary<Channel, BestMeans> { [Channel.Power] = new([412.5, 390, 0.1 + 0.2]) },
                Quantities = [Some.Quantity("minutes", 61)],
                Cuts = [new Cut(null, CutReason.Gap, new Stretch(1, 2), 0, 1, 0.5)],
                Remarks = ["cut to the planned session"],
            },
        };
    }

    private IReadOnlyList<CheckedActivity> Checked() => Store.Read(session => session.Activities.Check("", 10));

    private void Run(string sql)
    {
        using var connection = new SqliteConnection($"Data Source={Folder.DatabasePath};Pooling=False");
        connection.Open();
        using var command = connection.CreateCommand();
        command.CommandText = sql;
        Assert.NotEqual(0, command.ExecuteNonQuery());
    }
}
