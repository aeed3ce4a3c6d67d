namespace FtEstimate.Scenarios.Keys;

/// <summary>Factors from the units that keys are named after to SI.</summary>
internal static class Units
{
    /// <summary>Micro: µm, µs.</summary>
    public const double Micro = 1e-6;

    /// <summary>Milli: mW.</summary>
    public const double Milli = 1e-3;

    /// <summary>From events per millisecond to events per second.</summary>
    public const double PerMillisecond = 1e3;

    /// <summary>Seconds in an hour.</summary>
    public const double Hour = 3600;

    /// <summary>Seconds in a day.</summary>
    public const double Day = 86_400;
}
