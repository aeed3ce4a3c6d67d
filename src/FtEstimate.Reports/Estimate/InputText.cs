using System.Globalization;
using FtEstimate.Scenarios;

namespace FtEstimate.Reports.Estimate;

/// <summary>Inputs as they were given: the user's digits, the unit of the key.</summary>
internal static class InputText
{
    /// <summary>The value with its unit.</summary>
    public static string Value(Input input)
    {
        if (input.Number is { } number)
        {
            string unit = KeyUnit.Of(input.Path);
            return unit.Length > 0 ? $"{Number(number)} {unit}" : Number(number);
        }

        return input.Text ?? (input.Flag is { } flag ? flag ? "yes" : "no" : "");
    }

    /// <summary>The range with its unit; empty when none is stated.</summary>
    public static string Range(Input input) => (input.Low, input.High) switch
    {
        (null, null) => "",
        ({ } low, { } high) => $"{Number(low)} to {Number(high)}",
        ({ } low, null) => $"from {Number(low)}",
        (null, { } high) => $"to {Number(high)}",
    };

    /// <summary>Where the value comes from; goals, conventions and words are choices, a number without a source is assumed.</summary>
    public static string Source(Input input) =>
        !string.IsNullOrWhiteSpace(input.Source) ? input.Source
        : input.Number is null || input.Path.StartsWith("goal.", StringComparison.Ordinal) || input.Path.StartsWith("method.", StringComparison.Ordinal)
            ? "choice"
            : "assumed";

    /// <summary>A number as a person would write it, up to ten digits.</summary>
    public static string Number(double number)
    {
        double size = Math.Abs(number);
        if (!double.IsFinite(number))
        {
            return "no limit";
        }

        if (size is >= 1e-3 and < 1e9 || size == 0)
        {
            return number.ToString(size >= 1e4 ? "#,0.######" : "0.##########", CultureInfo.InvariantCulture);
        }

        return number.ToString("0.#########e0", CultureInfo.InvariantCulture);
    }
}
