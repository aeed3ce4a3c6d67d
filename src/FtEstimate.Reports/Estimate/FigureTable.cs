using System.Collections.Immutable;
using FtEstimate.Reports.Documents;
using FtEstimate.Reports.Figures;

namespace FtEstimate.Reports.Estimate;

/// <summary>Figures as a table.</summary>
internal static class FigureTable
{
    /// <summary>Label and value, and the meaning where it is wanted.</summary>
    public static Table Of(ImmutableArray<Figure> figures, bool withMeaning = false)
    {
        TableBuilder table = withMeaning
            ? new(new Column("Figure"), new Column("Value"), new Column("What it means"))
            : new(new Column("Figure"), new Column("Value"));
        foreach (Figure figure in figures)
        {
            if (withMeaning)
            {
                table.Add(figure.Kind.Label, figure.Shown, figure.Kind.Meaning);
            }
            else
            {
                table.Add(figure.Kind.Label, figure.Shown);
            }
        }

        return table.Build();
    }
}
