using System.Globalization;

namespace FtEstimate.Noise;

/// <summary>The numbers fitted to this project's own Monte Carlo, from the file that the calibration writes.</summary>
/// <remarks>Lines of "name,value,standard_error"; the file is part of the program.</remarks>
public static class FittedNumbers
{
    private static readonly Dictionary<string, double> Values = Read();

    /// <summary>The error of every location of the textbook circuit at which the simulated law has strength 1.</summary>
    public static double UniformThreshold => Value(nameof(UniformThreshold));

    /// <summary>A fitted number.</summary>
    /// <exception cref="KeyNotFoundException">There is none of that name.</exception>
    public static double Value(string name) => Values[name];

    private static Dictionary<string, double> Read()
    {
        using Stream stream = typeof(FittedNumbers).Assembly.GetManifestResourceStream("simulated-law.csv")
            ?? throw new InvalidOperationException("the fitted numbers are missing from the program");
        using StreamReader reader = new(stream);
        Dictionary<string, double> values = [];
        reader.ReadLine();
        while (reader.ReadLine() is { } line)
        {
            int first = line.IndexOf(',', StringComparison.Ordinal);
            int second = line.IndexOf(',', first + 1);
            values.Add(line[..first], double.Parse(line.AsSpan(first + 1, second - first - 1), NumberStyles.Float, CultureInfo.InvariantCulture));
        }

        return values;
    }
}
