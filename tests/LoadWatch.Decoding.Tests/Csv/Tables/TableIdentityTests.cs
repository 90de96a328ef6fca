using CsCheck;
using LoadWatch.Recordings;
using LoadWatch.Rows;

namespace LoadWatch.Decoding.Tests.Csv.Tables;

/// <summary>What tells a row from the others, and what happens to two that are the same.</summary>
public class TableIdentityTests
{
    [Theory]
    [InlineData("date,minutes,session,start,drill\n2026-10-05,60,2,17:30,\n", "2026-10-05|order=2")]
    [InlineData("date,minutes,session,start,drill\n2026-10-05,60,,17:30,Warm-up\n", "2026-10-05|start=17:30:00|drill=Warm-up")]
    [InlineData("date,minutes,session,start,drill\n2026-10-05,60,,,a|b\\c\n", "2026-10-05|drill=a\\|b\\\\c|n=1")]
    [InlineData("date,exercise,repetitions,session,time,machine,set\n2026-10-05,squat,8,1,17:30,B2,3\n", "2026-10-05|order=1|exercise=squat|machine=B2|set=3")]
    [InlineData("date,exercise,repetitions,session,time,machine,set\n2026-10-05,squat,8,,17:30:05,,\n", "2026-10-05|time=17:30:05|exercise=squat|n=1")]
    [InlineData("date,test,value,unit,hand\n2026-10-05,grip_strength,30,kg,left\n", "2026-10-05|test=grip_strength|hand=left")]
    [InlineData("date,test,value,unit,exercise,machine\n2026-10-05,one_repetition_max,90,kg,squat,B2\n", "2026-10-05|test=one_repetition_max|exercise=squat|machine=B2")]
    [InlineData("date,day\n2026-10-05,rest\n", "2026-10-05")]
    [InlineData("from,plan,start\n2026-10-05,match,15:00\n", "2026-10-05|plan=match|start=15:00:00")]
    [InlineData("date,answer,rule,file,person\n2026-10-05,shelve,load_ratio,,aada\n", "2026-10-05|answer=shelve|rule=load_ratio")]
    [InlineData("date,answer,rule,file\n2026-10-05,belongs_to,,a1b2c3\n", "2026-10-05|answer=belongs_to|file=a1b2c3")]
    public void TheKeyIsTheDateAndThePlaceAndNeverThePerson(string text, string expected) => Assert.Equal([expected], TableFiles.Keys(text));

    [Fact]
    public void ThreeEqualSetsWithoutNumbersAreThreeSets() => Assert.Equal(
        ["2026-10-05|exercise=squat|n=1", "2026-10-05|exercise=squat|n=2", "2026-10-05|exercise=lunge|n=1", "2026-10-05|exercise=squat|n=3"],
        TableFiles.Keys("date,exercise,repetitions,kilograms\n2026-10-05,squat,8,80\n2026-10-05,squat,8,80\n2026-10-05,lunge,8,80\n2026-10-05,squat,8,80\n"));

    [Fact]
    public void RowsAreCountedForEachPersonApart() => Assert.Equal(
        ["2026-10-05|n=1", "2026-10-05|n=1", "2026-10-05|n=2"],
        TableFiles.Keys("person,date,minutes\naada,2026-10-05,60\nlumi,2026-10-05,60\nAada,2026-10-05,60\n"));

    [Theory]
    [InlineData("date,exercise,repetitions,set\n", "2026-10-05,squat,8,1\n")]
    [InlineData("date,minutes,session,distance_m\n", "2026-10-05,60,1,5000\n")]
    [InlineData("date,test,value,unit\n", "2026-10-05,grip_strength,30,kg\n")]
    [InlineData("date,day\n", "2026-10-05,rest\n")]
    [InlineData("from,plan,start\n", "2026-10-05,match,15:00\n")]
    [InlineData("date,answer,person\n", "2026-10-05,seen,aada\n")]
    public void AnExactRepetitionIsPassedOver(string names, string row) => Assert.Single(TableFiles.Rows(names + row + row));

    [Theory]
    [InlineData("date,exercise,repetitions,set\n2026-10-05,squat,8,1\n2026-10-05,squat,9,1\n2026-10-06,squat,9,1\n", "set")]
    [InlineData("date,minutes,session\n2026-10-05,60,1\n2026-10-05,61,1\n2026-10-06,61,1\n", "session")]
    [InlineData("date,minutes,session,distance_m\n2026-10-05,60,1,5000\n2026-10-05,60,1,5001\n2026-10-06,60,1,\n", "session")]
    [InlineData("date,test,value,unit\n2026-10-05,grip_strength,30,kg\n2026-10-05,grip_strength,31,kg\n2026-10-06,grip_strength,31,kg\n", "test")]
    [InlineData("date,day\n2026-10-05,rest\n2026-10-05,ill\n2026-10-06,ill\n", "date")]
    [InlineData("from,plan,start,end\n2026-10-05,match,15:00,17:00\n2026-10-05,match,15:00,18:00\n2026-10-06,match,,\n", "entry of the plan")]
    [InlineData("date,answer,until\n2026-10-05,ill,2026-10-07\n2026-10-05,ill,2026-10-08\n2026-10-06,rest,\n", "question")]
    public void OfTwoRowsThatContradictEachOtherNeitherIsUsed(string text, string one)
    {
        var file = TableFiles.Decode(text);

        Assert.Equal($"line 3: contradicts line 2, which is about the same {one}: neither is used", Assert.Single(file.Problems).ToString());
        Assert.Equal(4, Assert.Single(file.Table!.Rows).Line);
    }

    [Fact]
    public void AThirdRowDoesNotSettleAContradiction()
    {
        var file = TableFiles.Decode("date,day\n2026-10-05,rest\n2026-10-05,ill\n2026-10-05,ill\n2026-10-06,ill\n");

        Assert.Equal(["line 3", "line 4"], file.Problems.Select(problem => problem.ToString().Split(':')[0]));
        Assert.Equal(5, Assert.Single(file.Table!.Rows).Line);
    }

    [Fact]
    public void TheSameAnswerOfTwoPeopleIsOne()
    {
        var row = Assert.Single(TableFiles.Rows("date,person,answer,by,note\n2026-10-05,aada,seen,Kerttu,called\n2026-10-05,aada,seen,Otso,\n"));

        Assert.Equal(("Kerttu", "called"), (((AnswerRow)row.Content).By, ((AnswerRow)row.Content).Note));
    }

    [Fact]
    public void ATableThatGrowsKeepsTheKeysOfItsRows() =>
        Gen.Select(Gen.Int[1, 4], Gen.Int[0, 2]).List[0, 30].SelectMany(rows => Gen.Int[0, rows.Count].Select(cut => (rows, cut))).Sample(sample =>
        {
            var lines = sample.rows.Select(row => $"2026-10-{row.Item1:00},{(row.Item2 == 0 ? "squat" : "lunge")},8\n").ToList();
            const string Names = "date,exercise,repetitions\n";

            var early = TableFiles.Keys(Names + string.Concat(lines.Take(sample.cut)));
            var late = TableFiles.Keys(Names + string.Concat(lines));

            Assert.Equal(early, late.Take(sample.cut));
            Assert.Equal(late.Count, late.Distinct().Count());
        });

    [Fact]
    public void ManyContradictionsRefuseTheFile()
    {
        var pairs = Enumerable.Range(1, 3).Select(day => $"2026-10-0{day},rest\n2026-10-0{day},ill\n");

        var file = TableFiles.Decode("date,day\n2026-09-01,rest\n" + string.Concat(pairs));

        Assert.Equal("6 of 7 rows cannot be used, more than 10 %", TableFiles.Refusal(file));
        Assert.All(file.Problems, problem => Assert.Equal(ProblemSeverity.Error, problem.Severity));
    }
}
