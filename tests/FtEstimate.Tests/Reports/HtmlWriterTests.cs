using System.Text.RegularExpressions;
using System.Xml.Linq;
using FtEstimate.Reports.Documents;
using FtEstimate.Reports.Estimate;
using FtEstimate.Reports.Writers;
using FtEstimate.Scenarios;
using FtEstimate.Sizing;

namespace FtEstimate.Tests.Reports;

public sealed class HtmlWriterTests
{
    private static readonly string[] TextElements =
    [
        "html", "head", "meta", "title", "style", "body", "main", "section", "h1", "h2", "p", "ul", "li", "strong", "code", "blockquote", "div", "table",
        "thead", "tbody", "tr", "th", "td", "figure", "figcaption", "br",
        "svg", "g", "rect", "line", "polyline", "polygon", "path", "ellipse", "text", "defs", "clipPath", "tspan",
    ];

    [Fact]
    public void Hostile_names_are_inert()
    {
        Scenario scenario = ReportScenarios.Answer.Space.Scenario;
        Scenario hostile = scenario with
        {
            Title = ReportScenarios.HostileName,
            Machine = scenario.Machine with { Name = ReportScenarios.HostileName },
            Workload = scenario.Workload with { Name = ReportScenarios.HostileName },
            Inputs = new InputSet([new Input("machine.`|<b>x", Text: ReportScenarios.HostileName, Source: ReportScenarios.HostileName)]),
        };
        SizingResult result = ReportScenarios.Answer with { Space = ReportScenarios.Answer.Space with { Scenario = hostile } };

        string page = HtmlWriter.Write(EstimateReport.Of(result));

        Assert.All(Elements(page), element => Assert.Contains(element.Groups[1].Value, TextElements));
        Assert.All(Elements(page), element => Assert.DoesNotMatch(@"\son\w+\s*=|javascript:", element.Value));
        Assert.Equal(1, Regex.Count(page, "<title>"));
        Assert.Contains("&lt;script&gt;alert(1)&lt;/script&gt;", page, StringComparison.Ordinal);
    }

    [Fact]
    public void A_page_needs_nothing_from_elsewhere()
    {
        string page = HtmlWriter.Write(EstimateReport.Of(ReportScenarios.Answer));
        Assert.DoesNotMatch(@"<(link|script|img|iframe)|url\(http|src=|href=""http", page);
        Assert.Contains("<meta name=\"viewport\"", page, StringComparison.Ordinal);
        Assert.Equal(3, Regex.Count(page, "<svg "));
    }

    [Fact]
    public void Every_table_can_be_scrolled_and_keeps_its_rows()
    {
        ReportDocument document = EstimateReport.Of(ReportScenarios.TwoBanks);
        string page = HtmlWriter.Write(document);
        int tables = document.Sections.Sum(section => section.Blocks.OfType<Table>().Count());
        int rows = document.Sections.Sum(section => section.Blocks.OfType<Table>().Sum(table => table.Rows.Length + 1));
        Assert.Equal(tables, Regex.Count(page, "<div class=\"wide\"><table>"));
        Assert.Equal(rows, Regex.Count(page, "<tr>"));
    }

    [Fact]
    public void Ids_of_pictures_do_not_clash_on_a_page()
    {
        string page = HtmlWriter.Write(EstimateReport.Of(ReportScenarios.Answer));
        string[] ids = [.. Regex.Matches(page, @"\sid=""([^""]+)""").Select(match => match.Groups[1].Value)];
        Assert.Equal(ids.Distinct(), ids);
        Assert.All(Regex.Matches(page, @"url\(#([^)]+)\)"), link => Assert.Contains(link.Groups[1].Value, ids));
    }

    [Fact]
    public void Pictures_are_the_same_bytes_each_time_and_well_formed()
    {
        foreach (SizingResult result in ReportScenarios.All)
        {
            foreach (Picture picture in EstimateReport.Of(result).Pictures)
            {
                string svg = picture.Svg();
                Assert.Equal(svg, picture.Svg());
                Assert.Equal("svg", XDocument.Parse(svg).Root!.Name.LocalName);
                Assert.DoesNotMatch(@"\n\s*\n", svg);
            }
        }
    }

    private static MatchCollection Elements(string page) => Regex.Matches(page, @"<([a-zA-Z][\w]*)[^>]*>");
}
