using FtEstimate.Scenarios.Keys;

namespace FtEstimate.Scenarios.Sense;

/// <summary>Conventions of logic that the machine or the workload rules out.</summary>
internal static class LogicRules
{
    private static readonly string Style = MethodKeys.Method.PathOf(MethodKeys.Style);
    private static readonly string Patches = MethodKeys.Method.PathOf(MethodKeys.Patches);
    private static readonly string LogicalQubits = WorkloadKeys.Counts.PathOf(WorkloadKeys.LogicalQubits);

    public static void Check(ScenarioDraft draft, List<SenseFault> faults)
    {
        if (draft.Text(Style) == "transversal" && draft.Text($"{ReachKeys.MovedAtoms.Path}.kind") == "steered-beams")
        {
            faults.Add(new SenseFault(Style, "transversal gates bring patches together; expected a machine with reach.kind = \"moved-atoms\""));
        }

        if (draft.Number(Patches) is double patches && draft.Number(LogicalQubits) is double qubits && patches < qubits)
        {
            faults.Add(new SenseFault(
                Patches, FormattableString.Invariant($"each logical qubit needs a patch; expected at least {qubits}, found {patches}")));
        }
    }
}
