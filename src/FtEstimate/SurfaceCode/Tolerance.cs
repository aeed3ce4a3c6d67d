namespace FtEstimate.SurfaceCode;

/// <summary>How closely two numbers must agree to count as a tie.</summary>
internal static class Tolerance
{
    /// <summary>
    /// Far above the rounding of a power, far below any meaning: 0.1·0.1^11 must meet a target of 1e-12.
    /// </summary>
    public const double Relative = 1e-9;
}
