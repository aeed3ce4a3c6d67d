using System.Collections.Immutable;
using FtEstimate.Scenarios.Keys;

namespace FtEstimate.Scenarios.Sense;

/// <summary>Gates, coherence and reach of an atom array.</summary>
internal static class ArrayRules
{
    private static readonly string CzError = GateKeys.Gates.PathOf(GateKeys.CzError);
    private static readonly string CzRawError = GateKeys.Gates.PathOf(GateKeys.CzRawError);
    private static readonly string CzLoss = GateKeys.Gates.PathOf(GateKeys.CzLoss);
    private static readonly string T1 = CoherenceKeys.Coherence.PathOf(CoherenceKeys.T1);
    private static readonly string T2 = CoherenceKeys.Coherence.PathOf(CoherenceKeys.T2);
    private static readonly string PulseGap = ReachKeys.MovedAtoms.PathOf(ReachKeys.PulseGap);
    private static readonly string ZoneRefill = ReachKeys.MovedAtoms.PathOf(ReachKeys.ZoneRefill);

    private static readonly ImmutableArray<KeyDefinition> BetweenSpecies =
    [
        GateKeys.BetweenSpeciesError, GateKeys.BetweenSpeciesLoss, GateKeys.BetweenSpeciesTime,
    ];

    public static void Check(ScenarioDraft draft, List<SenseFault> faults)
    {
        CzGate(draft, faults);
        GateBetweenSpecies(draft, faults);
        Decay(draft, T1, T2, faults);
        Pauses(draft, faults);
    }

    /// <summary>T2 is at most twice T1 (exact: pure dephasing only adds to what relaxation costs).</summary>
    public static void Decay(ScenarioDraft draft, string t1Path, string t2Path, List<SenseFault> faults)
    {
        if (draft.Number(t1Path) is double t1 && draft.Number(t2Path) is double t2 && t2 > 2 * t1)
        {
            faults.Add(new SenseFault(t2Path, $"T2 cannot exceed twice T1; expected at most {Plain.Number(2 * t1)} s, found {Plain.Number(t2)} s"));
        }
    }

    private static void CzGate(ScenarioDraft draft, List<SenseFault> faults)
    {
        if (!draft.Tables.Contains(GateKeys.Gates.Path))
        {
            return;
        }

        if (draft.Gives(CzError) && draft.Gives(CzRawError))
        {
            faults.Add(new SenseFault(CzRawError, "give cz_error or cz_raw_error, not both"));
        }
        else if (draft.Lacks(CzError) && draft.Lacks(CzRawError))
        {
            faults.Add(new SenseFault(CzError, "missing key; expected cz_error, or cz_raw_error with the loss in it"));
        }

        if (draft.Number(CzRawError) is double raw && draft.Number(CzLoss) is double loss && loss > raw)
        {
            faults.Add(new SenseFault(
                CzRawError, $"the raw error holds the loss, so it cannot be below cz_loss = {Plain.Number(loss)}; found {Plain.Number(raw)}"));
        }
    }

    private static void GateBetweenSpecies(ScenarioDraft draft, List<SenseFault> faults)
    {
        bool isUsed = draft.HasSchemeOfKind("second_species");
        bool isBegun = draft.FirstGiven(GateKeys.Gates.Path, BetweenSpecies) is not null;
        if (!draft.Tables.Contains(GateKeys.Gates.Path) || !(isUsed || isBegun))
        {
            return;
        }

        string why = isUsed ? "a second species needs the gate between the species" : "the gate between the species is given in part only";
        foreach (KeyDefinition key in BetweenSpecies)
        {
            string path = GateKeys.Gates.PathOf(key);
            if (draft.Lacks(path))
            {
                faults.Add(new SenseFault(path, $"missing key; {why}"));
            }
        }
    }

    private static void Pauses(ScenarioDraft draft, List<SenseFault> faults)
    {
        if (draft.Gives(PulseGap) && draft.Gives(ZoneRefill))
        {
            faults.Add(new SenseFault(ZoneRefill, "give pulse_gap_us or zone_refill_us, not both"));
        }
    }
}
