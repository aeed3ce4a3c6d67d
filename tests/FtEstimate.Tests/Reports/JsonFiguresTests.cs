using System.Collections.Immutable;
using System.Globalization;
using System.Text.Json;
using System.Text.RegularExpressions;
using FtEstimate.MagicStates;
using FtEstimate.Noise;
using FtEstimate.Reports.Json;
using FtEstimate.Reports.Listings;
using FtEstimate.Reports.Writers;
using FtEstimate.Sizing;
using FtEstimate.SurfaceCode;
using FtEstimate.Workloads;

namespace FtEstimate.Tests.Reports;

public sealed class JsonFiguresTests
{
    [Fact]
    public void Figures_of_an_answer_are_as_approved() => Golden.Match(SixDigits(JsonFigures.Of(ReportScenarios.Answer)), "answer.json");

    [Fact]
    public void Figures_without_an_answer_are_as_approved() => Golden.Match(SixDigits(JsonFigures.Of(ReportScenarios.WithoutAnswer)), "no-answer.json");

    [Fact]
    public void An_answer_holds_the_figures_of_the_machine_in_full()
    {
        using JsonDocument json = JsonDocument.Parse(JsonFigures.Of(ReportScenarios.Answer));
        SizedMachine best = ReportScenarios.Answer.Best!;
        JsonElement answer = json.RootElement.GetProperty("answer");
        Assert.Equal(best.Atoms.Total, answer.GetProperty("atoms").GetDouble());
        Assert.Equal(best.RunSeconds, answer.GetProperty("run_s").GetDouble());
        Assert.Equal(best.Elapsed.Seconds, answer.GetProperty("elapsed_s").GetDouble());
        Assert.Equal(best.Clock.RoundSeconds, answer.GetProperty("round_s").GetDouble());
        Assert.Equal(best.Distance, answer.GetProperty("code_distance").GetInt32());
        Assert.Equal(best.Suppression.Factor, answer.GetProperty("suppression").GetDouble());
        Assert.Equal(best.Failure.Total, answer.GetProperty("failure_probability").GetDouble());
        Assert.All((string[])["limited_by", "readout", "style"], name => Assert.NotEmpty(answer.GetProperty(name).GetString()!));
        Assert.Equal(best.Factory!.Name, json.RootElement.GetProperty("factory").GetProperty("name").GetString());
        Assert.Equal(best.Phases.Length, json.RootElement.GetProperty("cycle").GetArrayLength());
        Assert.Equal(1, json.RootElement.GetProperty("errors").EnumerateArray().Sum(error => error.GetProperty("share").GetDouble()), 9);
        Assert.Equal(ReportScenarios.Answer.Unbeaten.Length, json.RootElement.GetProperty("other_machines").GetArrayLength());
    }

    [Fact]
    public void Without_an_answer_the_answer_is_null_and_every_cause_is_blamed()
    {
        using JsonDocument json = JsonDocument.Parse(JsonFigures.Of(ReportScenarios.AboveThreshold));
        Assert.Equal(JsonValueKind.Null, json.RootElement.GetProperty("answer").ValueKind);
        Assert.Equal(JsonValueKind.Null, json.RootElement.GetProperty("closest").ValueKind);
        JsonElement worst = json.RootElement.GetProperty("blame")[0];
        Assert.Equal("CZ gates", worst.GetProperty("channel").GetString());
        Assert.InRange(worst.GetProperty("needed").GetDouble(), 1e-5, worst.GetProperty("today").GetDouble());
    }

    [Fact]
    public void A_catalogue_lists_each_factory_in_both_forms()
    {
        NoiseStrength strength = NoiseStrength.Even(0.1);
        FactoryNoise noise = new(distance => PatchError.PerRound(ScalingLaws.Textbook, strength, distance), 1e-3);
        FactoryDesign design = FactoryDesign.OneLevel(new PatchDistances(17, 7, 7));
        ImmutableArray<CatalogueEntry> entries = [new(Factory.Of(design, noise), Dominated: false)];
        FactoryQuestion question = new("Factories", "textbook", strength, 1e-3);

        using JsonDocument json = JsonDocument.Parse(JsonFigures.Of(question, entries));
        JsonElement factory = json.RootElement.GetProperty("factories")[0];

        Assert.Equal("15-to-1:17,7,7", factory.GetProperty("name").GetString());
        Assert.Equal((17, 7, 7), (factory.GetProperty("dx").GetInt32(), factory.GetProperty("dz").GetInt32(), factory.GetProperty("dm").GetInt32()));

        // Litinski 2019 (arXiv:1905.06903), table 1: 4620 qubits, 42.6 cycles, 4.5e-8
        string text = MarkdownWriter.Write(FactoriesReport.Of(question, entries));
        Assert.Matches(@"`15-to-1:17,7,7` \|\s+4620 \|\s+42\.6 \|\s+42\.0 \|\s+4\.5e-8 ", text);
    }

    [Fact]
    public void A_workload_shows_its_derivations_and_what_rotations_cost()
    {
        Workload workload = ReportScenarios.Answer.Space.Scenario.Workload;
        using JsonDocument json = JsonDocument.Parse(JsonFigures.Of(workload));
        Assert.Equal(36, json.RootElement.GetProperty("logical_qubits").GetDouble());
        Assert.Equal(JsonValueKind.Null, json.RootElement.GetProperty("rotation_error").ValueKind);
        Assert.Equal(workload.Derivations.Length, json.RootElement.GetProperty("derivations").GetArrayLength());
        Assert.Equal(3, json.RootElement.GetProperty("synthesis").GetArrayLength());
        Golden.Match(MarkdownWriter.Write(WorkloadReport.Of(workload)), "workload.md");
    }

    /// <summary>Six digits of each number: the last ones may differ between processors.</summary>
    private static string SixDigits(string json) => Regex.Replace(
        json,
        @"(?<=: )-?\d+(\.\d+)?(E[-+]?\d+)?",
        number => double.Parse(number.Value, CultureInfo.InvariantCulture).ToString("G6", CultureInfo.InvariantCulture));
}
