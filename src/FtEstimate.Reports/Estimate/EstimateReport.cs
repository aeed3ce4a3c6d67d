using FtEstimate.Reports.Documents;
using FtEstimate.Sizing;

namespace FtEstimate.Reports.Estimate;

/// <summary>The report on a sizing: how many atoms, how long, and why; or why not.</summary>
public static class EstimateReport
{
    /// <summary>The report.</summary>
    /// <param name="result">The sizing, with an answer or with the reason why there is none.</param>
    public static ReportDocument Of(SizingResult result)
    {
        Subject subject = new(result);
        return new ReportDocument(
            result.Space.Scenario.Title,
            [
                result.Best is { } best ? BottomLineSection.Of(subject, best) : NoAnswerSection.Of(subject, result.NoAnswer!),
                CycleSection.Of(subject),
                ErrorSection.Of(subject),
                AtomSection.Of(subject),
                ClockSection.Of(subject),
                MagicStateSection.Of(subject),
                OtherMachinesSection.Of(subject),
                HowSureSection.Of(result.Space.Scenario.Inputs),
                InputsSection.Of(result.Space.Scenario),
                MethodSection.Of(subject),
            ]);
    }
}
