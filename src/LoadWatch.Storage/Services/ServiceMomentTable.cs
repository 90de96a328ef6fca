using NodaTime;

namespace LoadWatch.Storage.Services;

/// <summary>Table <c>service_moment</c>: when the service last did something, by the clock of that moment.</summary>
public sealed class ServiceMomentTable
{
    private const string Select = "SELECT moment FROM service_moment WHERE name = @name";

    private const string Upsert = """
        INSERT INTO service_moment (name, moment) VALUES (@name, @moment)
        ON CONFLICT (name) DO UPDATE SET moment = excluded.moment
        """;

    private readonly StoreSession session;

    internal ServiceMomentTable(StoreSession session) => this.session = session;

    public Instant? Of(string name) => session.Row<Row>(Select, new { name })?.Moment;

    public void Put(string name, Instant moment) => session.Execute(Upsert, new { name, moment });

    private sealed class Row
    {
        public Instant Moment { get; init; }
    }
}
