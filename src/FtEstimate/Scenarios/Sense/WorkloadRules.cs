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

    public static IEnumerable<SenseFault> Check(ScenarioDraft draft)
    {
        if (!draft.Tables.Contains(WorkloadKeys.Top.Path) || draft.IsUnreadable(WorkloadKeys.Top.Path))
        {
            yield break;
        }

        bool isCounted = draft.Tables.Contains(Counts);
        if (isCounted && draft.Tables.Contains(Generate))
        {
            yield return new SenseFault(Generate, "give [counts] or [generate], not both");
        }
        else if (draft.LacksTable(Counts) && draft.LacksTable(Generate))
        {
            yield return new SenseFault(WorkloadKeys.Top.Path, "missing table; expected [counts] or [generate]");
        }

        if (isCounted && !Work.Any(key => IsSomething(draft, WorkloadKeys.Counts.PathOf(key))))
        {
            yield return new SenseFault(Counts, "nothing to run: t_states, toffolis, rotations and logical_layers are all 0");
        }

        if (draft.Text(WorkloadKeys.SpinLattice.PathOf(WorkloadKeys.Family)) != WorkloadKeys.SpinLattice.SelectedWhen)
        {
            yield break;
        }

        if (draft.Gives(Steps) && draft.Gives(TrotterError))
        {
            yield return new SenseFault(Steps, "give trotter_error or steps, not both");
        }
        else if (draft.Lacks(Steps) && draft.Lacks(TrotterError))
        {
            yield return new SenseFault(TrotterError, "missing key; expected trotter_error, or steps");
        }
    }

    private static bool IsSomething(ScenarioDraft draft, string path) => draft.Number(path) is double number ? number > 0 : draft.IsUnreadable(path);
}
