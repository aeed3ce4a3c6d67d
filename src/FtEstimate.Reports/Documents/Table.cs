using System.Collections.Immutable;

namespace FtEstimate.Reports.Documents;

/// <summary>A table.</summary>
/// <param name="Columns">The columns.</param>
/// <param name="Rows">The rows, each with one cell per column.</param>
public sealed record Table(ImmutableArray<Column> Columns, ImmutableArray<TableRow> Rows) : Block;

/// <summary>A column.</summary>
/// <param name="Label">Its heading, with the unit where all cells share one.</param>
/// <param name="Align">Numbers stand at the right.</param>
/// <param name="Verbatim">Whether cells are notation to be copied, such as keys.</param>
public sealed record Column(string Label, Align Align = Align.Left, bool Verbatim = false);

/// <summary>A row.</summary>
/// <param name="Cells">Plain text, one per column.</param>
/// <param name="Stands">Whether the row stands out: a total, or the choice.</param>
public sealed record TableRow(ImmutableArray<string> Cells, bool Stands = false);

/// <summary>Alignment of a column.</summary>
public enum Align
{
    /// <summary>Text.</summary>
    Left,

    /// <summary>Numbers.</summary>
    Right,
}

/// <summary>Collects the rows of a table.</summary>
/// <param name="columns">The columns.</param>
internal sealed class TableBuilder(params ImmutableArray<Column> columns)
{
    private readonly ImmutableArray<TableRow>.Builder _rows = ImmutableArray.CreateBuilder<TableRow>();

    /// <summary>Adds an ordinary row.</summary>
    public void Add(params ImmutableArray<string> cells) => _rows.Add(new TableRow(cells));

    /// <summary>Adds a row that stands out.</summary>
    public void AddStanding(params ImmutableArray<string> cells) => _rows.Add(new TableRow(cells, Stands: true));

    /// <summary>The table.</summary>
    public Table Build() => new(columns, _rows.ToImmutable());
}
