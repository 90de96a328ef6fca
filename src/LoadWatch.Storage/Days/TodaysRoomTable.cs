using LoadWatch.Limits;
using LoadWatch.Storage.Dialects;
using NodaTime;

namespace LoadWatch.Storage.Days;

/// <summary>Table <c>todays_room</c>: what the limits leave open on the date behind a person's last computed one.</summary>
public sealed class TodaysRoomTable
{
    private const string Delete = "DELETE FROM todays_room WHERE person = @person";
    private const string Insert = "INSERT INTO todays_room (person, date, detail) VALUES (@Person, @Date, @Detail)";
    private const string Select = "SELECT person, date, detail FROM todays_room WHERE person = @person";

    private readonly StoreSession session;

    internal TodaysRoomTable(StoreSession session) => this.session = session;

    /// <summary>Stores a person's in place of what there was; null: there is none.</summary>
    public void Replace(string person, TodaysRoom? room)
    {
        session.Execute(Delete, new { person });
        if (room is not null)
        {
            session.Execute(Insert, new Row { Person = person, Date = room.Date, Detail = JsonText.Write(room) });
        }
    }

    /// <summary>Null before the person's first day.</summary>
    public TodaysRoom? Of(string person) => session.Row<Row>(Select, new { person }) is { } row ? JsonText.Read<TodaysRoom>(row.Detail) : null;

    private sealed class Row
    {
        public string Person { get; init; } = "";

        public LocalDate Date { get; init; }

        public string Detail { get; init; } = "";
    }
}
