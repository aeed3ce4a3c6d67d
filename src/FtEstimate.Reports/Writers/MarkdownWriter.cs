using System.Collections.Immutable;
using System.Text;
using FtEstimate.Reports.Documents;

namespace FtEstimate.Reports.Writers;

/// <summary>Writes a report as Markdown with pipe tables, padded so that it also reads well as plain text.</summary>
public static class MarkdownWriter
{
    // beyond this, padding a column would only push the others off the screen
    private const int WidestPadding = 60;

    /// <summary>The whole report.</summary>
    /// <param name="document">The report.</param>
    /// <param name="pictureFolder">Folder of the picture files as seen from the report; null: pictures are left out, their data stand in tables anyway.</param>
    public static string Write(ReportDocument document, string? pictureFolder = null)
    {
        var text = new StringBuilder(16_384);
        text.Append("# ").Append(MarkdownText.Inline(document.Title)).Append('\n');
        foreach (ReportSection section in document.Sections)
        {
            text.Append("\n## ").Append(MarkdownText.Inline(section.Title)).Append('\n');
            foreach (Block block in section.Blocks)
            {
                Append(text, block, pictureFolder);
            }
        }

        return text.ToString();
    }

    /// <summary>One block with an empty line before it.</summary>
    internal static void Append(StringBuilder text, Block block, string? pictureFolder)
    {
        switch (block)
        {
            case Paragraph paragraph:
                text.Append('\n');
                Append(text, paragraph);
                break;
            case BulletList list:
                text.Append('\n');
                foreach (Bullet item in list.Items)
                {
                    text.Append("- **").Append(MarkdownText.Inline(item.Lead)).Append(".** ").Append(MarkdownText.Inline(item.Text)).Append('\n');
                }

                break;
            case Table table:
                text.Append('\n');
                Append(text, table);
                break;
            case Picture picture when pictureFolder is not null:
                text.Append("\n![").Append(MarkdownText.Inline(picture.Caption)).Append("](<")
                    .Append(Link(pictureFolder, picture.FileName)).Append(">)\n");
                break;
        }
    }

    private static void Append(StringBuilder text, Paragraph paragraph)
    {
        switch (paragraph.Tone)
        {
            case Tone.Strong:
                text.Append("**").Append(MarkdownText.Inline(paragraph.Text).Trim()).Append("**\n");
                break;
            case Tone.Caution:
                text.Append("> **Caution.** ").Append(MarkdownText.Inline(paragraph.Text)).Append('\n');
                break;
            default:
                text.Append(MarkdownText.LineStart(paragraph.Text)).Append('\n');
                break;
        }
    }

    private static void Append(StringBuilder text, Table table)
    {
        int columns = table.Columns.Length;
        var lines = new List<string[]>(table.Rows.Length + 1);
        int[] widths = new int[columns];
        lines.Add(new string[columns]);
        for (int c = 0; c < columns; c++)
        {
            lines[0][c] = MarkdownText.Inline(table.Columns[c].Label);
        }

        foreach (TableRow row in table.Rows)
        {
            lines.Add(CellsOf(table.Columns, row));
        }

        foreach (string[] line in lines)
        {
            for (int c = 0; c < columns; c++)
            {
                widths[c] = Math.Max(widths[c], Math.Min(line[c].Length, WidestPadding));
            }
        }

        AppendRow(text, table.Columns, lines[0], widths);
        text.Append('|');
        for (int c = 0; c < columns; c++)
        {
            bool right = table.Columns[c].Align == Align.Right;
            text.Append('-', Math.Max(widths[c], 3) + (right ? 1 : 2)).Append(right ? ":|" : "|");
        }

        text.Append('\n');
        for (int i = 1; i < lines.Count; i++)
        {
            AppendRow(text, table.Columns, lines[i], widths);
        }
    }

    private static string[] CellsOf(ImmutableArray<Column> columns, TableRow row)
    {
        string[] cells = new string[columns.Length];
        for (int c = 0; c < cells.Length; c++)
        {
            string cell = columns[c].Verbatim ? MarkdownText.Verbatim(row.Cells[c]) : MarkdownText.Inline(row.Cells[c]).Trim();
            cells[c] = row.Stands && cell.Length > 0 ? $"**{cell}**" : cell;
        }

        return cells;
    }

    private static void AppendRow(StringBuilder text, ImmutableArray<Column> columns, string[] cells, int[] widths)
    {
        text.Append('|');
        for (int c = 0; c < cells.Length; c++)
        {
            int padding = Math.Max(0, Math.Max(widths[c], 3) - cells[c].Length);
            bool right = columns[c].Align == Align.Right;
            text.Append(' ').Append(' ', right ? padding : 0).Append(cells[c]).Append(' ', right ? 0 : padding).Append(" |");
        }

        text.Append('\n');
    }

    private static string Link(string folder, string file)
    {
        string path = folder.Length == 0 ? file : folder.TrimEnd('/') + "/" + file;
        return path.Replace("\\", "\\\\", StringComparison.Ordinal).Replace("<", "%3C", StringComparison.Ordinal)
            .Replace(">", "%3E", StringComparison.Ordinal).Replace('\n', ' ').Replace('\r', ' ');
    }
}
