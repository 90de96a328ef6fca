using System.Data;
using Dapper;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Storage.Dialects;

/// <summary>
/// How values stand in columns: dates as <c>2026-03-01</c>; instants in UTC with nine decimals always, so that text sorts as time does.
/// </summary>
internal static class ColumnTypes
{
    public static LocalDatePattern Date { get; } = LocalDatePattern.Iso;

    public static InstantPattern Moment { get; } = InstantPattern.CreateWithInvariantCulture("uuuu-MM-dd'T'HH:mm:ss.fffffffff'Z'");

    /// <summary>Tells Dapper, once per process.</summary>
    public static void Register()
    {
        DefaultTypeMap.MatchNamesWithUnderscores = true;
        SqlMapper.AddTypeHandler(new DateHandler());
        SqlMapper.AddTypeHandler(new MomentHandler());
    }

    private sealed class DateHandler : SqlMapper.TypeHandler<LocalDate>
    {
        public override void SetValue(IDbDataParameter parameter, LocalDate value) => SetText(parameter, Date.Format(value));

        public override LocalDate Parse(object value) => Date.Parse((string)value).Value;
    }

    private sealed class MomentHandler : SqlMapper.TypeHandler<Instant>
    {
        public override void SetValue(IDbDataParameter parameter, Instant value) => SetText(parameter, Moment.Format(value));

        public override Instant Parse(object value) => Moment.Parse((string)value).Value;
    }

    private static void SetText(IDbDataParameter parameter, string text)
    {
        parameter.DbType = DbType.String;
        parameter.Value = text;
    }
}
