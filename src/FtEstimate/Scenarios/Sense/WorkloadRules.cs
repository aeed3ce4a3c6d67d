using FtEstimate.Scenarios.Keys;

namespace FtEstimate.Scenarios.Sense;

/// <summary>A workload is counted or generated, and has something to do.</summary>
internal static class WorkloadRules
{
    private static readonly string Counts = WorkloadKeys.Counts.Path;
    private static readonly string Generate = WorkloadKeys.SpinLattice.Path;
    private static readonly string Steps = WorkloadKeys.SpinLattice.PathOf(WorkloadKeys.Steps);
    private static readonly string TrotterError = WorkloadKeys.SpinLattice.PathOf(WorkloadKeys.TrotterError);

    private static readonly KeyDefinition[] Work =
    [
        WorkloadKeys.TStates, WorkloadKeys.Toffolis, WorkloadKeys.Rotations, WorkloadKeys.LogicalLayers,
    ];

    public static void Check(ScenarioDraft draft, List<SenseFault> faults)
    {
        if (!draft.Tables.Contains(WorkloadKeys.Top.Path) || draft.IsUnreadable(WorkloadKeys.Top.Path))
        {
            return;
        }

        bool isCounted = draft.Tables.Contains(Counts);
        if (isCounted && draft.Tables.Contains(Generate))
        {
            faults.Add(new SenseFault(Generate, "give [counts] or [generate], not both"));
        }
        else if (draft.LacksTable(Counts) && draft.LacksTable(Generate))
        {
            faults.Add(new SenseFault(WorkloadKeys.Top.Path, "missing table; expected [counts] or [generate]"));
        }

        if (isCounted && !HasWork(draft))
        {
            faults.Add(new SenseFault(Counts, "nothing to run: t_states, toffolis, rotations and logical_layers are all 0"));
        }

        if (draft.Text(WorkloadKeys.SpinLattice.PathOf(WorkloadKeys.Family)) != WorkloadKeys.SpinLattice.SelectedWhen)
        {
            return;
        }

        if (draft.Gives(Steps) && draft.Gives(TrotterError))
        {
            faults.Add(new SenseFault(Steps, "give trotter_error or steps, not both"));
        }
        else if (draft.Lacks(Steps) && draft.Lacks(TrotterError))
        {
            faults.Add(new SenseFault(TrotterError, "missing key; expected trotter_error, or steps"));
        }
    }

    private static bool HasWork(ScenarioDraft draft)
    {
        foreach (KeyDefinition key in Work)
        {
            string path = WorkloadKeys.Counts.PathOf(key);
            if (draft.Number(path) > 0 || draft.IsUnreadable(path))
            {
                return true;
            }
        }

        return false;
    }
}
