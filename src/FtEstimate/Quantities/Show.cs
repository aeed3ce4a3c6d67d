using System.Globalization;

namespace FtEstimate.Quantities;

/// <summary>Numbers as text, to the digits they deserve; always in the invariant culture.</summary>
/// <remarks>An exact half rounds to the even digit. A value that is not a finite number reads "n/a": it must never reach a reader as a number.</remarks>
public static class Show
{
    private const string NotANumber = "n/a";

    // above this, groups of thousands are harder to read than a power of ten
    private const double PowersFrom = 1e9;
    private const double PowersBelow = 1e-3;
    private const double ThousandsFrom = 1e4;

    // a probability this close to 1 is 1 to any reader
    private const double NoRest = 1e-9;

    /// <summary>
    /// A number rounded to significant digits: "0.0120", "3.1", "312,000"; from 1e9 and below 1e-3 as a power, "1.5e-7".
    /// </summary>
    /// <param name="value">Any number.</param>
    /// <param name="digits">Significant digits, 1 to 15.</param>
    public static string Significant(double value, int digits)
    {
        if (!double.IsFinite(value))
        {
            return NotANumber;
        }
        else if (value == 0)
        {
            return "0";
        }

        double rounded = Round(value, digits);
        double size = Math.Abs(rounded);
        if (size is >= PowersFrom or < PowersBelow)
        {
            return Power(rounded, digits);
        }

        int decimals = Math.Max(0, digits - 1 - Exponent(rounded));
        string group = size >= ThousandsFrom ? "N" : "F";
        return rounded.ToString(Format(group, decimals), CultureInfo.InvariantCulture);
    }

    /// <summary>A count of atoms to three digits, with thousands commas: "312,000".</summary>
    public static string Atoms(double atoms) => atoms is >= 0 and < 1000
        ? Math.Round(atoms).ToString("F0", CultureInfo.InvariantCulture)
        : Significant(atoms, 3);

    /// <summary>A probability to two digits: "0.023", "4.7e-11"; close to 1 two digits of the rest, "0.9987"; "1" within 1e-9.</summary>
    public static string Probability(double probability)
    {
        double rest = 1 - probability;
        if (!double.IsFinite(rest))
        {
            return NotANumber;
        }

        if (Math.Abs(rest) < NoRest)
        {
            return "1";
        }

        if (rest is < 0 or >= 0.1)
        {
            return Significant(probability, 2);
        }

        int decimals = 1 - Exponent(Round(rest, 2));
        return probability.ToString(Format("F", decimals), CultureInfo.InvariantCulture);
    }

    /// <summary>A fraction in per cent to two digits: "27 %", "0.012 %", "99.87 %".</summary>
    /// <param name="fraction">1 is 100 %.</param>
    public static string Percent(double fraction)
    {
        double rest = 1 - fraction;
        if (!double.IsFinite(rest))
        {
            return NotANumber;
        }

        if (Math.Abs(rest) < NoRest)
        {
            return "100 %";
        }

        if (rest is < 0 or >= 0.1)
        {
            // a hundred per cent and more needs its third digit
            return Significant(100 * fraction, fraction >= 1 ? 3 : 2) + " %";
        }

        int decimals = Math.Max(0, -1 - Exponent(Round(rest, 2)));
        return (100 * fraction).ToString(Format("F", decimals), CultureInfo.InvariantCulture) + " %";
    }

    /// <summary>A duration as people say it: "47 µs", "1.3 ms", "13 hours", "4.2 days", "18 years".</summary>
    /// <param name="seconds">Seconds. Two digits, three from 100 of a unit on.</param>
    public static string Duration(double seconds)
    {
        if (!double.IsFinite(seconds))
        {
            return NotANumber;
        }
        else if (seconds == 0)
        {
            return "0 s";
        }

        // the unit is chosen after rounding, so that 59.9 s reads "1 minute" and not "60 s"
        int unit = DurationUnits.Length - 1;
        while (unit > 0 && Math.Abs(InUnit(seconds, unit)) < DurationUnits[unit].From)
        {
            unit--;
        }

        double amount = InUnit(seconds, unit);
        string name = amount == 1 ? DurationUnits[unit].One : DurationUnits[unit].Many;
        return Plain(amount) + " " + name;
    }

    private static double InUnit(double seconds, int unit)
    {
        double amount = seconds / DurationUnits[unit].Seconds;
        return Round(amount, Math.Abs(amount) < 99.5 ? 2 : 3);
    }

    // a spoken duration drops the zeros that a table would keep
    private static string Plain(double amount) => Math.Abs(amount) switch
    {
        >= PowersFrom or < PowersBelow => Power(amount, 2),
        >= ThousandsFrom => amount.ToString("N0", CultureInfo.InvariantCulture),
        _ => amount.ToString("0.####", CultureInfo.InvariantCulture),
    };

    private static string Power(double value, int digits)
    {
        string text = Scientific(value, digits);
        return string.Create(CultureInfo.InvariantCulture, $"{text[..text.IndexOf('E', StringComparison.Ordinal)]}e{ExponentOf(text)}");
    }

    private static double Round(double value, int digits) =>
        double.Parse(Scientific(value, digits), CultureInfo.InvariantCulture);

    // fifteen digits survive any double, so 1e23 (stored as 9.9999999999999992e22) keeps its exponent
    private static int Exponent(double value) => ExponentOf(Scientific(value, 15));

    private static int ExponentOf(string scientific) => int.Parse(
        scientific.AsSpan(scientific.IndexOf('E', StringComparison.Ordinal) + 1),
        NumberStyles.AllowLeadingSign,
        CultureInfo.InvariantCulture);

    private static string Scientific(double value, int digits) => value.ToString(Format("E", digits - 1), CultureInfo.InvariantCulture);

    private static string Format(string kind, int decimals) => kind + decimals.ToString(CultureInfo.InvariantCulture);

    private static readonly DurationUnit[] DurationUnits =
    [
        new(1e-9, 0, "ns", "ns"),
        new(1e-6, 1, "µs", "µs"),
        new(1e-3, 1, "ms", "ms"),
        new(1, 1, "s", "s"),
        new(60, 1, "minute", "minutes"),
        new(3600, 1, "hour", "hours"),
        new(86_400, 1, "day", "days"),
        new(365.25 * 86_400, 2, "year", "years"),
    ];

    private sealed record DurationUnit(double Seconds, double From, string One, string Many);
}
