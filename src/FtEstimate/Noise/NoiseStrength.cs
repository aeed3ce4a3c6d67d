namespace FtEstimate.Noise;

/// <summary>
/// Noise as a scaling law sees it, per basis, in units of the threshold: at 1 no code distance helps.
/// </summary>
/// <param name="X">Strength of the errors that flip logical X (Z errors on data).</param>
/// <param name="Z">Strength of the errors that flip logical Z (X errors on data).</param>
public readonly record struct NoiseStrength(double X, double Z)
{
    /// <summary>Mean of the two bases: what shares refer to.</summary>
    public double Mean => (X + Z) / 2;

    /// <summary>The larger of the two bases.</summary>
    public double Worse => Math.Max(X, Z);

    /// <summary>The same strength in both bases.</summary>
    public static NoiseStrength Even(double strength) => new(strength, strength);

    /// <summary>Sum of two contributions.</summary>
    public static NoiseStrength operator +(NoiseStrength a, NoiseStrength b) => new(a.X + b.X, a.Z + b.Z);

    /// <summary>A contribution taken several times.</summary>
    public static NoiseStrength operator *(NoiseStrength a, double factor) => new(a.X * factor, a.Z * factor);

    /// <summary>Sum of two contributions.</summary>
    public static NoiseStrength Add(NoiseStrength left, NoiseStrength right) => left + right;

    /// <summary>A contribution taken several times.</summary>
    public static NoiseStrength Multiply(NoiseStrength left, double right) => left * right;
}
