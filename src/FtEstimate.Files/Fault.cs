using System.Globalization;

namespace FtEstimate.Files;

/// <summary>One thing that is wrong with an input file, or with a setting on the command line.</summary>
/// <param name="File">The file as it was named, or "--set".</param>
/// <param name="Line">Line, from 1; 0: no line.</param>
/// <param name="Column">Column, from 1; 0: no column.</param>
/// <param name="Key">The key as seen from the scenario, such as "machine.gates.cz_error"; empty: none.</param>
/// <param name="Message">What is wrong, what was expected, and the nearest known key where there is one.</param>
public sealed record Fault(string File, int Line, int Column, string Key, string Message)
{
    /// <summary>The fault on one line: "scenarios/x.toml(12,3): machine.gates.cz_eror: unknown key; did you mean cz_error?".</summary>
    public override string ToString()
    {
        string place = Line > 0 ? string.Create(CultureInfo.InvariantCulture, $"{File}({Line},{Column})") : File;
        return Key.Length > 0 ? $"{place}: {Key}: {Message}" : $"{place}: {Message}";
    }
}
