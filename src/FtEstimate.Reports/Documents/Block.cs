using System.Collections.Immutable;

namespace FtEstimate.Reports.Documents;

/// <summary>A part of a section: text, list, table or picture.</summary>
public abstract record Block
{
    private protected Block()
    {
    }
}

/// <summary>Some sentences.</summary>
/// <param name="Text">The plain text.</param>
/// <param name="Tone">How much it stands out.</param>
public sealed record Paragraph(string Text, Tone Tone = Tone.Plain) : Block;

/// <summary>How much a paragraph stands out.</summary>
public enum Tone
{
    /// <summary>Ordinary text.</summary>
    Plain,

    /// <summary>The sentence to remember.</summary>
    Strong,

    /// <summary>Something a reader must not miss.</summary>
    Caution,
}

/// <summary>A list of short statements.</summary>
/// <param name="Items">The statements.</param>
public sealed record BulletList(ImmutableArray<Bullet> Items) : Block;

/// <summary>One statement of a list.</summary>
/// <param name="Lead">A word or two that say what it is about.</param>
/// <param name="Text">The statement.</param>
public sealed record Bullet(string Lead, string Text);

/// <summary>A picture, drawn only when it is asked for.</summary>
/// <param name="Id">Unique in the document; letters, digits and hyphens.</param>
/// <param name="Caption">What it shows.</param>
/// <param name="Svg">Draws it: one svg element, the same bytes each time.</param>
public sealed record Picture(string Id, string Caption, Func<string> Svg) : Block
{
    /// <summary>Name of the file it goes into beside a Markdown report.</summary>
    public string FileName => Id + ".svg";
}
