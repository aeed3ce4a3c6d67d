using System.Text;
using CsCheck;
using FtEstimate.Reports.Documents;
using FtEstimate.Reports.Writers;
using Markdig;
using Markdig.Extensions.Tables;
using Markdig.Syntax;

namespace FtEstimate.Tests.Reports;

/// <summary>Held against a Markdown parser: whatever a name holds, the reader sees that name and nothing else.</summary>
public sealed class MarkdownTextTests
{
    private static readonly MarkdownPipeline Pipeline = new MarkdownPipelineBuilder().UsePipeTables().Build();

    private static readonly Gen<string> Hostile =
        Gen.Char["ab1. \\`*_[]()<>|~$&;#!-+=:/\"'{}\n\tµΛ"].Array[1, 30].Select(letters => new string(letters));

    [Fact]
    public void A_paragraph_reads_as_the_text_it_was_given() => Hostile.Sample(
        text => Assert.Equal(Normal(text), Normal(Markdown.ToPlainText(MarkdownText.LineStart(text), Pipeline))), iter: 5000);

    [Fact]
    public void A_paragraph_stays_one_paragraph() => Hostile.Where(text => Normal(text).Length > 0).Sample(
        text => Assert.IsType<ParagraphBlock>(Assert.Single(Markdown.Parse(MarkdownText.LineStart(text), Pipeline))), iter: 5000);

    [Fact]
    public void A_table_cell_reads_as_the_text_it_was_given() => Gen.Select(Hostile, Hostile).Sample(
        (left, right) =>
        {
            ParsedRow row = ParsedRow.Parse(left, right);
            Assert.Equal(2, row.Cells);
            Assert.Equal(Normal(left + " " + right), Normal(row.Text));
        },
        iter: 2000);

    [Theory]
    [InlineData("machine.gates.cz_error", "machine.gates.cz_error")]
    [InlineData("Λ = 3.0 at 5 %", "Λ = 3.0 at 5 %")]
    [InlineData("a > b", "a > b")]
    public void Ordinary_text_is_left_alone(string text, string expected) => Assert.Equal(expected, MarkdownText.LineStart(text));

    [Theory]
    [InlineData("15-to-1:13,5,5*6 > 15-to-1:29,11,13", "`15-to-1:13,5,5*6 > 15-to-1:29,11,13`")]
    [InlineData("a`b", "`` a`b ``")]
    [InlineData("a|b", "`a\\|b`")]
    public void Notation_is_kept_for_copying(string text, string expected) => Assert.Equal(expected, MarkdownText.Verbatim(text));

    /// <summary>White space and control characters count as one blank each run: Markdown folds them.</summary>
    private static string Normal(string text)
    {
        var folded = new StringBuilder();
        foreach (char letter in text)
        {
            bool blank = char.IsWhiteSpace(letter) || char.IsControl(letter);
            if (!blank)
            {
                folded.Append(letter);
            }
            else if (folded.Length > 0 && folded[^1] != ' ')
            {
                folded.Append(' ');
            }
        }

        return folded.ToString().Trim();
    }

    private sealed record ParsedRow(int Cells, string Text)
    {
        public static ParsedRow Parse(string left, string right)
        {
            FtEstimate.Reports.Documents.Table table = new([new Column("A"), new Column("B")], [new FtEstimate.Reports.Documents.TableRow([left, right])]);
            string markdown = MarkdownWriter.Write(new ReportDocument("t", [new ReportSection("s", [table])]));
            Markdig.Extensions.Tables.Table parsed = Markdown.Parse(markdown, Pipeline).OfType<Markdig.Extensions.Tables.Table>().Single();
            var row = (Markdig.Extensions.Tables.TableRow)parsed[1];
            string plain = Markdown.ToPlainText(markdown, Pipeline);
            return new ParsedRow(row.Count, plain[(plain.IndexOf('B', StringComparison.Ordinal) + 1)..]);
        }
    }
}
