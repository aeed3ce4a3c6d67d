using System.Collections.Immutable;
using FtEstimate.Machines;

namespace FtEstimate.Cycles;

/// <summary>
/// Reset, one-qubit layers and the four CZ layers. The CZ-native circuit takes four one-qubit layers: with the hook-safe order every data atom
/// meets check types A, B, B, A, so its frame changes before, after the first, after the third and after the last layer, and it waits through the
/// readout in its plain frame (derived in docs/method.md).
/// </summary>
public static class GatePhases
{
    /// <summary>One-qubit gates on a data atom per round, the mean of the two sublattices (4 and 2).</summary>
    public const double OneQubitGatesPerData = 3;

    /// <summary>One-qubit gates on a check per round.</summary>
    public const double OneQubitGatesPerCheck = 2;

    /// <summary>Legs of a check's walk, in pitches: half a diagonal out, side, diagonal, side, half a diagonal back.</summary>
    private static readonly double[] Legs = [0.5 * Math.Sqrt(2), 1, Math.Sqrt(2), 1, 0.5 * Math.Sqrt(2)];

    /// <summary>Moves of one check per round.</summary>
    public static int MovesPerCheck => Legs.Length;

    /// <summary>The gate between data and check atoms under a scheme.</summary>
    public static EntanglingGate GateOf(AtomArray array, ReadoutScheme scheme) =>
        scheme is SecondSpecies && array.Gates.BetweenSpecies is { } between ? between : array.Gates.Cz;

    /// <summary>The phases in order.</summary>
    public static ImmutableArray<PhaseRule> Of(AtomArray array, ReadoutScheme scheme)
    {
        Gates gates = array.Gates;
        var rules = ImmutableArray.CreateBuilder<PhaseRule>();
        rules.Add(Simple("Reset checks", CyclePart.Preparation, gates.ResetSeconds, DataState.Waiting));
        rules.Add(OneQubitLayer("One-qubit gates before layer 1", gates));
        AddLayers(rules, array, GateOf(array, scheme));
        rules.Add(OneQubitLayer("One-qubit gates after layer 4", gates));
        return rules.ToImmutable();
    }

    private static void AddLayers(ImmutableArray<PhaseRule>.Builder rules, AtomArray array, EntanglingGate gate)
    {
        Gates gates = array.Gates;
        if (array.Reach is MovedAtoms { LayerSecondsAsStated: null } carried)
        {
            rules.Add(Handoff("Pick up checks", carried));
        }

        for (int layer = 0; layer < SyndromeCycle.Layers; layer++)
        {
            string number = (layer + 1).ToString(System.Globalization.CultureInfo.InvariantCulture);
            if (layer is 1 or 3)
            {
                rules.Add(OneQubitLayer($"One-qubit gates before layer {number}", gates) with { Work = WorkKind.DataAtoms });
            }

            switch (array.Reach)
            {
                case { LayerSecondsAsStated: { } stated }:
                    rules.Add(Simple($"CZ layer {number}, as stated", CyclePart.Gates, stated, DataState.InGates));
                    break;
                case MovedAtoms moved:
                    rules.Add(Move($"Move to partner {number}", array.Geometry, moved, layer));
                    rules.Add(Pulses($"CZ layer {number}", gates, gate.Seconds + moved.BetweenPulsesSeconds));
                    break;
                case SteeredBeams steered:
                    rules.Add(Pulses($"CZ layer {number}", gates, gate.Seconds + steered.SwitchSeconds));
                    break;
            }
        }

        if (array.Reach is MovedAtoms { LayerSecondsAsStated: null } back)
        {
            rules.Add(Move("Move back", array.Geometry, back, Legs.Length - 1));
            rules.Add(Handoff("Put down checks", back));
        }
    }

    /// <summary>The pulses of one CZ layer in groups.</summary>
    internal static PhaseRule Pulses(string name, Gates gates, double secondsPerGo) =>
        new(name, CyclePart.Gates, WorkKind.Pairs, gates.CzPairsAtOnce, secondsPerGo, secondsPerGo, 1, DataState.InGates);

    /// <summary>A phase whose duration does not follow the load.</summary>
    internal static PhaseRule Simple(string name, CyclePart part, double seconds, DataState data) =>
        new(name, part, WorkKind.Everything, double.PositiveInfinity, seconds, seconds, 1, data);

    /// <summary>A layer of one-qubit gates.</summary>
    internal static PhaseRule OneQubitLayer(string name, Gates gates) =>
        new(name, CyclePart.Preparation, WorkKind.AllAtoms, gates.OneQubitAtOnce, gates.OneQubitSeconds, gates.OneQubitSeconds, 1, DataState.Waiting);

    /// <summary>
    /// A leg: all checks in one go without a handoff, or group by group with a pick-up and a drop each. With one deflector pair the two check types
    /// take turns in the inner legs, where their ways differ, and the type at rest is put down meanwhile.
    /// </summary>
    private static PhaseRule Move(string name, ArrayGeometry geometry, MovedAtoms moved, int leg)
    {
        double seconds = MoveTime.Seconds(
            moved.Profile, Legs[leg] * geometry.PitchMetres, moved.PeakAccelerationMetresPerSecondSquared);
        double withHandoffs = seconds + (2 * moved.HandoffSeconds);
        bool inner = leg is > 0 and < 4;
        if (inner && !moved.CheckGridsMoveTogether)
        {
            return new(
                name, CyclePart.Gates, WorkKind.HalfOfCheckAtoms, moved.MovedAtOnce, 2 * withHandoffs, 2 * withHandoffs, 1, DataState.InGates);
        }

        double whole = moved.CheckGridsMoveTogether ? seconds : seconds + moved.HandoffSeconds;
        return new(name, CyclePart.Gates, WorkKind.CheckAtoms, moved.MovedAtOnce, whole, withHandoffs, 1, DataState.InGates);
    }

    /// <summary>The way of an extra atom to its data atom, or back, picked up and put down.</summary>
    internal static PhaseRule ProbeMove(string name, ArrayGeometry geometry, MovedAtoms moved)
    {
        double seconds = MoveTime.Seconds(
            moved.Profile, Legs[0] * geometry.PitchMetres, moved.PeakAccelerationMetresPerSecondSquared)
            + (2 * moved.HandoffSeconds);
        return new(name, CyclePart.Gates, WorkKind.CheckAtoms, moved.MovedAtOnce, seconds, seconds, 1, DataState.InGates);
    }

    /// <summary>One pick-up or drop per round; in groups it is charged with every leg instead.</summary>
    private static PhaseRule Handoff(string name, MovedAtoms moved) =>
        new(name, CyclePart.Gates, WorkKind.CheckAtoms, moved.MovedAtOnce, moved.HandoffSeconds, 0, 1, DataState.InGates);
}
