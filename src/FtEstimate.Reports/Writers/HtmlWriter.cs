using System.Net;
using System.Text;
using FtEstimate.Reports.Documents;
using Markdig;

namespace FtEstimate.Reports.Writers;

/// <summary>Writes a report as one self-contained page: text through Markdown, pictures inline, a style sheet for screen, phone and print.</summary>
public static class HtmlWriter
{
    // HTML inside the text stays text; only the pictures, drawn here, are placed as they are
    private static readonly MarkdownPipeline Pipeline = new MarkdownPipelineBuilder().UsePipeTables().DisableHtml().Build();

    /// <summary>The whole page.</summary>
    public static string Write(ReportDocument document)
    {
        string title = WebUtility.HtmlEncode(document.Title);
        var page = new StringBuilder(65_536);
        page.Append("<!DOCTYPE html>\n<html lang=\"en\">\n<head>\n<meta charset=\"utf-8\">\n")
            .Append("<meta name=\"viewport\" content=\"width=device-width, initial-scale=1\">\n")
            .Append("<title>").Append(title).Append("</title>\n<style>\n").Append(PageStyle.Css).Append("</style>\n</head>\n<body>\n<main>\n<h1>")
            .Append(title).Append("</h1>\n");
        foreach (ReportSection section in document.Sections)
        {
            page.Append("<section>\n<h2>").Append(WebUtility.HtmlEncode(section.Title)).Append("</h2>\n");
            Append(page, section);
            page.Append("</section>\n");
        }

        return page.Append("</main>\n</body>\n</html>\n").ToString();
    }

    private static void Append(StringBuilder page, ReportSection section)
    {
        var text = new StringBuilder();
        foreach (Block block in section.Blocks)
        {
            if (block is Picture picture)
            {
                AppendText(page, text);
                page.Append("<figure id=\"").Append(WebUtility.HtmlEncode(picture.Id)).Append("\">\n").Append(picture.Svg())
                    .Append("\n<figcaption>").Append(WebUtility.HtmlEncode(picture.Caption)).Append("</figcaption>\n</figure>\n");
            }
            else
            {
                MarkdownWriter.Append(text, block, pictureFolder: null);
            }
        }

        AppendText(page, text);
    }

    private static void AppendText(StringBuilder page, StringBuilder text)
    {
        if (text.Length > 0)
        {
            // every < of the text is escaped, so these can only be tags of the tables
            page.Append(Markdown.ToHtml(text.ToString(), Pipeline)
                .Replace("<table>", "<div class=\"wide\"><table>", StringComparison.Ordinal)
                .Replace("</table>", "</table></div>", StringComparison.Ordinal));
            text.Clear();
        }
    }
}
