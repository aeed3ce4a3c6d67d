using System.Collections.Immutable;
using FtEstimate.Machines;

namespace FtEstimate.Cycles;

/// <summary>
/// The syndrome round of a machine under one readout scheme and exposure: a list of phases whose durations follow the load.
/// </summary>
public sealed class SyndromeCycle
{
    private readonly FixedTimes _fixed;
    private readonly PhaseRule[] _growing;

    /// <summary>A round made of phases.</summary>
    /// <param name="scheme">The readout scheme.</param>
    /// <param name="reading">What one look at a check gives.</param>
    /// <param name="rules">The phases in order.</param>
    public SyndromeCycle(ReadoutScheme scheme, CheckReading reading, ImmutableArray<PhaseRule> rules)
    {
        Scheme = scheme;
        Reading = reading;
        Rules = rules;
        _fixed = FixedTimes.Of(rules);
        _growing = [.. Merged(rules)];
    }

    /// <summary>The readout scheme.</summary>
    public ReadoutScheme Scheme { get; }

    /// <summary>What one look at a check gives.</summary>
    public CheckReading Reading { get; }

    /// <summary>The phases in order.</summary>
    public ImmutableArray<PhaseRule> Rules { get; }

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
        return new SyndromeCycle(scheme, reading, rules);
    }

    /// <summary>The durations for a load. No allocation: the sizing asks thousands of times.</summary>
    public CycleTimes Times(in MachineLoad load)
    {
        FixedTimes sum = _fixed;
        bool groups = false;
        int atomsPerCheck = Scheme.AtomsPerCheck;
        foreach (PhaseRule rule in _growing)
        {
            double goes = rule.Goes(load, atomsPerCheck);
            sum.Add(rule.Data, rule.SecondsFor(goes));
            groups |= goes > 1 && rule is { Work: WorkKind.CheckAtoms or WorkKind.HalfOfCheckAtoms, Data: DataState.InGates };
        }

        double path = sum.InGates + sum.Waiting + sum.Shelved;
        double idle = Math.Max(sum.Beside - path, 0);
        return new CycleTimes(path + idle, sum.InGates / Layers, sum.Waiting + idle, sum.Shelved, groups);
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

    /// <summary>Phases of the same work, limit and effect on the data as one: four CZ layers cost one look at the load.</summary>
    private static List<PhaseRule> Merged(ImmutableArray<PhaseRule> rules)
    {
        List<PhaseRule> merged = [];
        foreach (PhaseRule rule in rules)
        {
            if (rule.IsFixed)
            {
                continue;
            }

            int same = merged.FindIndex(other => other.Work == rule.Work && other.AtOnce == rule.AtOnce && other.Data == rule.Data);
            PhaseRule sum = same < 0 ? rule with { SecondsWhole = 0, SecondsPerGo = 0, PerRound = 1 } : merged[same];
            sum = sum with
            {
                SecondsWhole = sum.SecondsWhole + (rule.PerRound * rule.SecondsWhole),
                SecondsPerGo = sum.SecondsPerGo + (rule.PerRound * rule.SecondsPerGo),
            };
            if (same < 0)
            {
                merged.Add(sum);
            }
            else
            {
                merged[same] = sum;
            }
        }

        return merged;
    }

    /// <summary>Seconds by what the data atoms do.</summary>
    private struct FixedTimes
    {
        public double InGates;
        public double Waiting;
        public double Shelved;
        public double Beside;

        public static FixedTimes Of(ImmutableArray<PhaseRule> rules)
        {
            FixedTimes sum = default;
            foreach (PhaseRule rule in rules)
            {
                if (rule.IsFixed)
                {
                    sum.Add(rule.Data, rule.SecondsFor(1));
                }
            }

            return sum;
        }

        public void Add(DataState data, double seconds)
        {
            switch (data)
            {
                case DataState.InGates:
                    InGates += seconds;
                    break;
                case DataState.Shelved:
                    Shelved += seconds;
                    break;
                case DataState.Beside:
                    Beside += seconds;
                    break;
                default:
                    Waiting += seconds;
                    break;
            }
        }
    }
}
