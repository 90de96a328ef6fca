using System.Text;
using CsCheck;
using LoadWatch.Decoding.Csv;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Tests.Csv.Tables;

/// <summary>Whatever bytes a table holds, it gives rows of different keys or says why it does not.</summary>
public class TableRobustnessTests
{
    private const string Marks = ";,\"\n\r\t|=.:-+ 0189aäx\u00a0\u2028\0";

    private static readonly string[] Tables =
    [
        "Datum;Name;Übung;Satz;Wdh;Gewicht\n05.10.2026;aada;leg_press;1;8;82,5\n05.10.2026;aada;leg_press;;8;\n06.10.2026;lumi;squat;;;80\n",
        "person,date,session,start,minutes,rating,distance_m\naada,2026-10-05,1,17:30,60,6,5000\nlumi,2026-10-05,,,75,,\n",
        "person,date,test,value,unit,hand\naada,2026-10-05,grip_strength,31,kg,left\naada,2026-10-05,gait_speed,1.1,m/s,\n",
        "group,person,from,until,plan,start\nu19,,2026-10-05,2026-10-06,camp,\n,aada,2026-10-05,,match,15:00\n",
        "date,person,group,answer,until,file,note\n2026-10-05,aada,,ill,2026-10-07,,\"a\nb\"\n2026-10-05,,u19,rest,,,\n",
    ];

    private static readonly Gen<byte[]> Damaged = Gen.Select(
        Gen.Int[0, Tables.Length - 1].Select(table => Tables[table]), Gen.Select(Gen.Int[0, 400], Gen.Int[0, Marks.Length - 1], Gen.Int[0, 2]).Array[0, 8], Gen.Int[0, 2], Damage);

    [Fact]
    public void ADamagedTableIsReadOrRefusedWithAReason() => Damaged.Sample(bytes =>
    {
        var file = CsvDecoder.Decode(bytes, [.. BuiltInLayouts.All, TableFiles.German]);

        Assert.True(file.Table is not null || file.Recordings.Count > 0 || file.Problems.Any(problem => problem.Severity == ProblemSeverity.Error));
        Assert.All(file.Problems, problem => Assert.NotEmpty(problem.Reason));
        var keys = file.Table?.Rows.Select(row => (row.Subject?.ToUpperInvariant(), row.Key)).ToList() ?? [];
        Assert.Equal(keys.Count, keys.Distinct().Count());
    });

    /// <summary>Characters put in, put over others, or taken out, in one of three encodings.</summary>
    private static byte[] Damage(string text, (int At, int Mark, int How)[] changes, int encoding)
    {
        var damaged = new StringBuilder(text);
        foreach (var (at, mark, how) in changes)
        {
            if (at >= damaged.Length)
            {
                continue;
            }

            if (how > 0)
            {
                damaged.Remove(at, 1);
            }

            if (how < 2)
            {
                damaged.Insert(at, Marks[mark]);
            }
        }

        Encoding[] encodings = [new UTF8Encoding(false), new UnicodeEncoding(true, true), CodePagesEncodingProvider.Instance.GetEncoding(1252)!];
        return [.. encodings[encoding].GetPreamble(), .. encodings[encoding].GetBytes(damaged.ToString())];
    }
}
