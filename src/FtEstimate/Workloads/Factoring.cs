using System.Globalization;

namespace FtEstimate.Workloads;

/// <summary>Factoring an RSA number, by the closed forms of Gidney 2021 (arXiv:1905.09749).</summary>
/// <remarks>
/// The forms are the abstract's, in the abstract circuit model: no distillation, no routing. They are not the counts the
/// paper prints from its optimiser (0.4e9 and 2.7e9 Toffolis and halves of T at 1024 and 2048 bits), which lie above. One run; the
/// paper's own chance of a retry (31 % at 2048 bits) is not in them.
/// </remarks>
/// <param name="Bits">Length n of the number, 16 or more.</param>
public sealed record Factoring(int Bits)
{
    private const string Source = "Gidney 2021 (arXiv:1905.09749), abstract and table 1";

    /// <summary>Logical qubits: 3n + 0.002 n lg n.</summary>
    public double LogicalQubits => 3.0 * Bits + 0.002 * Bits * LgBits;

    /// <summary>Toffoli gates: 0.3 n³ + 0.0005 n³ lg n.</summary>
    public double Toffolis => (0.3 + 0.0005 * LgBits) * Math.Pow(Bits, 3);

    /// <summary>Sequential measurements: 500 n² + n² lg n.</summary>
    public double MeasurementDepth => (500 + LgBits) * Bits * Bits;

    private double LgBits => Math.Log2(Bits);

    /// <summary>The counts with their derivation.</summary>
    /// <exception cref="ArgumentOutOfRangeException">Fewer than 16 bits, where the closed forms mean nothing.</exception>
    public Workload Workload()
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(Bits, 16);
        return new Workload(
            Name: Text($"Factoring a {Bits}-bit number"),
            LogicalQubits: LogicalQubits,
            TStates: 0,
            Toffolis: Toffolis,
            Rotations: 0,
            RotationError: null,
            ReactionDepth: MeasurementDepth,
            RotationDepth: 0,
            LogicalLayers: null,
            Shots: 1,
            Derivations:
            [
                new Derivation("logical qubits", Text($"3 n + 0.002 n lg n, n = {Bits}"), LogicalQubits, Source),
                new Derivation("Toffolis", Text($"0.3 n^3 + 0.0005 n^3 lg n, n = {Bits}"), Toffolis, Source),
                new Derivation("reaction depth", Text($"500 n^2 + n^2 lg n measurements one after another, n = {Bits}"), MeasurementDepth, Source),
            ]);
    }

    private static string Text(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
