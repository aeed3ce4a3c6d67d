namespace FtEstimate.Machines;

/// <summary>How distant atoms are brought to interact.</summary>
/// <param name="LayerSecondsAsStated">Duration of one CZ layer with its moves as stated by the user, instead of the move model; null: computed.</param>
public abstract record Reach(double? LayerSecondsAsStated);

/// <summary>Check atoms are carried from data atom to data atom.</summary>
/// <param name="Profile">How a move accelerates.</param>
/// <param name="PeakAccelerationMetresPerSecondSquared">Largest acceleration during a move.</param>
/// <param name="HandoffSeconds">Duration of one pick-up or drop.</param>
/// <param name="HandoffInfidelity">Infidelity of one pick-up or drop.</param>
/// <param name="LossPerMove">Probability to lose an atom in one move.</param>
/// <param name="MovedAtOnce">Atoms that move together, machine-wide; infinite when not limited.</param>
/// <param name="CheckGridsMoveTogether">Whether both check types can move at once although their legs differ.</param>
/// <param name="BetweenPulsesSeconds">Pulse gap or zone refill between two groups of gates.</param>
/// <param name="LayerSecondsAsStated">See <see cref="Reach"/>.</param>
public sealed record MovedAtoms(
    MoveProfile Profile,
    double PeakAccelerationMetresPerSecondSquared,
    double HandoffSeconds,
    double HandoffInfidelity,
    double LossPerMove,
    double MovedAtOnce,
    bool CheckGridsMoveTogether,
    double BetweenPulsesSeconds,
    double? LayerSecondsAsStated) : Reach(LayerSecondsAsStated);

/// <summary>Atoms stay; beams are steered to the pairs.</summary>
/// <param name="SwitchSeconds">Time to point the beams at the next group of pairs.</param>
/// <param name="LayerSecondsAsStated">See <see cref="Reach"/>.</param>
public sealed record SteeredBeams(double SwitchSeconds, double? LayerSecondsAsStated) : Reach(LayerSecondsAsStated);

/// <summary>How a move accelerates: it fixes the time for a distance at a given peak acceleration.</summary>
public enum MoveProfile
{
    /// <summary>Constant jerk, x = D(3s² − 2s³).</summary>
    Cubic,

    /// <summary>Adiabatic sine, x = sin(πt)/π + t on [−1, 1].</summary>
    AdiabaticSine,

    /// <summary>Full acceleration to the middle, full braking after.</summary>
    BangBang,
}
