using System.Globalization;
using FtEstimate.Simulation.Calibration;

namespace FtEstimate.Files.Calibration;

/// <summary>The file of the fitted law: "name,value,standard_error" line by line; it is built into the program.</summary>
public static class FittedLawFile
{
    /// <summary>Name of the file.</summary>
    public const string FileName = "simulated-law.csv";

    /// <summary>Writes the file into a folder.</summary>
    public static Fault? Write(string folder, FittedLaw law) => AtomicFile.Write(Path.Combine(folder, FileName), Text(law));

    /// <summary>The file as text, four digits.</summary>
    public static string Text(FittedLaw law)
    {
        IEnumerable<string> lines = law.Numbers.Select(number => string.Create(
            CultureInfo.InvariantCulture, $"{number.Name},{number.Value:G4},{number.StandardError:G2}"));
        return string.Join('\n', lines.Prepend("name,value,standard_error")) + "\n";
    }
}
