namespace LoadWatch.Service.Configuration;

/// <summary>What <c>init</c> writes. The full list of keys is in <c>config/loadwatch.json</c>.</summary>
public static class StarterFiles
{
    public const string Configuration = "loadwatch.json";
    public const string Schema = "loadwatch.schema.json";

    /// <summary>By name, to be written where there is no configuration yet.</summary>
    public static IReadOnlyDictionary<string, string> All { get; } = new Dictionary<string, string>(StringComparer.Ordinal)
    {
        [Configuration] = $$"""
            {
              "$schema": "./{{Schema}}",    // lets an editor complete the keys and show what they mean

              // Paths are relative to this file. Comments and trailing commas are fine.
              // Every key with its default: config/loadwatch.json of the program.
              "data": "data",          // archive of originals and database: back this up
              "pages": "pages",        // one page per contact
              "notices": "notices",    // one file of notices per month
              "time_zone": "",         // blank: the zone of this machine; else for example "Europe/Helsinki"

              "inboxes": [
                { "name": "inbox", "path": "inbox", "take": "leave" }   // "move" empties the folder once all is durable
              ],

              "groups": [
                { "id": "squad", "name": "Squad" }
              ],

              "contacts": [
                { "id": "staff", "name": "Staff", "role": "coach", "groups": ["squad"], "brief_at": "06:30" }
              ]
            }

            """,
        ["roster.csv"] = """
            person,name,group,birth_year,sex,time_zone

            """,
        ["anchors.csv"] = """
            person,date,anchor,value,unit,source,exercise,machine

            """,
    };
}
