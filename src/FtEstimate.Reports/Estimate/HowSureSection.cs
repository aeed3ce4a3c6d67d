using FtEstimate.Reports.Documents;
using FtEstimate.Scenarios;

namespace FtEstimate.Reports.Estimate;

/// <summary>The ranges of the inputs.</summary>
internal static class HowSureSection
{
    /// <summary>Heading of the section.</summary>
    public const string Title = "How sure";

    /// <summary>The section.</summary>
    public static ReportSection Of(InputSet inputs)
    {
        TableBuilder table = new(
            new Column("Input", Verbatim: true),
            new Column("Low", Align.Right),
            new Column("Likely", Align.Right),
            new Column("High", Align.Right),
            new Column("Unit"),
            new Column("Source"));
        int stated = 0;
        foreach (Input input in inputs.InOrder)
        {
            if (input.Number is { } likely && (input.Low ?? input.High) is not null)
            {
                stated++;
                table.Add(
                    input.Path,
                    InputText.Number(input.Low ?? likely),
                    InputText.Number(likely),
                    InputText.Number(input.High ?? likely),
                    KeyUnit.Of(input.Path),
                    InputText.Source(input));
            }
        }

        return stated == 0
            ? new ReportSection(Title, [new Paragraph("No input states a range, so the estimate carries none. Give low, likely and high values where you know them.")])
            : new ReportSection(
                Title,
                [
                    new Paragraph(
                        "These inputs state a range: one true value in ten is expected below the low value, and one in ten above the high one. " +
                        "The estimate uses the likely values. The effect of the ranges on atoms and time is not propagated yet."),
                    table.Build(),
                ]);
    }
}
