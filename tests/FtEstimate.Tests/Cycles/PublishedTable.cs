using System.Globalization;

namespace FtEstimate.Tests.Cycles;

/// <summary>Reads the numbers of a table under Published/; the column "source" comes last and is left out.</summary>
internal static class PublishedTable
{
    public static IReadOnlyList<double[]> Rows(string file)
    {
        using Stream stream = typeof(PublishedTable).Assembly.GetManifestResourceStream($"Published.{file}")
            ?? throw new InvalidOperationException($"The published table {file} is missing.");
        using StreamReader reader = new(stream);
        int columns = reader.ReadLine()!.Split(',').Length - 1;
        List<double[]> rows = [];
        while (reader.ReadLine() is { } line)
        {
            rows.Add([.. line.Split(',').Take(columns).Select(cell => double.Parse(cell, CultureInfo.InvariantCulture))]);
        }

        return rows;
    }
}
