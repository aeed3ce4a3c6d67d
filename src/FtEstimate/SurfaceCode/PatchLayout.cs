using System.Collections.Immutable;

namespace FtEstimate.SurfaceCode;

/// <summary>How many atoms one tile holds: the patch alone, or with a margin to its neighbours.</summary>
/// <remarks>All counts are for a distance d of 1 or more.</remarks>
public sealed class PatchLayout
{
    private readonly Func<int, int> data;
    private readonly Func<int, int> checks;

    private PatchLayout(string name, Func<int, int> data, Func<int, int> checks)
    {
        Name = name;
        this.data = data;
        this.checks = checks;
    }

    /// <summary>The rotated patch alone: d² data atoms and d² − 1 checks.</summary>
    public static PatchLayout Bare { get; } = new("2d^2-1", d => d * d, d => d * d - 1);

    /// <summary>A tile of d² data and d² check atoms, as in Litinski 2019 (arXiv:1808.02892).</summary>
    public static PatchLayout Padded { get; } = new("2d^2", d => d * d, d => d * d);

    /// <summary>A tile with one more row and column, as in Gidney 2021 (arXiv:1905.09749).</summary>
    public static PatchLayout Spaced { get; } = new("2(d+1)^2", d => (d + 1) * (d + 1), d => (d + 1) * (d + 1));

    /// <summary>All layouts, the smallest first.</summary>
    public static ImmutableArray<PatchLayout> All { get; } = [Bare, Padded, Spaced];

    /// <summary>The name used in scenario files: the formula itself.</summary>
    public string Name { get; }

    /// <summary>The layout of that name, or null.</summary>
    public static PatchLayout? Named(string name) => All.FirstOrDefault(layout => layout.Name == name);

    /// <summary>Data atoms of one tile.</summary>
    public int DataAtoms(int distance) => data(distance);

    /// <summary>Check atoms of one tile, for a single bank of single atoms.</summary>
    public int CheckAtoms(int distance) => checks(distance);

    /// <summary>All atoms of one tile.</summary>
    public int AtomsPerTile(int distance) => data(distance) + checks(distance);

    /// <inheritdoc/>
    public override string ToString() => Name;
}
