using System.Collections.Immutable;
using System.Globalization;

namespace FtEstimate.Files.Comparisons;

/// <summary>Our figures beside the published ones, from a table of published figures and the scenarios beside it.</summary>
public static class ComparisonTable
{
    /// <summary>Name of the table of published figures.</summary>
    public const string FileName = "comparisons.csv";

    private const int Columns = 7;

    /// <summary>Reads the table in a folder and computes our side.</summary>
    /// <param name="folder">The folder with the table and its scenarios.</param>
    /// <returns>Our figures beside the published ones, and what is wrong with the table.</returns>
    public static ComparisonReading Read(string folder)
    {
        string path = Path.Combine(folder, FileName);
        InputText content = InputText.Read(path);
        if (content.Text is null)
        {
            return new ComparisonReading([], [new Fault(path, content.Line, 0, "", content.Problem ?? "unreadable")]);
        }

        var comparisons = ImmutableArray.CreateBuilder<Comparison>();
        var faults = ImmutableArray.CreateBuilder<Fault>();
        FigureComputation ours = new(folder);
        string[] lines = content.Text.ReplaceLineEndings("\n").Split('\n');
        for (int i = 1; i < lines.Length; i++)
        {
            if (lines[i].Length == 0)
            {
                continue;
            }

            List<string> cells = SplitQuoted(lines[i]);
            bool whole = cells.Count == Columns;
            double published = double.NaN;
            if (!whole || !double.TryParse(cells[4], NumberStyles.Float, CultureInfo.InvariantCulture, out published)
                || !(published > 0 && double.IsFinite(published)))
            {
                faults.Add(new Fault(path, i + 1, 1, "", whole
                    ? $"'{cells[4]}' is not a number above zero"
                    : $"expected {Columns} columns, found {cells.Count}"));
                continue;
            }

            PublishedFigure figure = new(cells[0], cells[1], cells[2], cells[3], published, cells[4], cells[5], cells[6]);
            if (ours.Of(figure) is { } value && double.IsFinite(value))
            {
                comparisons.Add(new Comparison(figure, value));
            }
            else
            {
                faults.Add(new Fault(path, i + 1, 1, figure.Kind, $"'{figure.Subject}' gives no figure '{figure.Figure}'"));
            }
        }

        return new ComparisonReading(comparisons.ToImmutable(), faults.ToImmutable());
    }

    /// <summary>Splits a line at commas outside double quotes; a doubled quote inside quotes stands for one.</summary>
    private static List<string> SplitQuoted(string line)
    {
        List<string> cells = [];
        System.Text.StringBuilder cell = new();
        bool quoted = false;
        for (int i = 0; i < line.Length; i++)
        {
            char c = line[i];
            if (c == '"' && quoted && i + 1 < line.Length && line[i + 1] == '"')
            {
                cell.Append('"');
                i++;
            }
            else if (c == '"')
            {
                quoted = !quoted;
            }
            else if (c == ',' && !quoted)
            {
                cells.Add(cell.ToString());
                cell.Clear();
            }
            else
            {
                cell.Append(c);
            }
        }

        cells.Add(cell.ToString());
        return cells;
    }
}
