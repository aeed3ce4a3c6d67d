using System.Globalization;
using System.Text.RegularExpressions;
using FtEstimate.Machines;
using FtEstimate.Quantities;
using FtEstimate.Reports.Documents;
using FtEstimate.Reports.Estimate;
using FtEstimate.Reports.Writers;
using FtEstimate.Scenarios;
using FtEstimate.Sizing;

namespace FtEstimate.Tests.Reports;

public sealed class EstimateReportTests
{
    private static readonly string[] Sections =
    [
        "Bottom line", "Syndrome cycle", "Error ledger", "Atom ledger", "Clock ledger", "Magic-state supply", "Other machines that would do",
        "How sure", "Inputs and sources", "Method and limits",
    ];

    [Fact]
    public void An_answer_reads_as_it_was_approved() =>
        Golden.Match(MarkdownWriter.Write(EstimateReport.Of(ReportScenarios.Answer)), "answer.md");

    [Fact]
    public void A_report_without_an_answer_reads_as_it_was_approved() =>
        Golden.Match(MarkdownWriter.Write(EstimateReport.Of(ReportScenarios.WithoutAnswer), pictureFolder: "figures"), "no-answer.md");

    [Fact]
    public void Every_section_is_there_whatever_the_outcome()
    {
        foreach (SizingResult result in ReportScenarios.All)
        {
            ReportDocument document = EstimateReport.Of(result);
            Assert.Equal(Sections, document.Sections.Select(section => section.Title));
            Assert.All(document.Sections, section => Assert.NotEmpty(section.Blocks));
        }
    }

    [Fact]
    public void The_first_sentence_gives_atoms_and_run_time()
    {
        SizedMachine best = ReportScenarios.Answer.Best!;
        Paragraph first = Assert.IsType<Paragraph>(EstimateReport.Of(ReportScenarios.Answer).Sections[0].Blocks[0]);
        Assert.Contains(Show.Atoms(best.Atoms.Total) + " atoms", first.Text, StringComparison.Ordinal);
        Assert.Contains(Show.Duration(best.RunSeconds), first.Text, StringComparison.Ordinal);
    }

    [Fact]
    public void Atoms_of_the_ledger_add_up_as_printed()
    {
        foreach (SizingResult result in ReportScenarios.All)
        {
            foreach (Table table in TablesWith(result, "What for"))
            {
                double[] atoms = Column(table, 1);
                Assert.Equal(atoms[^1], atoms[..^1].Sum());
                Assert.Equal(Math.Round((result.Best ?? result.NoAnswer!.Closest!).Atoms.Total), atoms[^1]);
            }
        }
    }

    [Fact]
    public void Phases_of_the_cycle_add_up_to_the_round_as_printed()
    {
        foreach (SizingResult result in ReportScenarios.All)
        {
            foreach (Table table in TablesWith(result, "Phase"))
            {
                bool[] beside = [.. table.Rows.Select(row => row.Cells[^1].Contains("beside", StringComparison.Ordinal))];
                double[] durations = Column(table, 2);
                double sum = durations[..^1].Where((_, row) => !beside[row]).Sum();

                // sums of decimals in binary are off by less than the last printed digit
                Assert.Equal(durations[^1], sum, 6);
            }
        }
    }

    [Fact]
    public void Shares_add_up_to_a_hundred_per_cent_as_printed()
    {
        foreach (SizingResult result in ReportScenarios.All)
        {
            foreach (string heading in (string[])["Cause of error", "What for", "Where from"])
            {
                foreach (Table table in TablesWith(result, heading).Where(table => table.Rows[^1].Stands))
                {
                    double[] shares = Column(table, table.Columns.Length - 1);
                    Assert.Equal(100, shares[..^1].Sum(), 6);
                }
            }
        }
    }

    [Fact]
    public void Expected_faults_add_up_as_printed()
    {
        foreach (SizingResult result in ReportScenarios.All)
        {
            foreach (Table table in TablesWith(result, "Where from"))
            {
                double[] faults = Column(table, 1);
                Assert.Equal(faults[^1], faults[..^1].Sum(), 9);
            }
        }
    }

    [Fact]
    public void Exactly_one_of_the_unbeaten_machines_is_marked_as_preferred()
    {
        Table table = TablesWith(ReportScenarios.Answer, "Atoms").Single();
        Assert.Equal(ReportScenarios.Answer.Unbeaten.Length, table.Rows.Length);
        Assert.Single(table.Rows, row => row.Stands);
    }

    [Fact]
    public void Trap_power_comes_with_the_laser_caution() =>
        Assert.Contains(
            Cautions(ReportScenarios.Answer),
            text => text.Contains("class 4", StringComparison.Ordinal) && text.Contains("laser-safety officer", StringComparison.Ordinal)
                && text.Contains("no design value", StringComparison.Ordinal));

    [Fact]
    public void More_than_one_optical_field_is_called_unlinked() =>
        Assert.Contains(Cautions(ReportScenarios.Answer), text => text.Contains("no link between fields is modelled", StringComparison.Ordinal));

    [Fact]
    public void An_abstract_machine_is_said_to_have_no_physical_cycle() =>
        Assert.Contains(Cautions(ReportScenarios.Abstract), text => text.Contains("no physical cycle stands behind", StringComparison.Ordinal));

    [Fact]
    public void A_run_that_does_not_finish_says_so_and_what_it_needs()
    {
        Running frail = new(MeanSecondsBetweenStops: 60, RestartSeconds: 60, StartSeconds: 0, CalibrationFraction: 0);
        Scenario scenario = ReportScenarios.SpinLattice(null, 1e-3);
        SizingResult result = ReportScenarios.Find(scenario with { Machine = scenario.Machine with { Running = frail } });
        Assert.False(result.Best!.Elapsed.FinishesInPractice);
        string needed = Show.Duration(result.Best.Elapsed.NeededSecondsBetweenStops);
        Assert.Contains(
            Cautions(result), text => text.Contains("does not finish in practice", StringComparison.Ordinal) && text.Contains(needed, StringComparison.Ordinal));
        Assert.DoesNotContain("on the wall clock.", ((Paragraph)EstimateReport.Of(result).Sections[0].Blocks[0]).Text, StringComparison.Ordinal);
    }

    [Fact]
    public void Inputs_without_a_source_are_marked_as_assumed()
    {
        Table table = TablesWith(ReportScenarios.Answer, "Input").Single(table => table.Columns.Length == 4);
        Assert.Equal("assumed", table.Rows.Single(row => row.Cells[0] == "machine.gates.cz_time_us").Cells[3]);
        Assert.Equal("0.27 µs", table.Rows.Single(row => row.Cells[0] == "machine.gates.cz_time_us").Cells[1]);
        Assert.Equal("bench log, 60 pairs", table.Rows.Single(row => row.Cells[0] == "machine.gates.cz_error").Cells[3]);
    }

    private static IEnumerable<Table> TablesWith(SizingResult result, string firstHeading) =>
        from section in EstimateReport.Of(result).Sections
        from table in section.Blocks.OfType<Table>()
        where table.Columns[0].Label == firstHeading
        select table;

    private static IEnumerable<string> Cautions(SizingResult result) =>
        from section in EstimateReport.Of(result).Sections
        from paragraph in section.Blocks.OfType<Paragraph>()
        where paragraph.Tone == Tone.Caution
        select paragraph.Text;

    /// <summary>The numbers of a column as a reader adds them; "less than" counts as nothing.</summary>
    private static double[] Column(Table table, int column) =>
    [
        .. table.Rows.Select(row => row.Cells[column].StartsWith('<') ? 0 : double.Parse(
            Regex.Match(row.Cells[column], @"^[\d,.]+(e-?\d+)?").Value, NumberStyles.Float | NumberStyles.AllowThousands, CultureInfo.InvariantCulture)),
    ];
}
