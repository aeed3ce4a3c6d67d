using System.Globalization;
using System.Text.RegularExpressions;
using FtEstimate.Cli;
using FtEstimate.Tests.Files;

namespace FtEstimate.Tests.Cli;

public sealed class ReportCommandTests
{
    private static readonly string[] Sections =
    [
        "Bottom line", "Syndrome cycle", "Error ledger", "Atom ledger", "Clock ledger", "Magic-state supply", "Other machines that would do",
        "How sure", "Inputs and sources", "Method and limits",
    ];

    [Fact]
    public async Task The_demonstration_is_answered_with_all_sections_in_order_and_nothing_on_standard_error()
    {
        CommandRun run = await CommandRun.FirstReportWith();

        Assert.Equal(ExitStatus.Answer, run.Status);
        Assert.Empty(run.Error);
        Assert.Equal(Sections, Regex.Matches(run.Output, "^## (.+)$", RegexOptions.Multiline).Select(match => match.Groups[1].Value));
    }

    // the README shows two of the three columns of the table
    [Fact]
    public async Task The_excerpt_in_the_readme_is_what_the_report_says()
    {
        string report = (await CommandRun.FirstReportWith()).Output;
        string[] excerpt = [.. File.ReadLines(RepositoryFiles.At("README.md")).Where(line => line.StartsWith("> ", StringComparison.Ordinal))];

        Assert.True(excerpt.Length > 15);
        foreach (string line in excerpt.Select(line => line[2..]).Where(line => !line.StartsWith("|--", StringComparison.Ordinal) && line != "**Bottom line**"))
        {
            Assert.Contains(line.StartsWith('|') ? line[..^1].TrimEnd() : line, report, StringComparison.Ordinal);
        }
    }

    [Fact]
    public async Task Pictures_are_written_beside_the_report_and_every_link_finds_its_picture()
    {
        using TemporaryFolder folder = new();

        CommandRun run = await CommandRun.FirstReportWith("--out", folder.At("my report.md"));

        Assert.Equal((ExitStatus.Answer, "", ""), (run.Status, run.Output, run.Error));
        string[] links = [.. Regex.Matches(File.ReadAllText(folder.At("my report.md")), @"\]\(<(.+?)>\)").Select(match => match.Groups[1].Value)];
        string[] pictures = [.. Directory.GetFiles(folder.At("my report-pictures")).Select(path => "my report-pictures/" + Path.GetFileName(path))];
        Assert.NotEmpty(links);
        Assert.Equal(pictures.Order(StringComparer.Ordinal), links.Order(StringComparer.Ordinal));
        Assert.All(links, link => Assert.Contains("</svg>", File.ReadAllText(folder.At(link)), StringComparison.Ordinal));
    }

    [Fact]
    public async Task Standard_output_links_to_no_pictures_since_none_are_written() =>
        Assert.DoesNotContain("![", (await CommandRun.FirstReportWith()).Output, StringComparison.Ordinal);

    [Fact]
    public async Task The_page_is_one_file_with_its_pictures_inside_and_loads_nothing_from_elsewhere()
    {
        using TemporaryFolder folder = new();

        await CommandRun.FirstReportWith("--html", folder.At("page.html"));

        string page = File.ReadAllText(folder.At("page.html"));
        Assert.Equal([folder.At("page.html")], Directory.GetFileSystemEntries(folder.Root));
        Assert.Equal(3, Regex.Count(page, "<svg[ >]"));
        Assert.All(Sections, section => Assert.Contains($"<h2>{section}</h2>", page, StringComparison.Ordinal));
        Assert.DoesNotMatch(@"<(script|link|img|iframe|object|embed)\b", page);
        Assert.DoesNotMatch(@"@import|url\(\s*[""']?(?!#)", page);
        Assert.DoesNotMatch(@"\b(src|(xlink:)?href)\s*=\s*[""'](?!#)", page);
    }

    [Fact]
    public async Task The_same_question_gives_the_same_bytes_whatever_the_culture()
    {
        Outputs first = await WrittenUnder(CultureInfo.InvariantCulture);

        Assert.Equal(first, await WrittenUnder(CultureInfo.InvariantCulture));
        Assert.Equal(first, await WrittenUnder(GermanNumbers));
        Assert.Equal(first, await WrittenUnder(FrenchNumbers));
    }

    [Fact]
    public async Task A_setting_changes_the_answer_and_the_report_names_it_as_the_source()
    {
        CommandRun plain = await CommandRun.FirstReportWith();
        CommandRun better = await CommandRun.FirstReportWith("--set", "machine.gates.cz_error=8e-4");

        Assert.Equal(ExitStatus.Answer, better.Status);
        string row = RowOf(better.Output, "`machine.gates.cz_error`");
        Assert.Contains(" 8e-4 ", row, StringComparison.Ordinal);
        Assert.Contains("--set on the command line", row, StringComparison.Ordinal);
        Assert.True(AtomsOf(better.Output) < AtomsOf(plain.Output));
    }

    [Fact]
    public async Task The_last_of_two_settings_of_one_input_counts()
    {
        CommandRun one = await CommandRun.FirstReportWith("--set", "machine.gates.cz_error=8e-4");
        CommandRun two = await CommandRun.FirstReportWith("--set", "machine.gates.cz_error=2e-3", "--set", "machine.gates.cz_error=8e-4");

        Assert.Equal(one.Output, two.Output);
    }

    [Fact]
    public async Task A_report_replaces_an_older_one_in_full()
    {
        using TemporaryFolder folder = new();
        string path = folder.Write("r.md", new string('x', 1_000_000));

        await CommandRun.FirstReportWith("--out", path);

        Assert.StartsWith("# Spin lattice on the Brindle Fell array\n", File.ReadAllText(path), StringComparison.Ordinal);
        Assert.DoesNotContain("xxxx", File.ReadAllText(path), StringComparison.Ordinal);
        Assert.Equal(2, Directory.GetFileSystemEntries(folder.Root).Length);
    }

    // the program is built without the data of cultures, so these two are made by hand
    private static CultureInfo GermanNumbers => Numbers(",", ".");

    private static CultureInfo FrenchNumbers => Numbers(",", "\u202f");

    private static CultureInfo Numbers(string decimalMark, string groupMark)
    {
        CultureInfo culture = (CultureInfo)CultureInfo.InvariantCulture.Clone();
        culture.NumberFormat.NumberDecimalSeparator = decimalMark;
        culture.NumberFormat.NumberGroupSeparator = groupMark;
        culture.NumberFormat.PercentDecimalSeparator = decimalMark;
        culture.NumberFormat.NegativeSign = "\u2212";
        Assert.Equal($"1{decimalMark}5", 1.5.ToString(culture));
        return culture;
    }

    private static async Task<Outputs> WrittenUnder(CultureInfo culture)
    {
        CultureInfo before = CultureInfo.CurrentCulture;
        try
        {
            CultureInfo.CurrentCulture = culture;
            using TemporaryFolder folder = new();
            await CommandRun.FirstReportWith("--out", folder.At("r.md"), "--html", folder.At("r.html"), "--json", folder.At("r.json"));
            string[] pictures = [.. Directory.GetFiles(folder.At("r-pictures")).Order(StringComparer.Ordinal).Select(File.ReadAllText)];
            return new Outputs(
                File.ReadAllText(folder.At("r.md")), File.ReadAllText(folder.At("r.html")), File.ReadAllText(folder.At("r.json")), string.Concat(pictures));
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    private static string RowOf(string report, string cell) =>
        report.Split('\n').Single(line => line.StartsWith($"| {cell} ", StringComparison.Ordinal));

    private static double AtomsOf(string report) =>
        double.Parse(Regex.Match(report, @"\*\*([\d,]+) atoms").Groups[1].Value, NumberStyles.AllowThousands, CultureInfo.InvariantCulture);

    private sealed record Outputs(string Markdown, string Page, string Figures, string Pictures);
}
