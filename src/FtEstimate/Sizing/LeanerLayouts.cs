using System.Collections.Immutable;

namespace FtEstimate.Sizing;

/// <summary>
/// A layout with those that take no more tiles and no more noise: whatever is paced by its magic-state supply does as well on them.
/// </summary>
/// <param name="Layout">The layout.</param>
/// <param name="Leaner">The fastest leaner ones; a leaner one that is itself leaner than another of them is left out.</param>
internal sealed record LeanerLayouts(LogicLayout Layout, ImmutableArray<LogicLayout> Leaner)
{
    /// <summary>The layouts of a style, each after all that are leaner.</summary>
    public static ImmutableArray<LeanerLayouts> Of(ImmutableArray<LogicLayout> layouts, LogicStyle style)
    {
        List<LogicLayout> ofStyle = [.. layouts.Where(layout => layout.Style == style)];
        ofStyle.Sort((a, b) => a.Tiles != b.Tiles ? a.Tiles.CompareTo(b.Tiles) : a.GatesPerRound.CompareTo(b.GatesPerRound));
        var result = ImmutableArray.CreateBuilder<LeanerLayouts>(ofStyle.Count);
        foreach (LogicLayout layout in ofStyle)
        {
            // of two that are equal in both respects the earlier one counts as leaner
            LogicLayout[] leaner = [.. ofStyle.TakeWhile(other => other != layout).Where(other => IsLeaner(other, layout))];
            result.Add(new LeanerLayouts(
                layout, [.. leaner.Where((one, index) => !leaner.Skip(index + 1).Any(other => IsLeaner(one, other)))]));
        }

        return result.ToImmutable();
    }

    private static bool IsLeaner(LogicLayout one, LogicLayout other) =>
        one.Tiles <= other.Tiles && one.GatesPerRound <= other.GatesPerRound;
}
