using FtEstimate.Machines;

namespace FtEstimate.Cycles;

/// <summary>Duration of a move at a given peak acceleration (kinematics, exact).</summary>
public static class MoveTime
{
    /// <summary>
    /// Seconds for a distance: cubic √(6D/a) and bang-bang 2√(D/a) are textbook kinematics; adiabatic sine √(2πD/a) follows from
    /// x = sin(πt)/π + t (profile: Manetsch 2025, arXiv:2403.12021).
    /// </summary>
    /// <param name="profile">How the move accelerates.</param>
    /// <param name="metres">Distance, at least 0.</param>
    /// <param name="peakAcceleration">Largest acceleration in m/s², greater than 0.</param>
    public static double Seconds(MoveProfile profile, double metres, double peakAcceleration) => profile switch
    {
        MoveProfile.Cubic => Math.Sqrt(6 * metres / peakAcceleration),
        MoveProfile.AdiabaticSine => Math.Sqrt(2 * Math.PI * metres / peakAcceleration),
        MoveProfile.BangBang => 2 * Math.Sqrt(metres / peakAcceleration),
        _ => throw new ArgumentOutOfRangeException(nameof(profile)),
    };
}
