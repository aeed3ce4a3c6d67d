using System.Collections.Immutable;

namespace FtEstimate.Simulation.Circuits;

/// <summary>Where a data atom lies as seen from a check.</summary>
public enum Corner
{
    /// <summary>Up and left.</summary>
    NorthWest,

    /// <summary>Up and right.</summary>
    NorthEast,

    /// <summary>Down and left.</summary>
    SouthWest,

    /// <summary>Down and right.</summary>
    SouthEast,
}

/// <summary>One check of a patch.</summary>
/// <param name="Basis">What it measures.</param>
/// <param name="Row">Row of the face, 0 (above the first row of data atoms) to d.</param>
/// <param name="Column">Column of the face, 0 to d.</param>
/// <param name="Distance">Distance of the patch.</param>
public readonly record struct PatchCheck(PauliBasis Basis, int Row, int Column, int Distance)
{
    /// <summary>Index of the data atom at a corner, or null beyond the edge.</summary>
    public int? DataAt(Corner corner)
    {
        int row = corner is Corner.NorthWest or Corner.NorthEast ? Row - 1 : Row;
        int column = corner is Corner.NorthWest or Corner.SouthWest ? Column - 1 : Column;
        bool inside = row >= 0 && row < Distance && column >= 0 && column < Distance;
        return inside ? (row * Distance) + column : null;
    }
}

/// <summary>
/// The rotated surface code: d² data atoms row by row, d² − 1 checks. X checks of two atoms lie on the upper and lower edge, Z checks of two on the left
/// and right; logical X is a column, logical Z a row.
/// </summary>
public sealed class RotatedPatch
{
    /// <summary>Lays out a patch.</summary>
    /// <param name="distance">Code distance, odd, at least 3.</param>
    /// <exception cref="ArgumentOutOfRangeException">The distance is even or below 3.</exception>
    public RotatedPatch(int distance)
    {
        if (distance < 3 || distance % 2 == 0)
        {
            throw new ArgumentOutOfRangeException(nameof(distance), distance, "odd and at least 3");
        }

        Distance = distance;
        var checks = ImmutableArray.CreateBuilder<PatchCheck>((distance * distance) - 1);
        for (int row = 0; row <= distance; row++)
        {
            for (int column = 0; column <= distance; column++)
            {
                PauliBasis basis = (row + column) % 2 == 0 ? PauliBasis.Z : PauliBasis.X;
                bool onUpperOrLower = row == 0 || row == distance;
                bool onSide = column == 0 || column == distance;
                bool isThere = (onUpperOrLower, onSide) switch
                {
                    (true, true) => false,
                    (true, false) => basis == PauliBasis.X,
                    (false, true) => basis == PauliBasis.Z,
                    _ => true,
                };
                if (isThere)
                {
                    checks.Add(new PatchCheck(basis, row, column, distance));
                }
            }
        }

        Checks = checks.MoveToImmutable();
        LogicalX = [.. Enumerable.Range(0, distance).Select(row => row * distance)];
        LogicalZ = [.. Enumerable.Range(0, distance)];
    }

    /// <summary>Code distance.</summary>
    public int Distance { get; }

    /// <summary>Data atoms.</summary>
    public int DataCount => Distance * Distance;

    /// <summary>All checks, row by row.</summary>
    public ImmutableArray<PatchCheck> Checks { get; }

    /// <summary>Data atoms of a logical X: the first column.</summary>
    public ImmutableArray<int> LogicalX { get; }

    /// <summary>Data atoms of a logical Z: the first row.</summary>
    public ImmutableArray<int> LogicalZ { get; }

    /// <summary>Data atoms whose product is the logical observable of a basis.</summary>
    public ImmutableArray<int> Logical(PauliBasis basis) => basis == PauliBasis.X ? LogicalX : LogicalZ;
}
