namespace FtEstimate.SurfaceCode;

/// <summary>The logical error of one patch under noise that may differ between the bases.</summary>
public static class PatchError
{
    /// <summary>Probability of any logical error of one patch in one round: ½[law(x_X) + law(x_Z)], 0 to 0.5.</summary>
    /// <remarks>Half of the law each, since the law at equal strengths counts both observables.</remarks>
    public static double PerRound(IScalingLaw law, NoiseStrength strength, int distance) =>
        0.5 * (law.LogicalErrorPerRound(strength.X, distance) + law.LogicalErrorPerRound(strength.Z, distance));

    /// <summary>
    /// Λ = p(d)/p(d + 2). Where the error at the larger distance is too small for a double, the largest double rather than infinity; 1 where both are 0.
    /// </summary>
    public static double SuppressionFactor(IScalingLaw law, NoiseStrength strength, int distance)
    {
        double smaller = PerRound(law, strength, distance);
        double larger = PerRound(law, strength, distance + 2);
        return smaller == 0 ? 1 : Math.Min(smaller / larger, double.MaxValue);
    }
}
