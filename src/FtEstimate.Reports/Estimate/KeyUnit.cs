namespace FtEstimate.Reports.Estimate;

/// <summary>The unit that the name of an input carries.</summary>
internal static class KeyUnit
{
    // the longer ending first where one ends with the other
    private static readonly (string Ending, string Unit)[] Endings =
    [
        ("counts_per_ms", "counts per ms"),
        ("atoms_per_s", "atoms per s"),
        ("_us_per_round", "µs per round"),
        ("_per_round", "per round"),
        ("_per_ms", "per ms"),
        ("_per_s", "per s"),
        ("_m_s2", "m/s²"),
        ("_every_rounds", "rounds"),
        ("hours_between_stops", "hours"),
        ("hours_to_restart", "hours"),
        ("_us", "µs"),
        ("_ms", "ms"),
        ("_um", "µm"),
        ("_mw", "mW"),
        ("_days", "days"),
        ("_hours", "hours"),
        ("_months", "months"),
        ("_s", "s"),
    ];

    /// <summary>"µs" for "machine.gates.cz_time_us"; empty for probabilities, fractions and counts.</summary>
    public static string Of(string path)
    {
        string key = path[(path.LastIndexOf('.') + 1)..];
        foreach ((string ending, string unit) in Endings)
        {
            if (key.EndsWith(ending, StringComparison.Ordinal))
            {
                return unit;
            }
        }

        return "";
    }
}
