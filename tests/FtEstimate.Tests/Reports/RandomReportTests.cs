using CsCheck;
using FtEstimate.Machines;
using FtEstimate.MagicStates;
using FtEstimate.Reports.Documents;
using FtEstimate.Reports.Estimate;
using FtEstimate.Reports.Json;
using FtEstimate.Reports.Writers;
using FtEstimate.Scenarios;
using FtEstimate.Sizing;
using FtEstimate.Workloads;

namespace FtEstimate.Tests.Reports;

public sealed class RandomReportTests
{
    private static readonly FactoryCatalogue Catalogue = new();

    private static readonly Gen<Scenario> AnyScenario =
        from czError in Gen.Double[-4, -1.7].Select(exponent => Math.Pow(10, exponent))
        from delivered in OneOf<double?>(null, 1e4, 1e7)
        from banks in Gen.Bool
        from style in OneOf<string?>(null, "lattice-surgery", "transversal")
        from qubits in Gen.Double[0, 3].Select(exponent => Math.Round(Math.Pow(10, exponent)))
        from tStates in Gen.OneOf(Gen.Const(0.0), Gen.Double[0, 11].Select(exponent => Math.Pow(10, exponent)))
        from rotations in OneOf(0, 1, 1e6)
        from between in OneOf<double?>(null, 60, 1e6)
        from failure in OneOf(1e-6, 0.05, 0.9)
        let scenario = ReportScenarios.SpinLattice(delivered, czError, banks ? ReportScenarios.SecondSpecies() : null, style: style)
        select scenario with
        {
            Workload = new Workload("drawn", qubits, tStates, 0, rotations, null, null, null, null, 1, []),
            Machine = scenario.Machine with { Running = new Running(between, 3600, 600, 0.1) },
            Goal = new Goal(failure, Preference.LeastAtomHours, null, null),
        };

    [Fact]
    public void No_output_holds_a_number_that_is_none() => AnyScenario.Sample(
        scenario =>
        {
            SizingResult result = new MachineSizing(Catalogue).Find(scenario);
            ReportDocument document = EstimateReport.Of(result);
            string text = MarkdownWriter.Write(document) + JsonFigures.Of(result) + string.Concat(document.Pictures.Select(picture => picture.Svg()));
            Assert.DoesNotMatch("NaN|∞|Infinity|n/a", text);
        },
        iter: 40,
        threads: 1);

    private static Gen<T> OneOf<T>(params T[] choices) => Gen.Int[0, choices.Length - 1].Select(index => choices[index]);
}
