using System.Globalization;

namespace FtEstimate.Reports.Figures;

/// <summary>A value with what it is.</summary>
/// <param name="Kind">What it is.</param>
/// <param name="Value">The number in SI units; null when there is none, or the figure is words.</param>
/// <param name="Words">The words of a figure without a number.</param>
/// <param name="Note">Added to what people read, such as the limit it is held against.</param>
public sealed record Figure(FigureKind Kind, double? Value, string? Words = null, string Note = "")
{
    /// <summary>How a missing number reads.</summary>
    public const string Missing = "not stated";

    /// <summary>The figure for people: digits, unit and note.</summary>
    public string Shown => Note.Length > 0 ? $"{Plain} {Note}" : Plain;

    /// <summary>The number where it is one: never NaN or infinite.</summary>
    public double? Number => Value is { } value && double.IsFinite(value) ? value : null;

    private string Plain => Kind.Unit switch
    {
        FigureUnit.Words => Words ?? Missing,
        _ => Number is { } value ? Show(value) : Words ?? Missing,
    };

    /// <summary>A figure that is words.</summary>
    public static Figure Of(FigureKind kind, string words, string note = "") => new(kind, null, words, note);

    private string Show(double value) => Kind.Unit switch
    {
        FigureUnit.Atoms => Quantities.Show.Atoms(value),
        FigureUnit.AtomsInFull => WholeNumbers.Show(value),
        FigureUnit.Count => WholeNumbers.ShowCount(value),
        FigureUnit.Seconds => Quantities.Show.Duration(value),
        FigureUnit.Probability => Quantities.Show.Probability(value),
        FigureUnit.Percent => Quantities.Show.Percent(value),
        FigureUnit.PerSecond => Quantities.Show.Atoms(value) + " per second",
        FigureUnit.Metres => Quantities.Show.Significant(value * 1e3, 2) + " mm",
        FigureUnit.Watts => Quantities.Show.Significant(value, 2) + " W",
        _ => Quantities.Show.Significant(value, 3),
    };
}

/// <summary>Whole numbers in full, with commas from ten thousand on.</summary>
internal static class WholeNumbers
{
    // beyond this a double no longer holds every whole number
    private const double Largest = 1e15;

    /// <summary>A count of things: all digits below ten thousand, three from there on.</summary>
    public static string ShowCount(double value) => Math.Abs(value) < 1e4 && value == Math.Round(value) ? Show(value) : Quantities.Show.Significant(value, 3);

    /// <summary>All digits.</summary>
    public static string Show(double value) => !(Math.Abs(value) < Largest) ? Quantities.Show.Significant(value, 3)
        : Math.Round(value).ToString(Math.Abs(value) >= 1e4 ? "N0" : "F0", CultureInfo.InvariantCulture);
}
