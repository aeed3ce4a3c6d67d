using System.Globalization;
using FtEstimate.Quantities;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Memory;

namespace FtEstimate.Reports.Memory;

/// <summary>Measured numbers as text.</summary>
internal static class MemoryText
{
    /// <summary>A rate or ratio, or why there is none.</summary>
    /// <param name="measured">The value.</param>
    /// <param name="saturates">Whether half of the shots may fail.</param>
    public static string Measured(MeasuredRate? measured, bool saturates) =>
        measured is { } some ? WithError(some) : saturates ? "half the shots may fail" : "not enough failures";

    /// <summary>A value above 0 and its standard error, both to the digits the error leaves: "3.82 ± 0.05", "(3.2 ± 0.6)e-5".</summary>
    public static string WithError(MeasuredRate rate)
    {
        if (!(rate.Value > 0 && rate.Error > 0))
        {
            return Show.Significant(rate.Value, 3);
        }

        int exponent = rate.Value is < 1e-3 or >= 1e4 ? (int)Math.Floor(Math.Log10(rate.Value)) : 0;
        double scale = Math.Pow(10, -exponent);
        double error = rate.Error * scale;
        int place = (int)Math.Floor(Math.Log10(error));

        // an error of 1 or 2 would lose too much to rounding
        bool needsSecondDigit = error < 2.95 * Math.Pow(10, place);
        string format = "F" + Math.Clamp(needsSecondDigit ? 1 - place : -place, 0, 12).ToString(CultureInfo.InvariantCulture);
        string text = string.Create(CultureInfo.InvariantCulture, $"{(rate.Value * scale).ToString(format, CultureInfo.InvariantCulture)} ± {error.ToString(format, CultureInfo.InvariantCulture)}");
        return exponent == 0 ? text : string.Create(CultureInfo.InvariantCulture, $"({text})e{exponent}");
    }

    /// <summary>The most likely value; without failures the bound: "&lt; 3.7e-3".</summary>
    public static string Value(ErrorEstimate? estimate) =>
        estimate is not { } some ? "not run" : some.Value > 0 ? Show.Significant(some.Value, 3) : $"< {Show.Significant(some.High, 2)}";

    /// <summary>The interval.</summary>
    public static string Interval(ErrorEstimate? estimate) =>
        estimate is { } some ? $"{Show.Significant(some.Low, 3)} to {Show.Significant(some.High, 3)}" : "";

    /// <summary>The basis.</summary>
    public static string Basis(PauliBasis basis) => basis == PauliBasis.X ? "X" : "Z";
}
