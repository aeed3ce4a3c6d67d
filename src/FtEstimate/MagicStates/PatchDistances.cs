namespace FtEstimate.MagicStates;

/// <summary>The three code distances of one distillation level, all odd (Litinski 2019, arXiv:1905.06903).</summary>
/// <param name="X">Distance against X errors: the long side of every patch.</param>
/// <param name="Z">Distance against Z errors of the check patches, shorter because the protocol finds their Z errors.</param>
/// <param name="M">Rounds of one lattice-surgery measurement, and the width of the ancilla patches.</param>
public readonly record struct PatchDistances(int X, int Z, int M)
{
    /// <inheritdoc/>
    public override string ToString() => FormattableString.Invariant($"{X},{Z},{M}");
}
