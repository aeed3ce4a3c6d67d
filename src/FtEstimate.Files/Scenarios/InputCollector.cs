using System.Collections.Immutable;
using FtEstimate.Files.Toml;
using FtEstimate.Scenarios;
using FtEstimate.Scenarios.Keys;

namespace FtEstimate.Files.Scenarios;

/// <summary>Walks the tables of a document beside their definitions and collects inputs and faults.</summary>
internal static class InputCollector
{
    /// <summary>Collects a table and the tables inside it.</summary>
    /// <param name="section">The table.</param>
    /// <param name="path">Where it stands, seen from the scenario.</param>
    /// <param name="findings">Receives what is found.</param>
    public static void Collect(TomlSection section, string path, Findings findings)
    {
        findings.AddTable(path, section.Place);
        ImmutableArray<TableDefinition> definitions = Applicable(section, path);
        foreach (string name in section.Names)
        {
            CollectNode(section.Find(name)!, name, path, definitions, findings);
        }

        // without a readable "kind" nobody knows which keys are needed
        if (definitions.Length > 1)
        {
            CollectMissing(section, path, [definitions[0].Find(definitions[0].SelectedBy!)!], findings);
        }
        else
        {
            CollectMissing(section, path, definitions[0].Keys, findings);
        }
    }

    private static ImmutableArray<TableDefinition> Applicable(TomlSection section, string path)
    {
        ImmutableArray<TableDefinition> all = ScenarioKeys.At(path);
        if (all.Length > 1)
        {
            string? selected = InputValue.TextOf(section.Find(all[0].SelectedBy!));
            foreach (TableDefinition definition in all)
            {
                if (definition.SelectedWhen == selected)
                {
                    return [definition];
                }
            }
        }

        return all;
    }

    private static void CollectNode(
        TomlNode node, string name, string table, ImmutableArray<TableDefinition> definitions, Findings findings)
    {
        string path = table.Length == 0 ? name : $"{table}.{name}";
        KeyDefinition? key = FindKey(definitions, name);
        ImmutableArray<TableDefinition> inner = ScenarioKeys.At(path);
        if (node is TomlSection section && inner.Length > 0 && (key is null || inner[0].Path == path))
        {
            if (IsPlainName(name))
            {
                Collect(section, path, findings);
            }
            else
            {
                findings.AddFault(node.Place, path, "names of tables consist of letters, digits, - and _");
            }
        }
        else if (key is not null)
        {
            InputValue.Collect(node, key, path, findings);
        }
        else if (inner.Length > 0 && inner[0].Path == path)
        {
            findings.AddFault(node.Place, path, $"expected a table, found {node.Description}");
        }
        else
        {
            CollectUnknown(node, name, table, path, definitions, findings);
        }
    }

    private static bool IsPlainName(string name)
    {
        foreach (char letter in name)
        {
            if (!char.IsAsciiLetterOrDigit(letter) && letter is not ('-' or '_'))
            {
                return false;
            }
        }

        return name.Length > 0;
    }

    private static KeyDefinition? FindKey(ImmutableArray<TableDefinition> definitions, string name)
    {
        foreach (TableDefinition definition in definitions)
        {
            if (definition.Find(name) is KeyDefinition key)
            {
                return key;
            }
        }

        return null;
    }

    private static void CollectUnknown(
        TomlNode node, string name, string table, string path, ImmutableArray<TableDefinition> definitions, Findings findings)
    {
        if (findings.IsFull)
        {
            return;
        }

        foreach (TableDefinition variant in ScenarioKeys.At(table))
        {
            if (variant.Find(name) is not null)
            {
                findings.AddFault(node.Place, path, $"this key goes with {variant.SelectedBy} = \"{variant.SelectedWhen}\"");
                return;
            }
        }

        // a table in braces is the value of a key
        string what = node is TomlSection { IsClosed: false } ? "table" : "key";
        Suggestion suggestion = Suggestion.For(name, (node as TomlLeaf)?.Number, table, KnownNames(table, definitions));
        findings.AddFault(node.Place, path, $"unknown {what}{suggestion.Message}");
        if (suggestion.Meant is string meant)
        {
            findings.Silence(table.Length == 0 ? meant : $"{table}.{meant}");
        }
    }

    private static List<string> KnownNames(string table, ImmutableArray<TableDefinition> definitions)
    {
        List<string> names = [];
        foreach (TableDefinition definition in definitions)
        {
            names.AddRange(definition.Keys.Select(key => key.Name));
        }

        int stem = table.Length == 0 ? 0 : table.Length + 1;
        foreach (TableDefinition inner in ScenarioKeys.Tables)
        {
            if (inner.Path.Length > stem
                && (stem == 0 || inner.Path.StartsWith(table + ".", StringComparison.Ordinal))
                && inner.Path.IndexOf('.', stem) < 0
                && inner.Path[stem] != '*')
            {
                names.Add(inner.Path[stem..]);
            }
        }

        return [.. names.Distinct()];
    }

    private static void CollectMissing(TomlSection section, string path, ImmutableArray<KeyDefinition> keys, Findings findings)
    {
        foreach (KeyDefinition key in keys)
        {
            if (key.Required && section.Find(key.Name) is null)
            {
                findings.AddMissing(section.Place, path.Length == 0 ? key.Name : $"{path}.{key.Name}", key);
            }
        }
    }
}
