namespace FtEstimate.SurfaceCode;

/// <summary>The smallest patch that is good enough.</summary>
public static class RequiredDistance
{
    /// <summary>Smallest distance tried.</summary>
    public const int Smallest = 3;

    /// <summary>Largest distance tried; beyond it a machine is no plan.</summary>
    public const int Largest = 99;

    /// <summary>
    /// Smallest odd distance from 3 to 99 whose error per patch and round is at most the target; null where there is none.
    /// </summary>
    /// <remarks>A tie counts as met: round targets such as 1e-12 are met exactly, up to the rounding of a power.</remarks>
    public static int? For(IScalingLaw law, NoiseStrength strength, double targetPerRound)
    {
        double target = targetPerRound * (1 + Tolerance.Relative);
        for (int distance = Smallest; distance <= Largest; distance += 2)
        {
            if (PatchError.PerRound(law, strength, distance) <= target)
            {
                return distance;
            }
        }

        return null;
    }
}
