using System.Globalization;
using FtEstimate.Scenarios;

namespace FtEstimate.Files.Scenarios;

/// <summary>What may stand at a key, in words; for faults and for the documentation.</summary>
internal static class Expectation
{
    /// <summary>Such as "a number between 0 and 1" or ""a", "b" or "c"".</summary>
    public static string Of(KeyDefinition key) => key.Kind switch
    {
        ValueKind.Text when key.Choices.Length > 0 => Alternatives(key.Choices),
        ValueKind.Text => "a text in quotes",
        ValueKind.Flag => "true or false",
        ValueKind.PositiveOrBest => $"{Range("a number", key)}, or \"best\"",
        ValueKind.Whole => Range("a whole number", key),
        _ => Range("a number", key),
    };

    private static string Range(string what, KeyDefinition key)
    {
        bool isOpenAbove = key.Upper >= KeyDefinition.Largest;
        bool isAboveZero = key.IsAboveZero && key.Low <= 0;
        string low = Plain(key.Low);
        string high = Plain(key.Upper);
        return (isAboveZero, isOpenAbove) switch
        {
            (true, true) => $"{what} greater than 0",
            (true, false) => $"{what} greater than 0 and at most {high}",
            (false, true) => $"{what} of at least {low}",
            (false, false) => $"{what} between {low} and {high}",
        };
    }

    private static string Alternatives(IReadOnlyList<string> choices)
    {
        string text = $"\"{choices[0]}\"";
        for (int i = 1; i < choices.Count; i++)
        {
            text += i == choices.Count - 1 ? $" or \"{choices[i]}\"" : $", \"{choices[i]}\"";
        }

        return text;
    }

    private static string Plain(double number) => number.ToString("R", CultureInfo.InvariantCulture);
}
