using System.Collections.Immutable;
using FtEstimate.Machines;
using FtEstimate.MagicStates;
using FtEstimate.Scenarios;
using FtEstimate.Sizing;
using FtEstimate.Workloads;

namespace FtEstimate.Tests.Reports;

/// <summary>Scenarios to report on; invented machines, no laboratory's figures.</summary>
internal static class ReportScenarios
{
    public const string HostileName = "</title><script>alert(1)</script> | `a` **b** [c](javascript:alert(2)) <img src=x onerror=alert(3)> &lt;\n# d";

    /// <summary>The spin lattice on a shelving machine: has an answer, in both styles.</summary>
    public static SizingResult Answer { get; } = Find(SpinLattice(deliveredPerSecond: null, czError: 1e-3));

    /// <summary>The same with too few atoms delivered: no machine within the limits, but a closest one.</summary>
    public static SizingResult WithoutAnswer { get; } = Find(SpinLattice(deliveredPerSecond: 5e3, czError: 1e-3));

    /// <summary>Noise above threshold: no machine at all.</summary>
    public static SizingResult AboveThreshold { get; } = Find(SpinLattice(deliveredPerSecond: null, czError: 1e-2));

    /// <summary>A machine without physics.</summary>
    public static SizingResult Abstract { get; } = Find(AbstractMachine());

    /// <summary>A second species with two banks: readout beside the gates.</summary>
    public static SizingResult TwoBanks { get; } = Find(SpinLattice(null, 1e-3, SecondSpecies()));

    public static ImmutableArray<SizingResult> All => [Answer, WithoutAnswer, AboveThreshold, Abstract, TwoBanks];

    public static SizingResult Find(Scenario scenario) => new MachineSizing(new FactoryCatalogue()).Find(scenario);

    public static Scenario SpinLattice(double? deliveredPerSecond, double czError, ReadoutScheme? readout = null, string name = "Test array", string? style = null) => new(
        "Spin lattice on the test array",
        new Machine(
            name,
            Array(czError, readout ?? Shelving()),
            new Control(DecodeSecondsPerRound: 5e-6, FeedForwardSeconds: 50e-6),
            new Supply(deliveredPerSecond, SpareFraction: 0.02),
            new Running(MeanSecondsBetweenStops: 72 * 3600, RestartSeconds: 4 * 3600, StartSeconds: 600, CalibrationFraction: 0.1)),
        new SpinLattice(new SquareLattice(6, 6, Periodic: false), Coupling: 1, Field: 1, EvolutionTime: 4, Error: 0.05, StatedSteps: 20).Workload(),
        new Goal(0.05, Preference.LeastAtomHours, null, null),
        Searched(style),
        Inputs(czError));

    public static Scenario AbstractMachine() => SpinLattice(null, 1e-3) with
    {
        Title = "Abstract machine",
        Machine = new Machine("Uniform 1e-3", new AbstractApparatus(1e-3, 1e-6, 1e-5), new Control(0, 0), new Supply(null, 0), new Running(null, 0, 0, 0)),
        Workload = new Workload("Counts", 100, 1e8, 0, 0, null, null, null, null, 1, []),
        Method = Searched(null) with { Law = "textbook", Patch = "2d^2" },
    };

    public static SecondSpecies SecondSpecies() =>
        new("second-one", Detector(), RecoolSeconds: 200e-6, EnsembleAtoms: 1, BankCount: 2, DataDisturbancePerSecond: 0.05);

    private static Shelved Shelving() => new(
        "shelve-one", Detector(), RecoolSeconds: 300e-6, ShelveSeconds: 20e-6, ShelveInfidelity: 2e-4, SelectSeconds: 5e-6, SelectInfidelity: 4e-4,
        SelectAtOnce: 2000, SelectCrosstalk: 0, ShelvedT1Seconds: 20, ShelvedT2Seconds: 3, ScatterPerSecond: 0.5);

    private static PhotonCounting Detector() => new(5e5, 2e3, 50, 20, 0, null, 2e-4, true);

    private static AtomArray Array(double czError, ReadoutScheme readout) => new(
        new ArrayGeometry(5e-6, null, FieldDiameterMetres: 1.5e-3, TrapPowerWatts: 1.4e-3, TrapsPerStoredAtom: 1.2),
        new Gates(new EntanglingGate(czError, 1e-4, 0.27e-6), new EntanglingGate(1.5 * czError, 1e-4, 0.3e-6), 4000, 2e-4, 5e-6, double.PositiveInfinity, 2e-3, 20e-6),
        new MovedAtoms(MoveProfile.Cubic, 5500, 100e-6, 3e-4, 1e-5, double.PositiveInfinity, true, 2e-6, null),
        new Coherence(double.PositiveInfinity, 4, 0, 600, new DataLossCheck(LossCheckMethod.Swap, 2)),
        readout,
        []);

    private static Method Searched(string? style) =>
        new("published-fit", "2d^2-1", style, null, null, null, null, null, "joint", "repeat-until-success", 0.5, null);

    private static InputSet Inputs(double czError) => new(
    [
        new Input("goal.failure_probability", 0.05),
        new Input("machine.array.pitch_um", 5, Source: "lattice calibration, March"),
        new Input("machine.gates.cz_error", czError, Low: 0.8 * czError, High: 1.3 * czError, Source: "bench log, 60 pairs"),
        new Input("machine.gates.cz_time_us", 0.27),
        new Input("machine.reach.peak_acceleration_m_s2", 5500, Low: 4000, High: 6000),
        new Input("machine.readout.use", Text: "shelve-one"),
        new Input("machine.detection.tells_loss", Flag: true, Source: "bench log"),
        new Input("machine.supply.atoms_per_s", 5000),
    ]);
}
