using System.Collections.Immutable;
using FtEstimate.Scenarios.Keys;

namespace FtEstimate.Scenarios.Sense;

/// <summary>The readout schemes of a draft.</summary>
internal static class DraftSchemes
{
    private const string Stem = ReadoutKeys.Path + ".";

    /// <summary>Paths of the tables of all schemes.</summary>
    public static IEnumerable<string> SchemeTables(this ScenarioDraft draft)
    {
        foreach (string table in draft.Tables)
        {
            if (table.StartsWith(Stem, StringComparison.Ordinal))
            {
                yield return table;
            }
        }
    }

    /// <summary>Whether a scheme of that kind is described.</summary>
    public static bool HasSchemeOfKind(this ScenarioDraft draft, string kind)
    {
        foreach (string table in draft.SchemeTables())
        {
            if (draft.KindOf(table) == kind)
            {
                return true;
            }
        }

        return false;
    }

    /// <summary>The kind of the scheme of a table; null: unreadable.</summary>
    public static string? KindOf(this ScenarioDraft draft, string table) => draft.Text($"{table}.{ReadoutKeys.Kind.Name}");

    /// <summary>The first of some keys that a table gives, or null.</summary>
    public static KeyDefinition? FirstGiven(this ScenarioDraft draft, string table, ImmutableArray<KeyDefinition> keys)
    {
        foreach (KeyDefinition key in keys)
        {
            if (draft.Gives($"{table}.{key.Name}"))
            {
                return key;
            }
        }

        return null;
    }
}
