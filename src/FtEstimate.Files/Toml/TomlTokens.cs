using Tomlyn.Parsing;
using Tomlyn.Syntax;

namespace FtEstimate.Files.Toml;

/// <summary>The tokens of a TOML text without blanks and comments; can start again at a later line after a fault.</summary>
internal sealed class TomlTokens
{
    private readonly string _text;
    private TomlLexer _lexer;
    private TomlToken _token;
    private int _linesBefore;

    public TomlTokens(string text)
    {
        _text = text;
        _lexer = NewLexer(text);
    }

    /// <summary>The kind of the token.</summary>
    public TokenKind Kind { get; private set; } = TokenKind.NewLine;

    /// <summary>Line of the token, from 1.</summary>
    public int Line => _linesBefore + _token.Start.Line + 1;

    /// <summary>Column of the token, from 1.</summary>
    public int Column => _token.Start.Column + 1;

    /// <summary>The decoded text of a string, the raw text of other tokens.</summary>
    public string Text => _token.StringValue ?? _lexer.GetText(_token) ?? "";

    /// <summary>The bits of a number.</summary>
    public ulong Data => _token.Data;

    /// <summary>Whether the text up to here breaks the rules for tokens.</summary>
    public bool HasError => _lexer.HasErrors;

    /// <summary>What is wrong with the token, or null.</summary>
    public string? Error => FirstError is not DiagnosticMessage error ? null : IsBrokenString
        ? "the text has no closing quote on its line"
        : error.Message.StartsWith("Unable to parse integer", StringComparison.Ordinal)
            ? "the whole number is too long; write it as a decimal such as 1e20"
            : error.Message;

    /// <summary>Line of the fault, from 1.</summary>
    public int ErrorLine => FirstError is DiagnosticMessage error && !IsBrokenString ? _linesBefore + error.Span.Start.Line + 1 : Line;

    /// <summary>Column of the fault, from 1.</summary>
    public int ErrorColumn => FirstError is DiagnosticMessage error && !IsBrokenString ? error.Span.Start.Column + 1 : Column;

    private DiagnosticMessage? FirstError => _lexer.HasErrors ? _lexer.Errors.FirstOrDefault() : null;

    private bool IsBrokenString =>
        Kind is TokenKind.String or TokenKind.StringLiteral && _token.End.Line > _token.Start.Line;

    /// <summary>Goes to the next token.</summary>
    /// <param name="mode">Whether keys or values are expected there: 1 is a key and a number.</param>
    public void Next(TomlLexerMode mode)
    {
        _lexer.Mode = mode;
        do
        {
            if (!_lexer.MoveNext())
            {
                Kind = TokenKind.Eof;
                return;
            }

            _token = _lexer.Current;
            Kind = _token.Kind;
        }
        while (Kind is TokenKind.Whitespaces or TokenKind.Comment);
    }

    /// <summary>Goes to the next token that is no end of line.</summary>
    public void NextBeyondLines(TomlLexerMode mode)
    {
        Next(mode);
        SkipLines(mode);
    }

    /// <summary>Stays, or goes to the next token that is no end of line.</summary>
    public void SkipLines(TomlLexerMode mode)
    {
        while (Kind == TokenKind.NewLine)
        {
            Next(mode);
        }
    }

    /// <summary>Starts again at the next line below a fault that looks like a key or a header.</summary>
    /// <param name="statementLine">First line of the faulty statement, from 1.</param>
    public void SkipToNextStatement(int statementLine)
    {
        int from = IsBrokenString || Line <= statementLine ? Math.Max(Line, statementLine) + 1 : Line;
        int line = 1;
        int offset = 0;
        while (offset < _text.Length)
        {
            int end = _text.IndexOf('\n', offset);
            end = end < 0 ? _text.Length : end;
            ReadOnlySpan<char> content = _text.AsSpan(offset, end - offset).TrimStart();
            if (line >= from && (content.Contains('=') || content.StartsWith('[')))
            {
                break;
            }

            offset = end + 1;
            line++;
        }

        _linesBefore = line - 1;
        _lexer = NewLexer(_text[Math.Min(offset, _text.Length)..]);
        _token = default;
        Next(TomlLexerMode.Key);
    }

    private static TomlLexer NewLexer(string text) => TomlLexer.Create(text, new TomlLexerOptions { DecodeScalars = true });
}
