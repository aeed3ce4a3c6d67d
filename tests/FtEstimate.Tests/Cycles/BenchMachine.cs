using FtEstimate.Cycles;
using FtEstimate.Machines;
using FtEstimate.Noise;

namespace FtEstimate.Tests.Cycles;

/// <summary>Machines for tests: a sound one, and the one of Bluvstein 2025 (arXiv:2506.20661).</summary>
internal static class BenchMachine
{
    public static StatedReadout Stated { get; } = new(
        DarkFlip: 2e-3, BrightFlip: 2e-3, LossPerLook: 1e-3, StatedExposureSeconds: 200e-6, TransferSeconds: 50e-6, TellsLoss: true);

    public static MovedAtoms Carried { get; } = new(
        MoveProfile.Cubic,
        PeakAccelerationMetresPerSecondSquared: 8000,
        HandoffSeconds: 50e-6,
        HandoffInfidelity: 1e-4,
        LossPerMove: 1e-5,
        MovedAtOnce: double.PositiveInfinity,
        CheckGridsMoveTogether: true,
        BetweenPulsesSeconds: 1e-6,
        LayerSecondsAsStated: null);

    public static SteeredBeams Steered { get; } = new(SwitchSeconds: 1e-6, LayerSecondsAsStated: null);

    public static InPlace InPlaceReadout { get; } = new("in place", Stated, RecoolSeconds: 300e-6, DataDisturbancePerSecond: 1);

    public static SecondSpecies SecondElement { get; } = new(
        "second element", Stated, RecoolSeconds: 300e-6, EnsembleAtoms: 1, BankCount: 1, DataDisturbancePerSecond: 0.5);

    public static MovedApart Apart { get; } = new(
        "moved apart",
        Stated,
        RecoolSeconds: 300e-6,
        DistanceMetres: 200e-6,
        ExchangeSeconds: null,
        ReadInRound: true,
        BankCount: 1,
        DataDisturbancePerSecond: 0.5);

    public static Shelved Shelf { get; } = new(
        "shelved",
        Stated,
        RecoolSeconds: 300e-6,
        ShelveSeconds: 20e-6,
        ShelveInfidelity: 2e-4,
        SelectSeconds: 10e-6,
        SelectInfidelity: 2e-4,
        SelectAtOnce: double.PositiveInfinity,
        SelectCrosstalk: 1e-5,
        ShelvedT1Seconds: 20,
        ShelvedT2Seconds: 2,
        ScatterPerSecond: 0.2);

    /// <summary>CZ infidelity 5e-4, a tenth of it again as loss, two seconds of coherence.</summary>
    public static AtomArray Array { get; } = new(
        new ArrayGeometry(5e-6, null, null, null, 1),
        new Gates(
            new EntanglingGate(Infidelity: 5e-4, Loss: 1e-4, Seconds: 0.3e-6),
            BetweenSpecies: null,
            CzPairsAtOnce: double.PositiveInfinity,
            OneQubitInfidelity: 5e-5,
            OneQubitSeconds: 2e-6,
            OneQubitAtOnce: double.PositiveInfinity,
            ResetFlip: 1e-3,
            ResetSeconds: 20e-6),
        Carried,
        new Coherence(20, 2, 0, 600, new DataLossCheck(LossCheckMethod.Swap, 4)),
        Apart,
        []);

    public static Machine Machine { get; } = new(
        "bench", Array, new Control(1e-6, 50e-6), new Supply(null, 0), new Running(null, 0, 0, 0));

    /// <summary>
    /// The surface-code memory of Bluvstein 2025 (arXiv:2506.20661) as read there: 0.47 ms between gates with one move and one echo pulse each, 2.57 ms to exchange the checks, CZ error
    /// 0.5 % of which half is loss, state readout wrong in 0.46 % with 0.24 % loss, preparation 0.3 %, coherence of 1 to 2 s, checks imaged at the end.
    /// One-qubit error 3e-4: Evered 2023 (arXiv:2304.05420).
    /// </summary>
    public static AtomArray Bluvstein2025(double t2Seconds) => new(
        new ArrayGeometry(10e-6, null, null, null, 1),
        new Gates(
            new EntanglingGate(Infidelity: 2.5e-3, Loss: 2.5e-3, Seconds: 0.27e-6),
            BetweenSpecies: null,
            CzPairsAtOnce: double.PositiveInfinity,
            OneQubitInfidelity: 3e-4,
            OneQubitSeconds: 0,
            OneQubitAtOnce: double.PositiveInfinity,
            ResetFlip: 3e-3,
            ResetSeconds: 0),
        new MovedAtoms(MoveProfile.Cubic, 8250, 0, 0, 0, double.PositiveInfinity, true, 0, LayerSecondsAsStated: 0.47e-3),
        new Coherence(double.PositiveInfinity, t2Seconds, EchoPulsesPerRound: 4, double.PositiveInfinity, new DataLossCheck(LossCheckMethod.None, 4)),
        new MovedApart(
            "exchanged",
            new StatedReadout(4.6e-3, 4.6e-3, 2.4e-3, 0.5e-3, 0, TellsLoss: true),
            RecoolSeconds: 0,
            DistanceMetres: null,
            ExchangeSeconds: 2.57e-3,
            ReadInRound: false,
            BankCount: 1,
            DataDisturbancePerSecond: 0),
        []);

    public static SyndromeCycle Cycle(AtomArray array) =>
        SyndromeCycle.Of(array, array.Readout, array.Readout.Detector.ExposureSeconds!.Value);

    public static AtomNoise Noise(AtomArray array, double threshold) =>
        new(array, Cycle(array), ChannelWeights.For(threshold));
}
