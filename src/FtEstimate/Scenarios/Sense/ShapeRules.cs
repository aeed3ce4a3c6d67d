using FtEstimate.Scenarios.Keys;

namespace FtEstimate.Scenarios.Sense;

/// <summary>Which tables a scenario needs, and which exclude each other.</summary>
internal static class ShapeRules
{
    private static readonly TableDefinition[] NeededOnABench =
    [
        MachineKeys.Array, GateKeys.Gates, ReachKeys.MovedAtoms, CoherenceKeys.Coherence, ReadoutKeys.Readout, OperationKeys.Control,
    ];

    private static readonly TableDefinition[] ExcludedByAbstract =
    [
        .. NeededOnABench, ReachKeys.Cycle, DetectionKeys.Detection, OperationKeys.Supply,
    ];

    public static void Check(ScenarioDraft draft, List<SenseFault> faults)
    {
        if (draft.LacksTable(GoalKeys.Goal.Path))
        {
            faults.Add(Missing(GoalKeys.Goal));
        }

        if (!draft.Tables.Contains(MachineKeys.Top.Path) || draft.IsUnreadable(MachineKeys.Top.Path))
        {
            return;
        }

        bool isAbstract = !draft.LacksTable(MachineKeys.Abstract.Path);
        foreach (TableDefinition table in isAbstract ? ExcludedByAbstract : NeededOnABench)
        {
            if (isAbstract && draft.Tables.Contains(table.Path))
            {
                faults.Add(new SenseFault(table.Path, "an abstract machine has no bench tables; leave out this table or [abstract]"));
            }
            else if (!isAbstract && draft.LacksTable(table.Path))
            {
                faults.Add(Missing(table));
            }
        }
    }

    private static SenseFault Missing(TableDefinition table) => new(table.Path, $"missing table: {table.Meaning}");
}
