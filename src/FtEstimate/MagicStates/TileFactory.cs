namespace FtEstimate.MagicStates;

/// <summary>
/// The plain 15-to-1 factory on eleven tiles of the data distance, in eleven steps of d rounds (Litinski 2019, arXiv:1808.02892).
/// </summary>
/// <remarks>
/// Its output error is that of the protocol with perfect Clifford gates; logical errors of its tiles are not in it and must be counted with
/// those of all other tiles. A rejected batch is repeated.
/// </remarks>
public static class TileFactory
{
    /// <summary>How a scenario file names it.</summary>
    public const string ScenarioName = "tile-15-to-1";

    /// <summary>Tiles it takes.</summary>
    public const int Tiles = 11;

    /// <summary>Steps of d rounds that one batch takes.</summary>
    public const int Steps = 11;

    /// <summary>The factory at one distance.</summary>
    /// <param name="distance">Code distance of the data, odd.</param>
    /// <param name="atomsPerTile">Atoms of one tile at that distance.</param>
    /// <param name="injectedError">Error of an injected T state, 0 to 0.5, taken as a Z error.</param>
    /// <exception cref="ArgumentOutOfRangeException">The injected error is not between 0 and 0.5.</exception>
    public static Factory Of(int distance, int atomsPerTile, double injectedError) => new()
    {
        Name = FormattableString.Invariant($"15-to-1 on {Tiles} tiles, d={distance}"),
        Atoms = Tiles * atomsPerTile,
        RoundsPerBatch = Steps * distance,
        Outputs = 1,
        OutputError = FifteenToOne.OutputError(injectedError),
        Acceptance = FifteenToOne.Acceptance(injectedError),
        DX = distance,
        DZ = distance,
        DM = distance,
    };
}
