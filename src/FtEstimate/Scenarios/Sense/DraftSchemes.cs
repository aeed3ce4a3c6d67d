using FtEstimate.Scenarios.Keys;

namespace FtEstimate.Scenarios.Sense;

/// <summary>The readout schemes of a draft.</summary>
internal static class DraftSchemes
{
    private const string Stem = ReadoutKeys.Path + ".";

    /// <summary>Paths of the tables of all schemes, in alphabetical order.</summary>
    public static IEnumerable<string> SchemeTables(this ScenarioDraft draft) =>
        draft.Tables.Where(table => table.StartsWith(Stem, StringComparison.Ordinal)).Order(StringComparer.Ordinal);

    /// <summary>Whether a scheme of that kind is described.</summary>
    public static bool HasSchemeOfKind(this ScenarioDraft draft, string kind) =>
        draft.SchemeTables().Any(table => draft.KindOf(table) == kind);

    /// <summary>The kind of the scheme of a table; null: unreadable.</summary>
    public static string? KindOf(this ScenarioDraft draft, string table) => draft.Text($"{table}.{ReadoutKeys.Kind.Name}");
}
