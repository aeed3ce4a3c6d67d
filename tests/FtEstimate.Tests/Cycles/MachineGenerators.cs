using CsCheck;
using FtEstimate.Cycles;
using FtEstimate.Machines;

namespace FtEstimate.Tests.Cycles;

/// <summary>Random but sane machines: inputs within a factor of a few of <see cref="BenchMachine"/>, all kinds of readout and reach.</summary>
internal static class MachineGenerators
{
    /// <summary>A factor between 1/spread and spread, evenly in the logarithm.</summary>
    public static Gen<double> Factor(double spread) =>
        Gen.Double[-1, 1].Select(power => Math.Pow(spread, power));

    /// <summary>A limit on parallel work: none, or so many.</summary>
    private static readonly Gen<double> Limit =
        Gen.OneOf(Gen.Const(double.PositiveInfinity), Factor(30).Select(factor => Math.Ceiling(3000 * factor)));

    private static readonly Gen<DataLossCheck> LossCheck = Gen.Select(
        Gen.Enum<LossCheckMethod>(),
        Gen.Int[1, 12],
        (method, rounds) => new DataLossCheck(method, rounds));

    private static readonly Gen<Gates> AllGates = Gen.Select(
        Gen.Select(Factor(2), Factor(4), Factor(3), Gen.Bool),
        Gen.Select(Factor(4), Factor(4), Factor(4), Factor(4)),
        Limit,
        Limit,
        (cz, other, pairs, atoms) =>
        {
            Gates bench = BenchMachine.Array.Gates;
            EntanglingGate gate = new(cz.Item1 * bench.Cz.Infidelity, cz.Item2 * bench.Cz.Loss, cz.Item3 * bench.Cz.Seconds);
            return bench with
            {
                Cz = gate,
                BetweenSpecies = cz.Item4 ? gate with { Infidelity = gate.Infidelity * 1.5, Seconds = gate.Seconds * 2 } : null,
                CzPairsAtOnce = pairs,
                OneQubitInfidelity = other.Item1 * bench.OneQubitInfidelity,
                OneQubitSeconds = other.Item2 * bench.OneQubitSeconds,
                OneQubitAtOnce = atoms,
                ResetFlip = other.Item3 * bench.ResetFlip,
                ResetSeconds = other.Item4 * bench.ResetSeconds,
            };
        });

    private static readonly Gen<Reach> Moved = Gen.Select(
        Gen.Enum<MoveProfile>(),
        Gen.Select(Factor(3), Factor(3), Factor(4), Factor(4)),
        Limit,
        Gen.Bool,
        Gen.Frequency((4, Gen.Const<double?>((double?)null)), (1, Factor(3).Select<double, double?>(factor => factor * 200e-6))),
        Reach (profile, factors, limit, together, stated) => BenchMachine.Carried with
        {
            Profile = profile,
            PeakAccelerationMetresPerSecondSquared = factors.Item1 * BenchMachine.Carried.PeakAccelerationMetresPerSecondSquared,
            HandoffSeconds = factors.Item2 * BenchMachine.Carried.HandoffSeconds,
            HandoffInfidelity = factors.Item3 * BenchMachine.Carried.HandoffInfidelity,
            LossPerMove = factors.Item4 * BenchMachine.Carried.LossPerMove,
            MovedAtOnce = limit,
            CheckGridsMoveTogether = together,
            LayerSecondsAsStated = stated,
        });

    private static readonly Gen<Reach> Steered = Factor(10).Select(
        Reach (factor) => BenchMachine.Steered with { SwitchSeconds = factor * BenchMachine.Steered.SwitchSeconds });

    private static readonly Gen<Detector> Seen = Gen.OneOf(
        Gen.Select(Factor(3), Factor(3), Factor(3), Factor(3), Gen.Bool, Detector (dark, bright, loss, exposure, tells) => new StatedReadout(
            dark * 2e-3, bright * 2e-3, loss * 1e-3, exposure * 200e-6, 50e-6, tells)),
        Gen.Select(Factor(2), Factor(3), Factor(3), Factor(2), Gen.Bool, Detector (signal, background, jump, exposure, tells) => new PhotonCounting(
            signal * 2e5, background * 5e3, jump * 20, jump * 5, jump, exposure * 200e-6, 50e-6, tells)));

    private static readonly Gen<ReadoutScheme> Readout = Gen.Select(
        Seen,
        Gen.Int[0, 3],
        Gen.Select(Factor(3), Factor(4), Factor(4), Factor(4)),
        Limit,
        Gen.Select(Gen.Int[1, 2], Gen.Int[1, 3], Gen.Bool, Gen.Bool),
        (detector, kind, factors, limit, counts) => SchemeOf(detector, kind, factors, limit, counts));

    /// <summary>An atom array of any kind; T2 is at most twice T1.</summary>
    public static Gen<AtomArray> Arrays { get; } = Gen.Select(
        AllGates,
        Gen.Frequency((2, Moved), (1, Steered)),
        Readout,
        Gen.Select(Factor(3), Factor(3), Factor(3), Gen.Int[0, 2]),
        LossCheck,
        (gates, reach, readout, coherence, check) => BenchMachine.Array with
        {
            Geometry = BenchMachine.Array.Geometry with { PitchMetres = 5e-6 * coherence.Item3 },
            Gates = gates,
            Reach = reach,
            Readout = readout,
            Coherence = new Coherence(20 * coherence.Item1, 2 * coherence.Item2, coherence.Item4, 600 * coherence.Item3, check),
        });

    /// <summary>Sites of tiles and factories, from one small patch to a large machine.</summary>
    public static Gen<MachineLoad> Loads { get; } =
        Gen.Select(Gen.Double[1.5, 6], Gen.Int[1, 14], (logSites, k) => MachineLoad.Of(Math.Pow(10, logSites), (2 * k) + 1));

    private static ReadoutScheme SchemeOf(
        Detector detector,
        int kind,
        (double Recool, double Light, double Pulse, double Memory) factors,
        double limit,
        (int Banks, int Atoms, bool Exchange, bool InRound) counts) => kind switch
        {
            0 => BenchMachine.InPlaceReadout with
            {
                Detector = detector,
                RecoolSeconds = factors.Recool * 300e-6,
                DataDisturbancePerSecond = factors.Light,
            },
            1 => BenchMachine.SecondElement with
            {
                Detector = detector,
                RecoolSeconds = factors.Recool * 300e-6,
                EnsembleAtoms = counts.Atoms,
                BankCount = counts.Banks,
                DataDisturbancePerSecond = factors.Light,
            },
            2 => BenchMachine.Apart with
            {
                Detector = detector,
                RecoolSeconds = factors.Recool * 300e-6,
                DistanceMetres = counts.Exchange ? null : 200e-6,
                ExchangeSeconds = counts.Exchange ? factors.Pulse * 500e-6 : null,
                ReadInRound = counts.InRound || !counts.Exchange,
                BankCount = counts.Banks,
                DataDisturbancePerSecond = factors.Light,
            },
            _ => BenchMachine.Shelf with
            {
                Detector = detector,
                RecoolSeconds = factors.Recool * 300e-6,
                ShelveInfidelity = factors.Pulse * 2e-4,
                SelectInfidelity = factors.Pulse * 2e-4,
                SelectAtOnce = limit,
                ShelvedT1Seconds = 20 * factors.Memory,
                ShelvedT2Seconds = 2 * factors.Memory,
                ScatterPerSecond = 0.2 * factors.Light,
            },
        };
}
