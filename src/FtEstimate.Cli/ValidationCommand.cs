using System.Collections.Immutable;
using System.CommandLine;
using FtEstimate.Files.Comparisons;
using FtEstimate.Reports.Listings;

namespace FtEstimate.Cli;

/// <summary>`validation FOLDER`: our numbers beside the published ones; makes docs/validation.md.</summary>
internal static class ValidationCommand
{
    /// <summary>The command.</summary>
    public static Command Create()
    {
        Argument<string> folder = new("folder") { Description = $"Folder with {ComparisonTable.FileName} and its scenarios" };
        Option<string?> file = new("--out") { Description = "Write the page to FILE instead of standard output", HelpName = "FILE" };
        Command command = new("validation", "Our numbers beside the published ones") { folder, file };
        command.SetAction(parsed =>
        {
            TextWriter error = parsed.InvocationConfiguration.Error;
            string where = parsed.GetRequiredValue(folder);
            OutputPlaces places = new(parsed.GetValue(file), null, null);
            ComparisonReading reading = ComparisonTable.Read(where);
            if (FaultOutput.Stop([.. reading.Faults, .. places.Faults([Path.Combine(where, ComparisonTable.FileName)])], error))
            {
                return ExitStatus.WrongInput;
            }

            bool written = ReportOutput.Write(
                ValidationReport.Of(Rows(reading.Comparisons)),
                () => "{}",
                places,
                parsed.InvocationConfiguration.Output,
                error);
            return written ? ExitStatus.Answer : ExitStatus.WrongInput;
        });
        return command;
    }

    private static ImmutableArray<ValidationRow> Rows(ImmutableArray<Comparison> comparisons) =>
    [
        .. comparisons.Select(comparison => new ValidationRow(
            comparison.Figure.Topic,
            comparison.Figure.Subject,
            comparison.Figure.Figure,
            comparison.Ours,
            comparison.Figure.Published,
            comparison.Figure.AsPrinted,
            comparison.Figure.Source,
            comparison.Figure.Remark)),
    ];
}
