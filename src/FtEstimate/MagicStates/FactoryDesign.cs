using System.Diagnostics.CodeAnalysis;

namespace FtEstimate.MagicStates;

/// <summary>A distillation protocol.</summary>
public enum DistillationProtocol
{
    /// <summary>Fifteen T states to one (Bravyi 2005, arXiv:quant-ph/0403025).</summary>
    FifteenToOne,
}

/// <summary>One distillation block: what it does and how large its patches are.</summary>
/// <param name="Protocol">The protocol.</param>
/// <param name="Distances">Its code distances.</param>
public readonly record struct DistillationBlock(DistillationProtocol Protocol, PatchDistances Distances)
{
    /// <inheritdoc/>
    public override string ToString() => $"15-to-1:{Distances}";
}

/// <summary>Blocks that work side by side to feed the next level.</summary>
/// <param name="Block">The block.</param>
/// <param name="Count">How many of it: even, since two states are used at a time.</param>
public readonly record struct FeederBlocks(DistillationBlock Block, int Count)
{
    /// <inheritdoc/>
    public override string ToString() => FormattableString.Invariant($"{Block}*{Count}");
}

/// <summary>
/// What a factory is, before any noise: one block, or one block fed by several smaller ones (Litinski 2019, arXiv:1905.06903). Written
/// <c>15-to-1:17,7,7</c> or <c>15-to-1:13,5,5*6 > 15-to-1:29,11,13</c>: protocol, then dX,dZ,dm, then how many.
/// </summary>
/// <param name="Last">The block whose outputs leave the factory.</param>
/// <param name="Feeders">The blocks that feed it; null when it takes injected states.</param>
public sealed record FactoryDesign(DistillationBlock Last, FeederBlocks? Feeders = null)
{
    /// <summary>Number of distillation levels, 1 or 2.</summary>
    public int Levels => Feeders is null ? 1 : 2;

    /// <summary>
    /// Atoms of the factory, data and checks in equal number: 2[(dX+4dZ)·3dX + 2dm] at one level; see <see cref="FactoryGeometry"/>.
    /// </summary>
    public int Atoms => FactoryGeometry.Atoms(this);

    /// <summary>A one-level 15-to-1 factory.</summary>
    public static FactoryDesign OneLevel(PatchDistances distances) => new(FifteenToOneBlock(distances));

    /// <summary>A 15-to-1 block fed by several 15-to-1 blocks.</summary>
    /// <param name="feeder">Distances of a feeding block.</param>
    /// <param name="count">Number of feeding blocks, even.</param>
    /// <param name="last">Distances of the last block.</param>
    public static FactoryDesign TwoLevels(PatchDistances feeder, int count, PatchDistances last) =>
        new(FifteenToOneBlock(last), new FeederBlocks(FifteenToOneBlock(feeder), count));

    /// <summary>Reads the notation; on failure says what is wrong with it.</summary>
    /// <param name="text">For instance <c>15-to-1:17,7,7</c>; spaces do not matter.</param>
    /// <param name="design">The design, or null.</param>
    /// <param name="fault">A sentence that says what is wrong, or null.</param>
    public static bool TryParse(
        string? text,
        [NotNullWhen(true)] out FactoryDesign? design,
        [NotNullWhen(false)] out string? fault) => FactoryNotation.TryParse(text, out design, out fault);

    /// <summary>The notation that <see cref="TryParse"/> reads.</summary>
    public override string ToString() => Feeders is { } feeders ? $"{feeders} > {Last}" : Last.ToString();

    private static DistillationBlock FifteenToOneBlock(PatchDistances distances) => new(DistillationProtocol.FifteenToOne, distances);
}
