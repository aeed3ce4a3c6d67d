using System.Collections.Immutable;
using System.Globalization;
using FtEstimate.Reports.Documents;

namespace FtEstimate.Reports.Listings;

/// <summary>One of our numbers beside the published one.</summary>
/// <param name="Topic">Heading it belongs to.</param>
/// <param name="Subject">What was computed.</param>
/// <param name="Figure">Which figure of it.</param>
/// <param name="Ours">Our value, in SI units.</param>
/// <param name="Published">The published value.</param>
/// <param name="AsPrinted">The published value with the digits it has in print.</param>
/// <param name="Source">First author, year, arXiv number.</param>
/// <param name="Remark">Why the two may differ; empty: no remark.</param>
public sealed record ValidationRow(
    string Topic, string Subject, string Figure, double Ours, double Published, string AsPrinted, string Source, string Remark);

/// <summary>Our numbers beside the published ones, topic by topic.</summary>
public static class ValidationReport
{
    private const string Digits = "G5";

    /// <summary>The page.</summary>
    /// <param name="rows">The rows, those of a topic one after another.</param>
    public static ReportDocument Of(ImmutableArray<ValidationRow> rows)
    {
        var sections = ImmutableArray.CreateBuilder<ReportSection>();
        sections.Add(new ReportSection(
            "How to read this page",
            [
                new Paragraph(
                    "Each row is computed by the tool and held against a published number. The page is made by the command “validation”; " +
                    "a test fails when it is out of date. Units are SI. A deviation is ours relative to the published number."),
                new Paragraph("Remarks say why the two differ where they do. Nothing is tuned to make a row agree."),
            ]));
        int start = 0;
        while (start < rows.Length)
        {
            int end = start;
            while (end < rows.Length && rows[end].Topic == rows[start].Topic)
            {
                end++;
            }

            sections.Add(new ReportSection(rows[start].Topic, [TableOf(rows.AsSpan()[start..end])]));
            start = end;
        }

        return new ReportDocument("Validation: our numbers beside the published ones", sections.ToImmutable());
    }

    private static Table TableOf(ReadOnlySpan<ValidationRow> rows)
    {
        TableBuilder table = new(
            new Column("Subject", Verbatim: true),
            new Column("Figure", Verbatim: true),
            new Column("Ours", Align.Right),
            new Column("Published", Align.Right),
            new Column("Deviation", Align.Right),
            new Column("Source"),
            new Column("Remark"));
        foreach (ValidationRow row in rows)
        {
            table.Add(
                row.Subject,
                row.Figure,
                Ours(row.Ours),
                row.AsPrinted,
                Deviation(row),
                row.Source,
                row.Remark);
        }

        return table.Build();
    }

    private static string Ours(double value) => value
        .ToString(Digits, CultureInfo.InvariantCulture)
        .Replace("E+0", "e", StringComparison.Ordinal)
        .Replace("E-0", "e-", StringComparison.Ordinal)
        .Replace('E', 'e');

    private static string Deviation(ValidationRow row)
    {
        double relative = (row.Ours - row.Published) / row.Published;
        return relative.ToString("+0.0 %;−0.0 %;0.0 %", CultureInfo.InvariantCulture);
    }
}
