namespace FtEstimate.SurfaceCode;

/// <summary>Noise strength in each basis; 1 is the threshold.</summary>
/// <param name="X">Strength of what flips the X observable (Z and Y errors on data), 0 or more.</param>
/// <param name="Z">Strength of what flips the Z observable (X and Y errors on data), 0 or more.</param>
public readonly record struct NoiseStrength(double X, double Z)
{
    /// <summary>The mean of the two.</summary>
    public double Mean => 0.5 * (X + Z);

    /// <summary>The noise of a uniform textbook circuit: p over the threshold of the law, the same in both bases.</summary>
    public static NoiseStrength Uniform(IScalingLaw law, double error) => new(error / law.Threshold, error / law.Threshold);

    /// <summary>Both strengths multiplied by a factor.</summary>
    public NoiseStrength Times(double factor) => new(X * factor, Z * factor);

    /// <summary>Λ from this distance to the next odd one.</summary>
    public Suppression Suppression(IScalingLaw law, int distance) =>
        new(distance, PatchError.SuppressionFactor(law, this, distance));
}

/// <summary>Λ, always quoted with its two distances.</summary>
/// <param name="FromDistance">The smaller distance.</param>
/// <param name="Factor">Logical error per round at the smaller over that at the larger distance.</param>
public readonly record struct Suppression(int FromDistance, double Factor)
{
    /// <summary>The larger distance.</summary>
    public int ToDistance => FromDistance + 2;
}
