using System.Globalization;
using System.Text;
using FtEstimate.Scenarios;
using FtEstimate.Scenarios.Keys;

namespace FtEstimate.Files.Scenarios;

/// <summary>The reference of all keys as Markdown; docs/scenario-files.md holds it.</summary>
public static class ScenarioKeysTable
{
    /// <summary>One section with a table per <see cref="TableDefinition"/>.</summary>
    public static string Render()
    {
        StringBuilder text = new();
        foreach (TableDefinition table in ScenarioKeys.Tables)
        {
            text.Append(CultureInfo.InvariantCulture, $"### {Heading(table)}\n\n{table.Meaning}\n\n");
            text.Append("| key | what it is | expected | when absent |\n|---|---|---|---|\n");
            foreach (KeyDefinition key in OwnKeys(table))
            {
                text.Append(CultureInfo.InvariantCulture, $"| `{key.Name}` | {Cell(key.Meaning)} | {Cell(Expectation.Of(key))} | {WhenAbsent(key)} |\n");
            }

            text.Append(table.Path.EndsWith(".*", StringComparison.Ordinal)
                ? "\nAnd any key of `[detection]`, where this scheme differs from it.\n\n"
                : "\n");
        }

        return text.ToString().TrimEnd('\n') + "\n";
    }

    private static string Heading(TableDefinition table)
    {
        string[] parts = table.Path.Split('.');
        string place = parts switch
        {
            [""] => "Scenario file: top",
            ["machine"] => "Machine file: top",
            ["workload"] => "Workload file: top",
            ["machine", .. string[] inner] => $"Machine file: `[{Name(inner)}]`",
            ["workload", .. string[] inner] => $"Workload file: `[{Name(inner)}]`",
            _ => $"Scenario file: `[{Name(parts)}]`",
        };
        return table.SelectedBy is null ? place : $"{place} with `{table.SelectedBy} = \"{table.SelectedWhen}\"`";
    }

    private static string Name(string[] parts) => string.Join('.', parts).Replace("*", "NAME", StringComparison.Ordinal);

    // a scheme may repeat every key of [detection]; twelve more rows would say nothing new
    private static IEnumerable<KeyDefinition> OwnKeys(TableDefinition table) => table.Path.EndsWith(".*", StringComparison.Ordinal)
        ? table.Keys.Where(key => !DetectionKeys.All.Contains(key))
        : table.Keys;

    private static string WhenAbsent(KeyDefinition key) => key switch
    {
        { Required: true } => "must be given",
        { Default: double number } => number.ToString("R", CultureInfo.InvariantCulture),
        { DefaultText: string text } => $"\"{text}\"",
        _ => "",
    };

    private static string Cell(string text) => text.Replace("|", "\\|", StringComparison.Ordinal);
}
