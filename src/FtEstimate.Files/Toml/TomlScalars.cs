using System.Globalization;
using Tomlyn.Syntax;

namespace FtEstimate.Files.Toml;

/// <summary>Values of one token.</summary>
internal static class TomlScalars
{
    /// <summary>The value of the token, or null when the token is none.</summary>
    public static TomlLeaf? Read(TomlTokens tokens, Place place) => tokens.Kind switch
    {
        TokenKind.String or TokenKind.StringMulti or TokenKind.StringLiteral or TokenKind.StringLiteralMulti =>
            OfText(place, tokens.Text),
        TokenKind.Integer or TokenKind.IntegerHexa or TokenKind.IntegerOctal or TokenKind.IntegerBinary =>
            OfNumber(place, unchecked((long)tokens.Data)),
        TokenKind.Float or TokenKind.Infinite or TokenKind.PositiveInfinite or TokenKind.NegativeInfinite
            or TokenKind.Nan or TokenKind.PositiveNan or TokenKind.NegativeNan =>
            OfNumber(place, BitConverter.UInt64BitsToDouble(tokens.Data)),
        TokenKind.True => OfFlag(place, true),
        TokenKind.False => OfFlag(place, false),
        TokenKind.OffsetDateTimeByZ or TokenKind.OffsetDateTimeByNumber or TokenKind.LocalDateTime
            or TokenKind.LocalDate or TokenKind.LocalTime => new TomlLeaf(place, "a date or time"),
        _ => null,
    };

    /// <summary>A text.</summary>
    public static TomlLeaf OfText(Place place, string text) =>
        new(place, $"the text \"{(text.Length <= 40 ? text : text[..40] + "…")}\"") { Text = text };

    /// <summary>A number.</summary>
    public static TomlLeaf OfNumber(Place place, double number) =>
        new(place, number.ToString("R", CultureInfo.InvariantCulture)) { Number = number };

    /// <summary>A flag.</summary>
    public static TomlLeaf OfFlag(Place place, bool flag) => new(place, flag ? "true" : "false") { Flag = flag };

    /// <summary>Why a token is no value.</summary>
    public static string Unexpected(TomlTokens tokens) => tokens.Kind switch
    {
        TokenKind.NewLine or TokenKind.Eof => "expected a value before the end of the line",
        TokenKind.Invalid => $"unexpected {tokens.Text}; texts stand in quotes, numbers look like 0.5 or 5e-3",
        _ => $"unexpected {tokens.Text}; expected a value",
    };
}
