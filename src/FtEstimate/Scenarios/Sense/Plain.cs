using System.Globalization;

namespace FtEstimate.Scenarios.Sense;

/// <summary>Numbers inside messages, as short as they can be read back.</summary>
internal static class Plain
{
    public static string Number(double value) => value.ToString("R", CultureInfo.InvariantCulture);
}
