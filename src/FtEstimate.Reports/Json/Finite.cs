using System.Text.Json;
using FtEstimate.Reports.Figures;

namespace FtEstimate.Reports.Json;

/// <summary>Numbers as JSON can hold them.</summary>
internal static class Finite
{
    /// <summary>A number; null where it is none, or neither finite.</summary>
    public static void WriteFinite(this Utf8JsonWriter json, string name, double? value)
    {
        if (value is { } number && double.IsFinite(number))
        {
            json.WriteNumber(name, number);
        }
        else
        {
            json.WriteNull(name);
        }
    }

    /// <summary>A figure under its name for scripts.</summary>
    public static void WriteFigure(this Utf8JsonWriter json, Figure figure)
    {
        if (figure.Kind.Unit == FigureUnit.Words)
        {
            json.WriteString(figure.Kind.Id, figure.Words);
        }
        else
        {
            json.WriteFinite(figure.Kind.Id, figure.Number);
        }
    }

    /// <summary>Figures one after another.</summary>
    public static void WriteFigures(this Utf8JsonWriter json, ReadOnlySpan<Figure> figures)
    {
        foreach (Figure figure in figures)
        {
            json.WriteFigure(figure);
        }
    }
}
