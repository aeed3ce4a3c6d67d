namespace FtEstimate.Simulation.Circuits;

/// <summary>X or Z: what a check measures, or the basis in which a memory is prepared and read.</summary>
public enum PauliBasis
{
    /// <summary>X checks; memory of logical X, which Z errors flip.</summary>
    X,

    /// <summary>Z checks; memory of logical Z, which X errors flip.</summary>
    Z,
}
