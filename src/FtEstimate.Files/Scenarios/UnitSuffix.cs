namespace FtEstimate.Files.Scenarios;

/// <summary>A unit at the end of a key.</summary>
/// <param name="Text">As it stands there, such as "us".</param>
/// <param name="Dimension">What is measured.</param>
/// <param name="ToSi">Factor to SI.</param>
internal sealed record UnitSuffix(string Text, string Dimension, double ToSi)
{
    // longer suffixes first: "per_ms" ends in "ms"
    private static readonly UnitSuffix[] Known =
    [
        new("per_minute", "rate", 1.0 / 60),
        new("per_us", "rate", 1e6),
        new("per_ms", "rate", 1e3),
        new("per_ns", "rate", 1e9),
        new("per_s", "rate", 1),
        new("mm_s2", "acceleration", 1e-3),
        new("um_us2", "acceleration", 1e6),
        new("m_s2", "acceleration", 1),
        new("seconds", "time", 1),
        new("minutes", "time", 60),
        new("hours", "time", 3600),
        new("days", "time", 86_400),
        new("sec", "time", 1),
        new("min", "time", 60),
        new("ns", "time", 1e-9),
        new("us", "time", 1e-6),
        new("ms", "time", 1e-3),
        new("s", "time", 1),
        new("h", "time", 3600),
        new("d", "time", 86_400),
        new("nm", "length", 1e-9),
        new("um", "length", 1e-6),
        new("mm", "length", 1e-3),
        new("m", "length", 1),
        new("uw", "power", 1e-6),
        new("mw", "power", 1e-3),
        new("w", "power", 1),
    ];

    /// <summary>The unit at the end of a key, or null.</summary>
    public static UnitSuffix? Of(string key)
    {
        foreach (UnitSuffix unit in Known)
        {
            if (key.EndsWith(unit.Text, StringComparison.OrdinalIgnoreCase)
                && key.Length > unit.Text.Length + 1
                && key[key.Length - unit.Text.Length - 1] == '_')
            {
                return unit;
            }
        }

        return null;
    }

    /// <summary>The key without its unit.</summary>
    public static string StemOf(string key) => Of(key) is UnitSuffix unit ? key[..(key.Length - unit.Text.Length - 1)] : key;
}
