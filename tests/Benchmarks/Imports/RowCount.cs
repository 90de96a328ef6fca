using System.Data.Common;
using System.Reflection;
using System.Runtime.InteropServices;
using LoadWatch.Storage;
using Microsoft.Data.Sqlite;

namespace LoadWatch.Benchmarks.Imports;

/// <summary>Counts the rows that the database hands out to the connections of a store, by its own tracing.</summary>
internal sealed class RowCount : IDisposable
{
    private const uint Rows = 4;

    private readonly Store store;
    private readonly HashSet<nint> watched = [];
    private readonly TraceCallback callback;
    private long count;

    public RowCount(Store store)
    {
        this.store = store;
        callback = (_, _, _, _) =>
        {
            Interlocked.Increment(ref count);
            return 0;
        };
    }

    [UnmanagedFunctionPointer(CallingConvention.Cdecl)]
    private delegate int TraceCallback(uint kind, nint context, nint statement, nint detail);

    /// <summary>Counts from 0 on, connections that were opened since included.</summary>
    public void Restart()
    {
        Watch();
        count = 0;
    }

    public long Read() => Interlocked.Read(ref count);

    public void Dispose() => GC.KeepAlive(callback);

    private void Watch()
    {
        foreach (var connection in Connections().OfType<SqliteConnection>())
        {
            var handle = connection.Handle!.DangerousGetHandle();
            if (watched.Add(handle))
            {
                _ = Trace(handle, Rows, callback, 0);
            }
        }

        if (watched.Count == 0)
        {
            throw new InvalidOperationException("the store's connections are not where they were looked for");
        }
    }

    /// <summary>The store keeps them to itself.</summary>
    private IEnumerable<DbConnection> Connections() => typeof(Store)
        .GetFields(BindingFlags.Instance | BindingFlags.NonPublic)
        .Select(field => field.GetValue(store))
        .SelectMany(value => value switch
        {
            DbConnection one => [one],
            IEnumerable<DbConnection> several => several,
            _ => Enumerable.Empty<DbConnection>(),
        });

    [DllImport("e_sqlite3", EntryPoint = "sqlite3_trace_v2", CallingConvention = CallingConvention.Cdecl)]
    [DefaultDllImportSearchPaths(DllImportSearchPath.SafeDirectories)]
    private static extern int Trace(nint database, uint mask, TraceCallback callback, nint context);
}
