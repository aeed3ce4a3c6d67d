using System.Text;

namespace FtEstimate.Reports.Writers;

/// <summary>Plain text as Markdown that shows exactly that text: nothing in a name can become markup.</summary>
internal static class MarkdownText
{
    /// <summary>Text inside a line.</summary>
    public static string Inline(string text)
    {
        var escaped = new StringBuilder(text.Length + 8);
        for (int i = 0; i < text.Length; i++)
        {
            char letter = text[i];
            if (IsBreak(letter))
            {
                escaped.Append(' ');
                continue;
            }

            if (NeedsEscape(text, i))
            {
                escaped.Append('\\');
            }

            escaped.Append(letter);
        }

        return escaped.ToString();
    }

    /// <summary>Text that starts a line, where a few more characters mean something.</summary>
    public static string LineStart(string text)
    {
        string trimmed = Inline(text.TrimStart()).Trim();
        int digits = 0;
        while (digits < trimmed.Length && char.IsAsciiDigit(trimmed[digits]))
        {
            digits++;
        }

        bool endsNumber = digits < trimmed.Length && (trimmed[digits] is '.' or ')');
        bool numbered = digits > 0 && endsNumber && (digits + 1 == trimmed.Length || trimmed[digits + 1] == ' ');
        return numbered ? string.Concat(trimmed.AsSpan(0, digits), "\\", trimmed.AsSpan(digits))
            : trimmed.Length > 0 && trimmed[0] is '-' or '+' or '#' or '=' or '~' or ':' ? "\\" + trimmed
            : trimmed;
    }

    /// <summary>Text to be copied as it is; inside a table a pipe still ends the cell and is escaped.</summary>
    public static string Verbatim(string text)
    {
        if (text.Length == 0)
        {
            return text;
        }

        var content = new StringBuilder(text.Length + 4);
        int run = 0;
        int longest = 0;
        foreach (char letter in text)
        {
            run = letter == '`' ? run + 1 : 0;
            longest = Math.Max(longest, run);
            content.Append(letter == '|' ? "\\|" : IsBreak(letter) ? " " : letter.ToString());
        }

        string fence = new('`', longest + 1);
        return longest > 0 ? $"{fence} {content} {fence}" : $"{fence}{content}{fence}";
    }

    private static bool NeedsEscape(string text, int index) => text[index] switch
    {
        '\\' or '`' or '*' or '[' or ']' or '<' or '|' or '~' or '$' => true,
        '>' => index == 0,
        '&' => index + 1 < text.Length && (char.IsAsciiLetter(text[index + 1]) || text[index + 1] == '#'),
        '_' => !(index > 0 && index + 1 < text.Length && char.IsLetterOrDigit(text[index - 1]) && char.IsLetterOrDigit(text[index + 1])),
        _ => false,
    };

    // line and page breaks, control characters and the Unicode line separators would leave the line
    private static bool IsBreak(char letter) => char.IsControl(letter) || letter is '\u2028' or '\u2029';
}
