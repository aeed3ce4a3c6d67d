using FtEstimate.Machines;

namespace FtEstimate.Tests.Noise;

/// <summary>A way to make one input worse by a factor of at least 1; inputs that a machine does not have stay.</summary>
internal sealed record ArrayChange(string Name, Func<AtomArray, double, AtomArray> Worse)
{
    public override string ToString() => Name;
}

/// <summary>Every input of an atom array that has a worse direction.</summary>
internal static class ArrayChanges
{
    public static IReadOnlyList<ArrayChange> All { get; } =
    [
        Gate("CZ error", (gates, f) => gates with { Cz = gates.Cz with { Infidelity = gates.Cz.Infidelity * f }, BetweenSpecies = Scaled(gates, infidelity: f) }),
        Gate("CZ loss", (gates, f) => gates with { Cz = gates.Cz with { Loss = gates.Cz.Loss * f }, BetweenSpecies = Scaled(gates, loss: f) }),
        Gate("CZ time", (gates, f) => gates with { Cz = gates.Cz with { Seconds = gates.Cz.Seconds * f }, BetweenSpecies = Scaled(gates, seconds: f) }),
        Gate("CZ pairs at once", (gates, f) => gates with { CzPairsAtOnce = Fewer(gates.CzPairsAtOnce, f) }),
        Gate("one-qubit error", (gates, f) => gates with { OneQubitInfidelity = gates.OneQubitInfidelity * f }),
        Gate("one-qubit time", (gates, f) => gates with { OneQubitSeconds = gates.OneQubitSeconds * f }),
        Gate("one-qubit at once", (gates, f) => gates with { OneQubitAtOnce = Fewer(gates.OneQubitAtOnce, f) }),
        Gate("reset flip", (gates, f) => gates with { ResetFlip = gates.ResetFlip * f }),
        Gate("reset time", (gates, f) => gates with { ResetSeconds = gates.ResetSeconds * f }),
        Carried("acceleration", (moved, f) => moved with { PeakAccelerationMetresPerSecondSquared = moved.PeakAccelerationMetresPerSecondSquared / f }),
        Carried("handoff time", (moved, f) => moved with { HandoffSeconds = moved.HandoffSeconds * f }),
        Carried("handoff error", (moved, f) => moved with { HandoffInfidelity = moved.HandoffInfidelity * f }),
        Carried("loss per move", (moved, f) => moved with { LossPerMove = moved.LossPerMove * f }),
        Carried("moved at once", (moved, f) => moved with { MovedAtOnce = Fewer(moved.MovedAtOnce, f) }),
        Carried("grids move apart", (moved, _) => moved with { CheckGridsMoveTogether = false }),
        Carried("layer time", (moved, f) => moved with { LayerSecondsAsStated = moved.LayerSecondsAsStated * f }),
        new("switch time", (array, f) => array.Reach is SteeredBeams beams ? array with { Reach = beams with { SwitchSeconds = beams.SwitchSeconds * f } } : array),
        new("pitch", (array, f) => array with { Geometry = array.Geometry with { PitchMetres = array.Geometry.PitchMetres * f } }),
        Decay("T1", (decay, f) => decay with { T1Seconds = Math.Max(decay.T1Seconds / f, decay.T2Seconds / 2) }),
        Decay("T2", (decay, f) => decay with { T2Seconds = decay.T2Seconds / f }),
        Decay("echo pulses", (decay, f) => decay with { EchoPulsesPerRound = decay.EchoPulsesPerRound * f }),
        Decay("vacuum lifetime", (decay, f) => decay with { VacuumLifetimeSeconds = decay.VacuumLifetimeSeconds / f }),
        Look("dark flip", (detector, f) => detector is StatedReadout stated ? stated with { DarkFlip = stated.DarkFlip * f } : detector),
        Look("bright flip", (detector, f) => detector is StatedReadout stated ? stated with { BrightFlip = stated.BrightFlip * f } : detector),
        Look("loss per look", (detector, f) => detector is StatedReadout stated ? stated with { LossPerLook = stated.LossPerLook * f } : detector),
        Look("stated exposure", (detector, f) => detector is StatedReadout stated ? stated with { StatedExposureSeconds = stated.StatedExposureSeconds * f } : detector),
        Look("signal", (detector, f) => detector is PhotonCounting counting ? counting with { SignalPerSecond = counting.SignalPerSecond / f } : detector),
        Look("background", (detector, f) => detector is PhotonCounting counting ? counting with { BackgroundPerSecond = counting.BackgroundPerSecond * f } : detector),
        Look("depumping", (detector, f) => detector is PhotonCounting counting ? counting with { DepumpPerSecond = counting.DepumpPerSecond * f } : detector),
        Look("brightening", (detector, f) => detector is PhotonCounting counting ? counting with { BrightenPerSecond = counting.BrightenPerSecond * f } : detector),
        Look("imaging loss", (detector, f) => detector is PhotonCounting counting ? counting with { LossPerSecond = counting.LossPerSecond * f } : detector),
        Look("transfer time", (detector, f) => detector with { TransferSeconds = detector.TransferSeconds * f }),
        Scheme("recool time", (scheme, f) => scheme with { RecoolSeconds = scheme.RecoolSeconds * f }),
        Scheme("light on data", (scheme, f) => scheme switch
        {
            InPlace bare => bare with { DataDisturbancePerSecond = bare.DataDisturbancePerSecond * f },
            SecondSpecies second => second with { DataDisturbancePerSecond = second.DataDisturbancePerSecond * f },
            MovedApart apart => apart with { DataDisturbancePerSecond = apart.DataDisturbancePerSecond * f },
            Shelved shelved => shelved with { ScatterPerSecond = shelved.ScatterPerSecond * f },
            _ => scheme,
        }),
        Shelf("shelving error", (shelved, f) => shelved with { ShelveInfidelity = shelved.ShelveInfidelity * f }),
        Shelf("shelving time", (shelved, f) => shelved with { ShelveSeconds = shelved.ShelveSeconds * f }),
        Shelf("select error", (shelved, f) => shelved with { SelectInfidelity = shelved.SelectInfidelity * f }),
        Shelf("select time", (shelved, f) => shelved with { SelectSeconds = shelved.SelectSeconds * f }),
        Shelf("select at once", (shelved, f) => shelved with { SelectAtOnce = Fewer(shelved.SelectAtOnce, f) }),
        Shelf("select crosstalk", (shelved, f) => shelved with { SelectCrosstalk = shelved.SelectCrosstalk * f }),
        Shelf("shelved T2", (shelved, f) => shelved with { ShelvedT2Seconds = shelved.ShelvedT2Seconds / f }),
        Scheme("exchange time", (scheme, f) => scheme is MovedApart apart ? apart with { ExchangeSeconds = apart.ExchangeSeconds * f } : scheme),
        Scheme("distance to the readout", (scheme, f) => scheme is MovedApart apart ? apart with { DistanceMetres = apart.DistanceMetres * f } : scheme),
    ];

    private static double Fewer(double limit, double factor) =>
        double.IsPositiveInfinity(limit) ? 20_000 : Math.Max(1, Math.Floor(limit / factor));

    private static EntanglingGate? Scaled(Gates gates, double infidelity = 1, double loss = 1, double seconds = 1) =>
        gates.BetweenSpecies is { } gate ? new(gate.Infidelity * infidelity, gate.Loss * loss, gate.Seconds * seconds) : null;

    private static ArrayChange Gate(string name, Func<Gates, double, Gates> worse) =>
        new(name, (array, f) => array with { Gates = worse(array.Gates, f) });

    private static ArrayChange Carried(string name, Func<MovedAtoms, double, MovedAtoms> worse) =>
        new(name, (array, f) => array.Reach is MovedAtoms moved ? array with { Reach = worse(moved, f) } : array);

    private static ArrayChange Decay(string name, Func<Coherence, double, Coherence> worse) =>
        new(name, (array, f) => array with { Coherence = worse(array.Coherence, f) });

    private static ArrayChange Scheme(string name, Func<ReadoutScheme, double, ReadoutScheme> worse) =>
        new(name, (array, f) => array with { Readout = worse(array.Readout, f) });

    private static ArrayChange Look(string name, Func<Detector, double, Detector> worse) =>
        Scheme(name, (scheme, f) => scheme with { Detector = worse(scheme.Detector, f) });

    private static ArrayChange Shelf(string name, Func<Shelved, double, Shelved> worse) =>
        Scheme(name, (scheme, f) => scheme is Shelved shelved ? worse(shelved, f) : scheme);
}
