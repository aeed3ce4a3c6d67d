using System.Text.Json;
using FtEstimate.Cli;
using FtEstimate.Tests.Files;

namespace FtEstimate.Tests.Cli;

/// <summary>What scripts rely on: names may be added, never changed.</summary>
public sealed class ReportFiguresTests
{
    private const double Hour = 3600;
    private const double Week = 7 * 24 * Hour;

    [Fact]
    public async Task Every_name_a_script_may_rely_on_is_there_with_its_type()
    {
        JsonElement figures = await Figures();

        Assert.Equal(JsonValueKind.String, figures.GetProperty("scenario").ValueKind);
        Assert.All(
            (string[])["atoms", "run_s", "elapsed_s", "round_s", "code_distance", "suppression", "failure_probability"],
            name => Assert.Equal(JsonValueKind.Number, figures.GetProperty("answer").GetProperty(name).ValueKind));
        Assert.All(
            (string[])["limited_by", "readout", "style"],
            name => Assert.NotEmpty(figures.GetProperty("answer").GetProperty(name).GetString()!));
        AssertRows(figures.GetProperty("cycle"), "phase", "start_s", "duration_s");
        AssertRows(figures.GetProperty("errors"), "channel", "per_round", "share");
        AssertRows(figures.GetProperty("other_machines"), null, "atoms", "run_s");
        AssertRow(figures.GetProperty("factory"), "name", "atoms", "rounds_per_output", "output_error", "count");
        Assert.Equal(JsonValueKind.Object, figures.GetProperty("atoms").ValueKind);
        Assert.Equal(JsonValueKind.Object, figures.GetProperty("clock").ValueKind);
        Assert.True(figures.TryGetProperty("range", out _));
    }

    // the field expects 1e4 to 1e6 atoms and hours to weeks for a first useful run of this size
    [Fact]
    public async Task The_demonstration_needs_a_believable_machine_for_a_believable_time()
    {
        JsonElement answer = (await Figures()).GetProperty("answer");

        Assert.InRange(answer.GetProperty("atoms").GetDouble(), 1e4, 1e6);
        Assert.InRange(answer.GetProperty("run_s").GetDouble(), Hour, 4 * Week);
        Assert.InRange(answer.GetProperty("elapsed_s").GetDouble(), answer.GetProperty("run_s").GetDouble(), 8 * Week);
        Assert.InRange(answer.GetProperty("failure_probability").GetDouble(), 0, 0.05);
    }

    [Fact]
    public async Task Figures_agree_with_one_another()
    {
        JsonElement figures = await Figures();
        JsonElement answer = figures.GetProperty("answer");
        JsonElement atoms = figures.GetProperty("atoms");

        Assert.Equal(1, figures.GetProperty("errors").EnumerateArray().Sum(error => error.GetProperty("share").GetDouble()), 9);
        Assert.Equal(
            answer.GetProperty("round_s").GetDouble(),
            figures.GetProperty("cycle").EnumerateArray()
                .Where(phase => !phase.GetProperty("beside").GetBoolean())
                .Sum(phase => phase.GetProperty("duration_s").GetDouble()),
            9);
        Assert.Equal(
            answer.GetProperty("atoms").GetDouble(),
            ((string[])["logical_qubits", "routing", "factories", "more_checks", "spares"]).Sum(name => atoms.GetProperty(name).GetDouble()),
            3);
        Assert.Contains(
            figures.GetProperty("other_machines").EnumerateArray(),
            machine => machine.GetProperty("atoms").GetDouble() == answer.GetProperty("atoms").GetDouble());
    }

    // more atoms must buy a shorter run, or the row is no offer
    [Fact]
    public async Task Along_the_other_machines_atoms_rise_and_the_run_gets_shorter()
    {
        JsonElement[] machines = [.. (await Figures()).GetProperty("other_machines").EnumerateArray()];

        Assert.True(machines.Length >= 3);
        Assert.All(machines.Zip(machines.Skip(1)), pair =>
        {
            Assert.True(pair.First.GetProperty("atoms").GetDouble() < pair.Second.GetProperty("atoms").GetDouble());
            Assert.True(pair.First.GetProperty("run_s").GetDouble() > pair.Second.GetProperty("run_s").GetDouble());
        });
    }

    private static async Task<JsonElement> Figures()
    {
        using TemporaryFolder folder = new();
        Assert.Equal(ExitStatus.Answer, (await CommandRun.FirstReportWith("--json", folder.At("r.json"))).Status);
        using JsonDocument json = JsonDocument.Parse(File.ReadAllText(folder.At("r.json")));
        return json.RootElement.Clone();
    }

    private static void AssertRows(JsonElement rows, string? text, params string[] numbers)
    {
        Assert.NotEqual(0, rows.GetArrayLength());
        Assert.All(rows.EnumerateArray(), row => AssertRow(row, text, numbers));
    }

    private static void AssertRow(JsonElement row, string? text, params string[] numbers)
    {
        if (text is not null)
        {
            Assert.NotEmpty(row.GetProperty(text).GetString()!);
        }

        Assert.All(numbers, name => Assert.Equal(JsonValueKind.Number, row.GetProperty(name).ValueKind));
    }
}
