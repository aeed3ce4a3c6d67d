using System.Collections.Immutable;
using FtEstimate.Machines;
using FtEstimate.Scenarios.Keys;

namespace FtEstimate.Scenarios;

/// <summary>Turns the inputs of a machine into its records.</summary>
internal static class MachineBinder
{
    /// <summary>The machine that checked inputs describe.</summary>
    public static Machine Bind(InputSet inputs)
    {
        TableInputs stated = new(inputs, MachineKeys.Abstract.Path);
        bool isAbstract = stated.Gives(MachineKeys.UniformError);
        return new Machine(
            new TableInputs(inputs, MachineKeys.Top.Path).Text(MachineKeys.Name),
            isAbstract ? BindAbstract(stated) : BindArray(inputs),
            // the stated reaction time of an abstract machine holds both
            isAbstract ? new Control(0, 0) : BindControl(new TableInputs(inputs, OperationKeys.Control.Path)),
            BindSupply(new TableInputs(inputs, OperationKeys.Supply.Path)),
            BindRunning(new TableInputs(inputs, OperationKeys.Running.Path)));
    }

    private static AbstractApparatus BindAbstract(TableInputs stated) => new(
        stated.Number(MachineKeys.UniformError),
        stated.Number(MachineKeys.RoundTime),
        stated.Number(MachineKeys.ReactionTime));

    private static AtomArray BindArray(InputSet inputs)
    {
        ImmutableArray<ReadoutScheme> schemes = ReadoutBinder.Bind(inputs);
        return new AtomArray(
            BindGeometry(new TableInputs(inputs, MachineKeys.Array.Path)),
            BindGates(new TableInputs(inputs, GateKeys.Gates.Path)),
            BindReach(new TableInputs(inputs, ReachKeys.MovedAtoms.Path), new TableInputs(inputs, ReachKeys.Cycle.Path)),
            BindCoherence(new TableInputs(inputs, CoherenceKeys.Coherence.Path), new TableInputs(inputs, OperationKeys.Running.Path)),
            schemes[0],
            schemes[1..]);
    }

    private static ArrayGeometry BindGeometry(TableInputs array) => new(
        array.Number(MachineKeys.Pitch),
        array.NumberOrNull(MachineKeys.BlockSpacing),
        array.NumberOrNull(MachineKeys.FieldDiameter),
        array.NumberOrNull(MachineKeys.TrapPower),
        array.Number(MachineKeys.TrapsPerStoredAtom));

    private static Gates BindGates(TableInputs gates)
    {
        double loss = gates.Number(GateKeys.CzLoss);
        double infidelity = gates.NumberOrNull(GateKeys.CzError) ?? Math.Max(0, gates.Number(GateKeys.CzRawError) - loss);
        return new Gates(
            new EntanglingGate(infidelity, loss, gates.Number(GateKeys.CzTime)),
            gates.Gives(GateKeys.BetweenSpeciesError)
                ? new EntanglingGate(
                    gates.Number(GateKeys.BetweenSpeciesError),
                    gates.Number(GateKeys.BetweenSpeciesLoss),
                    gates.Number(GateKeys.BetweenSpeciesTime))
                : null,
            gates.NumberOr(GateKeys.CzPairsAtOnce, double.PositiveInfinity),
            gates.Number(GateKeys.OneQubitError),
            gates.Number(GateKeys.OneQubitTime),
            gates.NumberOr(GateKeys.OneQubitAtOnce, double.PositiveInfinity),
            gates.Number(GateKeys.ResetError),
            gates.Number(GateKeys.ResetTime));
    }

    private static Reach BindReach(TableInputs reach, TableInputs cycle)
    {
        double? layerSeconds = cycle.NumberOrNull(ReachKeys.LayerTime);
        return reach.Text(ReachKeys.Kind) == ReachKeys.SteeredBeams.SelectedWhen
            ? new SteeredBeams(reach.Number(ReachKeys.BeamSwitch), layerSeconds)
            : new MovedAtoms(
                ProfileOf(reach.Text(ReachKeys.Profile)),
                reach.Number(ReachKeys.PeakAcceleration),
                reach.Number(ReachKeys.HandoffTime),
                reach.Number(ReachKeys.HandoffError),
                reach.Number(ReachKeys.MoveLoss),
                reach.NumberOr(ReachKeys.MovedAtOnce, double.PositiveInfinity),
                reach.FlagOr(ReachKeys.CheckGridsMoveTogether, false),
                reach.NumberOrNull(ReachKeys.PulseGap) ?? reach.NumberOr(ReachKeys.ZoneRefill, 0),
                layerSeconds);
    }

    private static MoveProfile ProfileOf(string name) => name switch
    {
        "cubic" => MoveProfile.Cubic,
        "adiabatic-sine" => MoveProfile.AdiabaticSine,
        "bang-bang" => MoveProfile.BangBang,
        _ => throw new InvalidOperationException($"unchecked profile {name}"),
    };

    private static Coherence BindCoherence(TableInputs coherence, TableInputs running) => new(
        coherence.NumberOr(CoherenceKeys.T1, double.PositiveInfinity),
        coherence.Number(CoherenceKeys.T2),
        coherence.Number(CoherenceKeys.EchoPulses),
        coherence.NumberOr(CoherenceKeys.VacuumLifetime, double.PositiveInfinity),
        new DataLossCheck(
            running.TextOrNull(OperationKeys.DataLossCheck) switch
            {
                "swap" => LossCheckMethod.Swap,
                "extra-check" => LossCheckMethod.ExtraCheck,
                _ => LossCheckMethod.None,
            },
            running.NumberOr(OperationKeys.DataLossCheckEvery, 1)));

    private static Control BindControl(TableInputs control) => new(
        control.Number(OperationKeys.DecodePerRound),
        control.Number(OperationKeys.FeedForward));

    private static Supply BindSupply(TableInputs supply) => new(
        supply.NumberOrNull(OperationKeys.AtomsPerSecond),
        supply.Number(OperationKeys.SpareFraction));

    private static Running BindRunning(TableInputs running) => new(
        running.NumberOrNull(OperationKeys.MeanHoursBetweenStops),
        running.NumberOr(OperationKeys.HoursToRestart, 0),
        running.Number(OperationKeys.Start),
        running.Number(OperationKeys.CalibrationFraction));
}
