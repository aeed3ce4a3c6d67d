using System.Collections.Immutable;
using FtEstimate.Machines;

namespace FtEstimate.Cycles;

/// <summary>
/// The work of finding lost data atoms, spread over the rounds between two looks. A swap merges with the last CZ layer and adds one more
/// (a CNOT and a swap make two CNOTs); an extra atom that probes each data atom comes and goes, and costs two CZ layers and a readout of its own.
/// </summary>
public static class LossCheckPhases
{
    /// <summary>CZ layers that one check adds.</summary>
    public static int ExtraLayers(LossCheckMethod method) => method switch
    {
        LossCheckMethod.Swap => 1,
        LossCheckMethod.ExtraCheck => 2,
        LossCheckMethod.None => 0,
        _ => throw new ArgumentOutOfRangeException(nameof(method)),
    };

    /// <summary>The check as it can be done: a check of another element cannot trade places with a data atom, so an extra atom probes it.</summary>
    public static LossCheckMethod MethodFor(AtomArray array, ReadoutScheme scheme) =>
        scheme is SecondSpecies && array.Coherence.LossCheck.Method == LossCheckMethod.Swap
            ? LossCheckMethod.ExtraCheck
            : array.Coherence.LossCheck.Method;

    /// <summary>The phases, averaged over the rounds between two looks.</summary>
    public static ImmutableArray<PhaseRule> Of(AtomArray array, ReadoutScheme scheme, ImmutableArray<PhaseRule> readout)
    {
        LossCheckMethod method = MethodFor(array, scheme);
        int layers = ExtraLayers(method);
        if (layers == 0)
        {
            return [];
        }

        double share = 1 / array.Coherence.LossCheck.EveryRounds;
        var rules = ImmutableArray.CreateBuilder<PhaseRule>();
        double between = array.Reach switch
        {
            MovedAtoms moved => moved.BetweenPulsesSeconds,
            SteeredBeams steered => steered.SwitchSeconds,
            _ => 0,
        };
        PhaseRule pulses = GatePhases.Pulses("Loss check: CZ", array.Gates, GatePhases.GateOf(array, scheme).Seconds + between);
        rules.Add(pulses with { Part = CyclePart.LossCheck, PerRound = layers * share, Data = DataState.Waiting });
        PhaseRule oneQubit = GatePhases.OneQubitLayer("Loss check: one-qubit gates", array.Gates);
        rules.Add(oneQubit with { Part = CyclePart.LossCheck, PerRound = 2 * share });
        if (method == LossCheckMethod.ExtraCheck)
        {
            if (array.Reach is MovedAtoms { LayerSecondsAsStated: null } carried)
            {
                PhaseRule way = GatePhases.ProbeMove("Loss check: probe atoms come and go", array.Geometry, carried);
                rules.Add(way with { Part = CyclePart.LossCheck, PerRound = 2 * share, Data = DataState.Waiting });
            }

            foreach (PhaseRule phase in readout)
            {
                DataState data = phase.Data == DataState.Beside ? DataState.Waiting : phase.Data;
                rules.Add(phase with
                {
                    Name = $"Loss check: {char.ToLowerInvariant(phase.Name[0])}{phase.Name[1..]}",
                    Part = CyclePart.LossCheck,
                    PerRound = phase.PerRound * share,
                    Data = data,
                });
            }
        }

        return rules.ToImmutable();
    }
}
