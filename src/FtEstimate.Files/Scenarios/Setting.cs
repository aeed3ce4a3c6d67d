using System.Globalization;
using FtEstimate.Files.Toml;
using FtEstimate.Scenarios;
using FtEstimate.Scenarios.Keys;

namespace FtEstimate.Files.Scenarios;

/// <summary>One "key=value" of the command line, which replaces what the files say.</summary>
/// <param name="Path">The key, such as "machine.gates.cz_error".</param>
/// <param name="Node">Its value.</param>
internal sealed record Setting(string Path, TomlNode Node)
{
    /// <summary>The name that stands for a file in faults.</summary>
    public const string FileName = "--set";

    /// <summary>The source of inputs that were set.</summary>
    public const string Source = "--set on the command line";

    private static readonly Place Here = new(FileName, 0, 0);

    /// <summary>Reads "key=value": the value is a number, true or false, a text with or without quotes, or a table in braces.</summary>
    /// <param name="text">Such as "machine.gates.cz_error=1e-3".</param>
    /// <param name="fault">Why it could not be read; null: it was.</param>
    /// <returns>The setting, or null.</returns>
    public static Setting? Read(string text, out Fault? fault)
    {
        int equal = text.IndexOf('=');
        string path = equal < 0 ? text.Trim() : text[..equal].Trim();
        if (equal < 0 || path.Length == 0)
        {
            fault = new Fault(FileName, 0, 0, path, "expected key=value, such as machine.gates.cz_error=1e-3");
            return null;
        }

        TomlNode? node = ReadValue(text[(equal + 1)..].Trim(), ScenarioKeys.Find(path));
        fault = node is null ? new Fault(FileName, 0, 0, path, "the value cannot be read; expected a number, a text, true, false, or { likely = ..., low = ..., high = ... }") : null;
        return node is null ? null : new Setting(path, node);
    }

    /// <summary>Puts the value into a document.</summary>
    /// <param name="root">The document.</param>
    /// <returns>Null, or why there is no such place.</returns>
    public Fault? ApplyTo(TomlSection root)
    {
        string[] names = Path.Split('.');
        TomlSection section = root;
        for (int i = 0; i < names.Length - 1; i++)
        {
            TomlNode? node = section.Find(names[i]);
            if (node is null)
            {
                node = new TomlSection(Here);
                section.Set(names[i], node);
            }

            if (node is not TomlSection next)
            {
                return new Fault(FileName, 0, 0, Path, $"{string.Join('.', names[..(i + 1)])} is no table, so nothing stands inside it");
            }

            section = next;
        }

        section.Set(names[^1], Node);
        return null;
    }

    private static TomlNode? ReadValue(string value, KeyDefinition? key)
    {
        if (value.StartsWith('"') || value.StartsWith('\'') || value.StartsWith('{') || value.StartsWith('['))
        {
            List<Fault> faults = [];
            TomlNode? node = TomlGrammar.Read(FileName, $"value = {value}", faults).Find("value");
            return faults.Count == 0 ? WithoutLines(node) : null;
        }

        bool isText = key?.Kind == ValueKind.Text;
        if (!isText && value is "true" or "false")
        {
            return TomlScalars.OfFlag(Here, value == "true");
        }

        bool isNumber = double.TryParse(value.Replace("_", "", StringComparison.Ordinal), NumberStyles.Float, CultureInfo.InvariantCulture, out double number);
        return isNumber && !isText ? TomlScalars.OfNumber(Here, number) : TomlScalars.OfText(Here, value);
    }

    // the one line of a setting is no line of a file
    private static TomlNode? WithoutLines(TomlNode? node)
    {
        switch (node)
        {
            case TomlLeaf leaf:
                return new TomlLeaf(Here, leaf.Description) { Text = leaf.Text, Number = leaf.Number, Flag = leaf.Flag };
            case TomlSection section:
                TomlSection copy = new(Here);
                foreach (string name in section.Names)
                {
                    copy.Set(name, WithoutLines(section.Find(name))!);
                }

                return copy;
            case TomlList list:
                return new TomlList(Here, list.IsOfTables);
            default:
                return null;
        }
    }
}
