using System.Globalization;

namespace FtEstimate.Workloads;

/// <summary>Dynamics of the transverse-field Ising model H = J Σ ZZ + g Σ X on a square lattice, by a product formula.</summary>
/// <remarks>
/// One logical qubit per site; each bond and each site is one z rotation per step. Steps of order 2 have the bonds as outer half
/// steps; neighbouring half steps merge, and one bond layer is left over at the end. Clifford gates are free.
/// </remarks>
/// <param name="Lattice">The lattice.</param>
/// <param name="Coupling">J, not 0.</param>
/// <param name="Field">g, in the unit of J.</param>
/// <param name="EvolutionTime">Evolution time in units of 1/J, above 0.</param>
/// <param name="Error">Error allowed for the product formula, in spectral norm, above 0; ignored where steps are given.</param>
/// <param name="Order">1 or 2.</param>
/// <param name="StatedSteps">Number of steps, 1 or more; null: from the worst-case bound.</param>
public sealed record SpinLattice(
    SquareLattice Lattice,
    double Coupling,
    double Field,
    double EvolutionTime,
    double Error,
    int Order = 2,
    double? StatedSteps = null)
{
    private const string BoundSource = "Childs 2021 (arXiv:1912.08854), commutator bound";
    private const string Counted = "counted";

    /// <summary>Number of steps, stated or from the bound.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The order is neither 1 nor 2.</exception>
    public double Steps => StatedSteps ?? Bound.Steps(Order, Time, Error);

    /// <summary>Rotations of the whole evolution.</summary>
    public double Rotations => Steps * (Lattice.Bonds + Lattice.Sites) + (IsSymmetric ? Lattice.Bonds : 0);

    /// <summary>Layers of rotations one after another: one per bond layer and one for all sites, per step.</summary>
    public double RotationDepth => Steps * (Lattice.BondLayers + 1) + (IsSymmetric ? Lattice.BondLayers : 0);

    private IsingTrotterBound Bound => new(Lattice.Sites, Lattice.Bonds, Lattice.Coordination, Coupling, Field);

    private double Time => EvolutionTime / Math.Abs(Coupling);

    private bool IsSymmetric => Order == 2;

    /// <summary>The counts with their derivation.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The order is neither 1 nor 2.</exception>
    public Workload Workload() => new(
        Name: Text($"Ising dynamics on {Lattice.Rows} x {Lattice.Columns} spins"),
        LogicalQubits: Lattice.Sites,
        TStates: 0,
        Toffolis: 0,
        Rotations: Rotations,
        RotationError: null,
        ReactionDepth: 0,
        RotationDepth: RotationDepth,
        LogicalLayers: null,
        Shots: 1,
        Derivations:
        [
            new Derivation("logical qubits", Text($"one per site, {Lattice.Rows} x {Lattice.Columns}, {Edges}"), Lattice.Sites, Counted),
            new Derivation("bonds", Text($"nearest neighbours, {Edges}"), Lattice.Bonds, Counted),
            StepsDerivation,
            new Derivation("error of the product formula, worst case", "proven bound at these steps; not part of the failure", Bound.Error(Order, Time, Steps), BoundSource),
            new Derivation("rotations", IsSymmetric ? "steps (bonds + sites) + bonds" : "steps (bonds + sites)", Rotations, Counted),
            new Derivation("rotation depth", RotationDepthFormula, RotationDepth, "edge colouring, direction by direction"),
        ]);

    private string Edges => Lattice.Periodic ? "periodic" : "open edges";

    private Derivation StepsDerivation => StatedSteps is double stated
        ? new Derivation("steps", Text($"order {Order}, stated"), stated, "stated in the file")
        : new Derivation("steps", StepsFormula, Steps, BoundSource);

    private string StepsFormula => IsSymmetric
        ? Text($"order 2: t^3/r^2 (4/3 g^2 J B + z^2/6 g J^2 N) <= {Error}, {Parameters}")
        : Text($"order 1: 2 g J B t^2/r <= {Error}, {Parameters}");

    private string Parameters => Text($"t = {EvolutionTime}/J, J = {Coupling}, g = {Field}, N = {Lattice.Sites}, B = {Lattice.Bonds}, z = {Lattice.Coordination}");

    private string RotationDepthFormula => IsSymmetric
        ? Text($"steps ({Lattice.BondLayers} bond layers + 1) + {Lattice.BondLayers}")
        : Text($"steps ({Lattice.BondLayers} bond layers + 1)");

    private static string Text(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
