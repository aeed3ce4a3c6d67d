using Tomlyn.Parsing;
using Tomlyn.Syntax;

namespace FtEstimate.Files.Toml;

/// <summary>
/// Reads TOML into nodes with places. Goes on after a fault with the next line, so that all faults of a file are found at once.
/// </summary>
/// <remarks>
/// Tomlyn gives the tokens; the grammar is short, and Tomlyn's own parser stops at the first fault, keeps duplicate keys and triples the
/// time of a cold start.
/// </remarks>
internal sealed class TomlGrammar
{
    private const int DeepestNesting = 16;
    private const int MostFaults = 100;

    private readonly TomlTokens _tokens;
    private readonly string _file;
    private readonly List<Fault> _faults;
    private readonly TomlTree _tree;
    private TomlSection _current;

    private TomlGrammar(string file, string text, List<Fault> faults)
    {
        _file = file;
        _faults = faults;
        _tokens = new TomlTokens(text);
        _tree = new TomlTree(file, faults);
        _current = _tree.Root;
    }

    /// <summary>Reads a document.</summary>
    /// <param name="file">Its name, for places and faults.</param>
    /// <param name="text">The text.</param>
    /// <param name="faults">Faults of syntax, duplicate keys and duplicate tables are added here.</param>
    /// <returns>What could be read.</returns>
    public static TomlSection Read(string file, string text, List<Fault> faults)
    {
        TomlGrammar grammar = new(file, text, faults);
        grammar.ReadDocument();
        return grammar._tree.Root;
    }

    private void ReadDocument()
    {
        int faultsBefore = _faults.Count;
        _tokens.Next(TomlLexerMode.Key);
        while (_tokens.Kind != TokenKind.Eof && _faults.Count - faultsBefore < MostFaults)
        {
            if (_tokens.Kind == TokenKind.NewLine)
            {
                _tokens.Next(TomlLexerMode.Key);
                continue;
            }

            int line = _tokens.Line;
            if (!ReadStatement())
            {
                _tokens.SkipToNextStatement(line);
            }
        }
    }

    private bool ReadStatement()
    {
        bool isRead = _tokens.Kind switch
        {
            TokenKind.OpenBracket => ReadHeader(TokenKind.CloseBracket),
            TokenKind.OpenBracketDouble => ReadHeader(TokenKind.CloseBracketDouble),
            _ => ReadAssignment(_current, TomlLexerMode.Key, 0),
        };
        return isRead && (_tokens.Kind is TokenKind.NewLine or TokenKind.Eof || Fail("one key or table per line; nothing more was expected here"));
    }

    private bool ReadHeader(TokenKind close)
    {
        // keys under a header that cannot be read belong nowhere
        _current = new TomlSection(PlaceHere());
        _tokens.Next(TomlLexerMode.Key);
        List<TomlKeyPart> parts = [];
        if (!ReadKey(parts))
        {
            return false;
        }

        if (_tokens.Kind != close)
        {
            return Fail(close == TokenKind.CloseBracket ? "expected ] after the name of the table" : "expected ]] after the name of the table");
        }

        _tokens.Next(TomlLexerMode.Key);
        _current = _tree.Open(parts, isRepeated: close == TokenKind.CloseBracketDouble) ?? _current;
        return true;
    }

    private bool ReadAssignment(TomlSection target, TomlLexerMode after, int depth)
    {
        List<TomlKeyPart> parts = [];
        if (!ReadKey(parts))
        {
            return false;
        }

        if (_tokens.Kind != TokenKind.Equal)
        {
            return Fail($"expected = after {parts[^1].Name}");
        }

        _tokens.Next(TomlLexerMode.Value);
        TomlNode? value = ReadValue(parts[^1].Place, after, depth);
        if (value is null)
        {
            return false;
        }

        _tree.Add(target, parts, value);
        return true;
    }

    private bool ReadKey(List<TomlKeyPart> parts)
    {
        while (true)
        {
            if (_tokens.HasError || _tokens.Kind is not (TokenKind.BasicKey or TokenKind.String or TokenKind.StringLiteral))
            {
                return Fail(_tokens.Kind is TokenKind.NewLine or TokenKind.Eof ? "expected a key before the end of the line" : "expected a key");
            }

            parts.Add(new TomlKeyPart(_tokens.Text, PlaceHere()));
            _tokens.Next(TomlLexerMode.Key);
            if (_tokens.Kind != TokenKind.Dot)
            {
                return !_tokens.HasError || Fail("unreadable");
            }

            if (parts.Count >= DeepestNesting)
            {
                return Fail("tables are nested too deeply");
            }

            _tokens.Next(TomlLexerMode.Key);
        }
    }

    private TomlNode? ReadValue(Place place, TomlLexerMode after, int depth)
    {
        if (_tokens.HasError)
        {
            Fail("unreadable value");
            return null;
        }

        switch (_tokens.Kind)
        {
            case TokenKind.OpenBracket or TokenKind.OpenBracketDouble or TokenKind.OpenBrace when depth >= DeepestNesting:
                Fail("values are nested too deeply");
                return null;
            case TokenKind.OpenBracket:
                return ReadList(place, after, depth);
            case TokenKind.OpenBrace:
                return ReadInlineTable(place, after, depth);
        }

        if (TomlScalars.Read(_tokens, place) is not TomlLeaf leaf)
        {
            Fail(TomlScalars.Unexpected(_tokens));
            return null;
        }

        _tokens.Next(after);
        if (_tokens.HasError)
        {
            Fail("unreadable");
            return null;
        }

        return leaf;
    }

    private TomlList? ReadList(Place place, TomlLexerMode after, int depth)
    {
        TomlList list = new(place, isOfTables: false);
        _tokens.NextBeyondLines(TomlLexerMode.Value);
        while (_tokens.Kind != TokenKind.CloseBracket)
        {
            if (ReadValue(PlaceHere(), TomlLexerMode.Value, depth + 1) is not TomlNode item)
            {
                return null;
            }

            list.Items.Add(item);
            _tokens.SkipLines(TomlLexerMode.Value);
            if (_tokens.Kind == TokenKind.Comma)
            {
                _tokens.NextBeyondLines(TomlLexerMode.Value);
            }
            else if (_tokens.Kind != TokenKind.CloseBracket)
            {
                Fail("expected , or ] in the list");
                return null;
            }
        }

        _tokens.Next(after);
        return list;
    }

    private TomlSection? ReadInlineTable(Place place, TomlLexerMode after, int depth)
    {
        TomlSection table = new(place, isClosed: true);
        TomlSection filled = new(place);
        _tokens.NextBeyondLines(TomlLexerMode.Key);
        while (_tokens.Kind != TokenKind.CloseBrace)
        {
            if (!ReadAssignment(filled, TomlLexerMode.Value, depth + 1))
            {
                return null;
            }

            _tokens.SkipLines(TomlLexerMode.Key);
            if (_tokens.Kind == TokenKind.Comma)
            {
                _tokens.NextBeyondLines(TomlLexerMode.Key);
            }
            else if (_tokens.Kind != TokenKind.CloseBrace)
            {
                Fail("expected , or } in the table");
                return null;
            }
        }

        foreach (string name in filled.Names)
        {
            table.Set(name, filled.Find(name)!);
        }

        _tokens.Next(after);
        return table;
    }

    private Place PlaceHere() => new(_file, _tokens.Line, _tokens.Column);

    private bool Fail(string message)
    {
        _faults.Add(new Fault(_file, _tokens.ErrorLine, _tokens.ErrorColumn, "", _tokens.Error ?? message));
        return false;
    }
}
