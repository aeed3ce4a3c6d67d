using FtEstimate.Files.Toml;
using FtEstimate.Scenarios;

namespace FtEstimate.Files.Scenarios;

/// <summary>
/// The value of one key: plain, or a table with its range and source. Numbers: { likely, low, high, source }; texts and flags: { value, source }.
/// </summary>
internal static class InputValue
{
    private static readonly string[] PartsOfNumbers = ["likely", "low", "high", "source"];
    private static readonly string[] PartsOfOthers = ["value", "source"];

    /// <summary>The text of a node, plain or with a source; null: it is none.</summary>
    public static string? TextOf(TomlNode? node) => (node is TomlSection section ? section.Find("value") : node) is TomlLeaf leaf ? leaf.Text : null;

    /// <summary>Reads the value of a key and notes the input or its faults.</summary>
    public static void Collect(TomlNode node, KeyDefinition key, string path, Findings findings)
    {
        Input? input = node is TomlSection section
            ? ReadParts(section, key, path, findings)
            : ReadPlain(node, key, path, node.Place, findings);
        if (input is not null)
        {
            bool isSetting = node.Place.File == Setting.FileName && input.Source is null;
            findings.AddInput(isSetting ? input with { Source = Setting.Source } : input, node.Place);
        }
    }

    private static Input? ReadParts(TomlSection section, KeyDefinition key, string path, Findings findings)
    {
        string main = key.IsNumber && section.Find("value") is null ? "likely" : "value";
        bool takesNumbers = key.IsNumber && (main == "likely" || key.Kind != ValueKind.PositiveOrBest);
        if (!KnowsParts(section, takesNumbers ? PartsOfNumbers : PartsOfOthers, path, findings))
        {
            return null;
        }

        if (section.Find(main) is not TomlNode likely)
        {
            findings.AddFault(section.Place, path, $"missing {main} in the table of this key; expected {Expectation.Of(key)}");
            return null;
        }

        string? source = null;
        if (section.Find("source") is TomlNode given)
        {
            source = (given as TomlLeaf)?.Text;
            if (source is null)
            {
                findings.AddFault(given.Place, path, $"expected a text in quotes as source, found {given.Description}");
                return null;
            }
        }

        Input? input = ReadPlain(likely, key, path, likely.Place, findings);
        return input is null ? null : ReadRange(section, key, input with { Source = source }, findings);
    }

    private static bool KnowsParts(TomlSection section, string[] parts, string path, Findings findings)
    {
        bool isKnown = true;
        foreach (string name in section.Names)
        {
            if (!parts.Contains(name))
            {
                string hint = Suggestion.Nearest(name, parts) is string near ? $"; did you mean {near}?" : $"; known here are {string.Join(", ", parts)}";
                findings.AddFault(section.Find(name)!.Place, path, $"unknown part {name}{hint}");
                isKnown = false;
            }
        }

        return isKnown;
    }

    private static Input? ReadRange(TomlSection section, KeyDefinition key, Input input, Findings findings)
    {
        TomlNode? low = section.Find("low");
        TomlNode? high = section.Find("high");
        if (low is null && high is null)
        {
            return input;
        }

        if (low is null || high is null)
        {
            findings.AddFault(section.Place, input.Path, "low and high go together (10th and 90th percentile)");
            return null;
        }

        if (key.Kind == ValueKind.Whole || input.Number is not double likely)
        {
            findings.AddFault(low.Place, input.Path, "this key takes no range");
            return null;
        }

        Input? readLow = ReadPlain(low, key, input.Path, low.Place, findings);
        Input? readHigh = ReadPlain(high, key, input.Path, high.Place, findings);
        if (readLow?.Number is not double lowest || readHigh?.Number is not double highest)
        {
            // a text in place of a number was let through where the key allows one
            if (readLow is not null && readHigh is not null)
            {
                findings.AddFault(section.Place, input.Path, "low and high must be numbers");
            }

            return null;
        }

        if (!(lowest <= likely && likely <= highest))
        {
            findings.AddFault(section.Place, input.Path, "expected low ≤ likely ≤ high");
            return null;
        }

        if (lowest < KeyDefinition.Smallest)
        {
            findings.AddFault(low.Place, input.Path, "the low end of a range must be greater than 0");
            return null;
        }

        return input with { Low = lowest, High = highest };
    }

    private static Input? ReadPlain(TomlNode node, KeyDefinition key, string path, Place place, Findings findings)
    {
        TomlLeaf? leaf = node as TomlLeaf;
        Input? input = key.Kind switch
        {
            ValueKind.Text => leaf?.Text is string text && IsAllowed(key, text) ? new Input(path, Text: text) : null,
            ValueKind.Flag => leaf?.Flag is bool flag ? new Input(path, Flag: flag) : null,
            ValueKind.PositiveOrBest when leaf?.Text == "best" => new Input(path, Text: "best"),
            _ => leaf?.Number is double number && key.Accepts(number) ? new Input(path, Number: number) : null,
        };
        if (input is null)
        {
            findings.AddFault(place, path, $"expected {Expectation.Of(key)}, found {node.Description}{Near(key, leaf?.Text)}");
        }

        return input;
    }

    private static bool IsAllowed(KeyDefinition key, string text) =>
        key.Choices.Length == 0 ? !string.IsNullOrWhiteSpace(text) : key.Choices.Contains(text);

    private static string Near(KeyDefinition key, string? text) =>
        text is not null && key.Choices.Length > 0 && Suggestion.Nearest(text, key.Choices) is string near ? $"; did you mean \"{near}\"?" : "";
}
