using FtEstimate.Scenarios.Keys;

namespace FtEstimate.Scenarios.Sense;

/// <summary>Stops, and the search for lost atoms.</summary>
internal static class RunningRules
{
    private static readonly string MeanHours = OperationKeys.Running.PathOf(OperationKeys.MeanHoursBetweenStops);
    private static readonly string Restart = OperationKeys.Running.PathOf(OperationKeys.HoursToRestart);
    private static readonly string VacuumLifetime = CoherenceKeys.Coherence.PathOf(CoherenceKeys.VacuumLifetime);

    private static readonly HashSet<string> Losses = new(StringComparer.Ordinal)
    {
        GateKeys.CzLoss.Name, GateKeys.BetweenSpeciesLoss.Name, ReachKeys.MoveLoss.Name, DetectionKeys.Loss.Name, DetectionKeys.LossPerLook.Name,
    };

    public static void Check(ScenarioDraft draft, List<SenseFault> faults)
    {
        if (draft.Gives(MeanHours) && draft.Lacks(Restart))
        {
            faults.Add(new SenseFault(Restart, "missing key; needed with mean_hours_between_stops"));
        }

        if (LosesAtoms(draft) is not string loss)
        {
            return;
        }

        foreach (KeyDefinition key in (KeyDefinition[])[OperationKeys.DataLossCheck, OperationKeys.DataLossCheckEvery])
        {
            string path = OperationKeys.Running.PathOf(key);
            if (draft.Lacks(path))
            {
                faults.Add(new SenseFault(path, $"missing key; {loss} loses atoms, so say how lost data atoms are found, and how often"));
            }
        }
    }

    private static string? LosesAtoms(ScenarioDraft draft)
    {
        foreach (Input input in draft.Inputs.InOrder)
        {
            string name = input.Path[(input.Path.LastIndexOf('.') + 1)..];
            if ((input.Number > 0 && Losses.Contains(name)) || input.Path == VacuumLifetime)
            {
                return input.Path;
            }
        }

        return null;
    }
}
