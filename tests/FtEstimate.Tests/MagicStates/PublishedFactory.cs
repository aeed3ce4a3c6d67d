using System.Globalization;

namespace FtEstimate.Tests.MagicStates;

/// <summary>A row of Published/factories-15-to-1.csv.</summary>
public sealed record PublishedFactory(
    string Design, double PhysicalError, double OutputError, double HalfLastDigit, int Atoms, double RoundsPerOutput, double Rejection)
{
    public static IReadOnlyList<PublishedFactory> All { get; } = [.. Read()];

    private static IEnumerable<PublishedFactory> Read()
    {
        using Stream stream = typeof(PublishedFactory).Assembly.GetManifestResourceStream("Published.factories-15-to-1.csv")
            ?? throw new InvalidOperationException("The published table is missing.");
        using StreamReader reader = new(stream);
        reader.ReadLine();
        while (reader.ReadLine() is { } line)
        {
            // "design",numbers...,"source"
            string[] quoted = line.Split('"');
            string[] cells = quoted[2].Split(',', StringSplitOptions.RemoveEmptyEntries);
            yield return new PublishedFactory(
                quoted[1], Number(cells[0]), Number(cells[1]), Number(cells[2]), (int)Number(cells[3]), Number(cells[4]), Number(cells[5]));
        }
    }

    private static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);
}
