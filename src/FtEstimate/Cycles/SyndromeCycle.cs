using System.Collections.Immutable;
using FtEstimate.Machines;

namespace FtEstimate.Cycles;

/// <summary>
/// The syndrome round of a machine under one readout scheme and exposure: a list of phases whose durations follow the load.
/// </summary>
/// <param name="Scheme">The readout scheme.</param>
/// <param name="Reading">What one look at a check gives.</param>
/// <param name="Rules">The phases in order.</param>
/// <param name="ReadoutBeside">Whether the readout runs beside the next round's gates (a second bank of checks works meanwhile).</param>
public sealed record SyndromeCycle(
    ReadoutScheme Scheme,
    CheckReading Reading,
    ImmutableArray<PhaseRule> Rules,
    bool ReadoutBeside)
{
    /// <summary>CZ layers per round of the rotated code.</summary>
    public const int Layers = 4;

    /// <summary>The round of an atom array under its scheme at an exposure.</summary>
    /// <param name="array">The machine.</param>
    /// <param name="scheme">The scheme, which need not be the one in use.</param>
    /// <param name="exposureSeconds">Exposure; a detector with stated flips keeps its own.</param>
    public static SyndromeCycle Of(AtomArray array, ReadoutScheme scheme, double exposureSeconds)
    {
        CheckReading reading = CheckReading.Of(scheme.Detector, scheme.AtomsPerCheck, exposureSeconds);
        ImmutableArray<PhaseRule> readout = ReadoutPhases.Of(array, scheme, reading);
        ImmutableArray<PhaseRule> rules =
        [
            .. GatePhases.Of(array, scheme),
            .. readout,
            .. LossCheckPhases.Of(array, scheme, readout),
        ];
        return new SyndromeCycle(scheme, reading, rules, scheme.Banks > 1);
    }

    /// <summary>The durations for a load. No allocation: the sizing asks thousands of times.</summary>
    public CycleTimes Times(in MachineLoad load)
    {
        double inGates = 0;
        double waiting = 0;
        double shelved = 0;
        double beside = 0;
        bool groups = false;
        int atomsPerCheck = Scheme.AtomsPerCheck;
        foreach (PhaseRule rule in Rules)
        {
            double seconds = rule.Seconds(load, atomsPerCheck);
            switch (rule.Data)
            {
                case DataState.InGates:
                    inGates += seconds;
                    groups |= rule.Work == WorkKind.CheckAtoms && rule.Goes(load, atomsPerCheck) > 1;
                    break;
                case DataState.Shelved:
                    shelved += seconds;
                    break;
                case DataState.Beside:
                    beside += seconds;
                    break;
                default:
                    waiting += seconds;
                    break;
            }
        }

        double path = inGates + waiting + shelved;
        double idle = Math.Max(beside - path, 0);
        return new CycleTimes(path + idle, inGates / Layers, waiting + idle, shelved, groups);
    }

    /// <summary>The phases for a load, with their starts.</summary>
    public ImmutableArray<CyclePhase> Phases(in MachineLoad load)
    {
        var phases = ImmutableArray.CreateBuilder<CyclePhase>(Rules.Length);
        double clock = 0;
        double besideClock = 0;
        foreach (PhaseRule rule in Rules)
        {
            double seconds = rule.Seconds(load, Scheme.AtomsPerCheck);
            if (seconds <= 0)
            {
                continue;
            }

            bool beside = rule.Data == DataState.Beside;
            double start = beside ? besideClock : clock;
            phases.Add(new CyclePhase(
                rule.Name, rule.Part, start, seconds, rule.Goes(load, Scheme.AtomsPerCheck), rule.Data));
            besideClock += beside ? seconds : 0;
            clock += beside ? 0 : seconds;
        }

        return phases.ToImmutable();
    }
}
