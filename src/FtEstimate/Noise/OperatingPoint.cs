using FtEstimate.Cycles;
using FtEstimate.Machines;

namespace FtEstimate.Noise;

/// <summary>Times and noise of a machine of one size.</summary>
/// <param name="Times">Durations of a round.</param>
/// <param name="Strength">Noise strength per basis.</param>
/// <param name="Loss">Where atoms are lost.</param>
public readonly record struct OperatingState(CycleTimes Times, NoiseStrength Strength, AtomLoss Loss);

/// <summary>A way to run a machine (readout scheme and exposure chosen): times and noise for every size.</summary>
public abstract class OperatingPoint
{
    internal OperatingPoint()
    {
    }

    /// <summary>Check atoms held for each check site: sets of checks times atoms per check.</summary>
    public abstract int CheckAtomsPerSite { get; }

    /// <summary>Check atoms in use in one round for each check site.</summary>
    public abstract int CheckAtomsInUse { get; }

    /// <summary>Durations of a round for a load; extra waiting of the data atoms per round lengthens it.</summary>
    public abstract CycleTimes Times(in MachineLoad load, double extraWaitingSeconds = 0);

    /// <summary>Noise for given durations.</summary>
    public abstract OperatingState StateOf(in CycleTimes times);

    /// <summary>Times and noise for a load.</summary>
    public OperatingState At(in MachineLoad load, double extraWaitingSeconds = 0) => StateOf(Times(load, extraWaitingSeconds));

    /// <summary>Pauli probability of an injected T state.</summary>
    public abstract double InjectedError(in OperatingState state);

    /// <summary>From a logical measurement at a distance to the operation that depends on it.</summary>
    public abstract double ReactionSeconds(int distance);

    /// <summary>Time a patch takes to travel to its partner for a transversal gate.</summary>
    public abstract double PatchMoveSeconds(int distance);
}

/// <summary>An atom array under one scheme and exposure.</summary>
/// <param name="noise">Its noise.</param>
/// <param name="control">Decoding and feed-forward.</param>
public sealed class AtomOperatingPoint(AtomNoise noise, Control control) : OperatingPoint
{
    /// <summary>The noise behind it.</summary>
    public AtomNoise Noise { get; } = noise;

    /// <inheritdoc/>
    public override int CheckAtomsPerSite => CheckAtomsInUse * Noise.Cycle.Scheme.CheckSets;

    /// <inheritdoc/>
    public override int CheckAtomsInUse => Noise.Cycle.Scheme.AtomsPerCheck;

    /// <inheritdoc/>
    public override CycleTimes Times(in MachineLoad load, double extraWaitingSeconds = 0)
    {
        CycleTimes times = Noise.Cycle.Times(load);
        return extraWaitingSeconds <= 0 ? times : times with
        {
            RoundSeconds = times.RoundSeconds + extraWaitingSeconds,
            WaitingSeconds = times.WaitingSeconds + extraWaitingSeconds,
        };
    }

    /// <inheritdoc/>
    public override OperatingState StateOf(in CycleTimes times)
    {
        AtomLoss loss = Noise.Loss(times);
        return new OperatingState(times, Noise.Strength(times, loss), loss);
    }

    /// <inheritdoc/>
    public override double InjectedError(in OperatingState state) => Noise.InjectedError(state.Times);

    /// <inheritdoc/>
    public override double ReactionSeconds(int distance) =>
        BeforeExposureSeconds + Noise.Cycle.Reading.ExposureSeconds + Noise.Cycle.Scheme.Detector.TransferSeconds
        + (distance * control.DecodeSecondsPerRound) + control.FeedForwardSeconds;

    /// <summary>What comes before a single patch can be exposed: the others shelved, or the way to the readout zone.</summary>
    private double BeforeExposureSeconds => Noise.Cycle.Scheme switch
    {
        Shelved shelved => shelved.ShelveSeconds + shelved.SelectSeconds,
        MovedApart { ExchangeSeconds: { } seconds } => seconds,
        MovedApart { DistanceMetres: { } metres } when Noise.Array.Reach is MovedAtoms moved =>
            MoveTime.Seconds(moved.Profile, metres, moved.PeakAccelerationMetresPerSecondSquared) + (2 * moved.HandoffSeconds),
        _ => 0,
    };

    /// <inheritdoc/>
    public override double PatchMoveSeconds(int distance)
    {
        if (Noise.Array.Reach is not MovedAtoms moved)
        {
            return 0;
        }

        double metres = Noise.Array.Geometry.BlockSpacingMetres ?? (distance * Noise.Array.Geometry.PitchMetres);
        return MoveTime.Seconds(moved.Profile, metres, moved.PeakAccelerationMetresPerSecondSquared) + (2 * moved.HandoffSeconds);
    }
}

/// <summary>An abstract machine: the same times and noise at every size.</summary>
/// <param name="apparatus">The stated figures.</param>
/// <param name="threshold">Threshold of the law in use.</param>
public sealed class AbstractOperatingPoint(AbstractApparatus apparatus, double threshold) : OperatingPoint
{
    /// <inheritdoc/>
    public override int CheckAtomsPerSite => 1;

    /// <inheritdoc/>
    public override int CheckAtomsInUse => 1;

    /// <inheritdoc/>
    public override CycleTimes Times(in MachineLoad load, double extraWaitingSeconds = 0) => new(
        apparatus.RoundSeconds + extraWaitingSeconds, apparatus.RoundSeconds / SyndromeCycle.Layers, 0, 0, false);

    /// <inheritdoc/>
    public override OperatingState StateOf(in CycleTimes times) => new(
        times,
        NoiseStrength.Even(apparatus.UniformError / threshold),
        default);

    /// <inheritdoc/>
    public override double InjectedError(in OperatingState state) => apparatus.UniformError;

    /// <inheritdoc/>
    public override double ReactionSeconds(int distance) => apparatus.ReactionSeconds;

    /// <inheritdoc/>
    public override double PatchMoveSeconds(int distance) => 0;
}
