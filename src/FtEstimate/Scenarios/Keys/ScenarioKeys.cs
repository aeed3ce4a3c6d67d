using System.Collections.Immutable;

namespace FtEstimate.Scenarios.Keys;

/// <summary>Every table and key of scenario, machine and workload files.</summary>
public static class ScenarioKeys
{
    /// <summary>All tables in the order of the documentation; paths are seen from the scenario.</summary>
    public static ImmutableArray<TableDefinition> Tables { get; } =
    [
        .. GoalKeys.Tables,
        .. MethodKeys.Tables,
        .. MachineKeys.Tables,
        .. GateKeys.Tables,
        .. ReachKeys.Tables,
        .. CoherenceKeys.Tables,
        .. DetectionKeys.Tables,
        .. ReadoutKeys.Tables,
        .. OperationKeys.Tables,
        .. WorkloadKeys.Tables,
    ];

    /// <summary>The names that may stand at the top of a scenario file: its keys and its tables.</summary>
    public static ImmutableArray<string> TopNames { get; } =
        [GoalKeys.Title.Name, GoalKeys.Goal.Path, MethodKeys.Method.Path, MachineKeys.Top.Path, WorkloadKeys.Top.Path];

    /// <summary>The tables that may stand at a path: several when a key such as "kind" selects one, none when the path is unknown.</summary>
    /// <param name="path">A path such as "machine.readout.shelve-one".</param>
    public static ImmutableArray<TableDefinition> At(string path)
    {
        ImmutableArray<TableDefinition>.Builder found = ImmutableArray.CreateBuilder<TableDefinition>();
        foreach (TableDefinition table in Tables)
        {
            if (IsAt(table, path))
            {
                found.Add(table);
            }
        }

        return found.ToImmutable();
    }

    /// <summary>The definition of the key at a path, or null; of tables that a key such as "kind" selects, the first that has the key.</summary>
    /// <param name="path">A path such as "machine.gates.cz_error".</param>
    public static KeyDefinition? Find(string path)
    {
        int dot = path.LastIndexOf('.');
        string table = dot < 0 ? "" : path[..dot];
        string name = path[(dot + 1)..];
        foreach (TableDefinition definition in Tables)
        {
            if (IsAt(definition, table) && definition.Find(name) is KeyDefinition key)
            {
                return key;
            }
        }

        return null;
    }

    private static bool IsAt(TableDefinition table, string path)
    {
        if (!table.Path.EndsWith(".*", StringComparison.Ordinal))
        {
            return table.Path == path;
        }

        int stem = table.Path.Length - 1;
        return path.Length > stem
            && path.AsSpan(0, stem).SequenceEqual(table.Path.AsSpan(0, stem))
            && path.IndexOf('.', stem) < 0;
    }
}
