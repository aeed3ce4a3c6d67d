using FtEstimate.Cycles;
using FtEstimate.Noise;
using FtEstimate.Quantities;
using FtEstimate.Scenarios;
using FtEstimate.Sizing;

namespace FtEstimate.Reports.Estimate;

/// <summary>How choices read in a report.</summary>
internal static class Words
{
    /// <summary>What sets the pace.</summary>
    public static string Pace(SizedMachine machine) => machine.Clock.Pace switch
    {
        Sizing.Pace.Supply => "supply of magic states",
        Sizing.Pace.Consumption when machine.Demand.TStates == 0 => "logical gates, layer by layer",
        Sizing.Pace.Consumption => "consumption of magic states",
        _ => "reaction time",
    };

    /// <summary>Style and floor plan.</summary>
    public static string Style(LogicLayout layout) =>
        layout.Style == LogicStyle.LatticeSurgery ? $"lattice surgery, {layout.Name} floor plan" : layout.Name;

    /// <summary>Name, kind and exposure of the readout.</summary>
    public static string Readout(OperatingPoint point) => point is AtomOperatingPoint { Noise.Cycle: var cycle }
        ? $"{cycle.Scheme.Name} ({Kind(cycle.Scheme.Kind)}), exposure {Show.Duration(cycle.Reading.ExposureSeconds)}"
        : "none: abstract machine";

    /// <summary>The part of a round.</summary>
    public static string Part(CyclePart part) => part switch
    {
        CyclePart.Preparation => "preparation",
        CyclePart.Gates => "gates",
        CyclePart.Readout => "readout",
        _ => "loss check",
    };

    /// <summary>What the goal prefers.</summary>
    public static string Preference(Preference preference) => preference switch
    {
        Scenarios.Preference.FewestAtoms => "fewest atoms",
        Scenarios.Preference.ShortestRun => "shortest run",
        _ => "least atoms times run time",
    };

    /// <summary>A count with its noun: "1 factory", "4 factories".</summary>
    public static string Count(double count, string one, string many) =>
        count == 1 ? "1 " + one : Figures.WholeNumbers.ShowCount(count) + " " + many;

    /// <summary>A whole number without a unit: "45", "12,000".</summary>
    public static string Whole(double number) => Figures.WholeNumbers.Show(number);

    private static string Kind(string kind) => kind switch
    {
        "shelved" => "data shelved, one species",
        "second_species" => "checks of a second species",
        "moved_apart" => "checks moved apart",
        "in_place" => "in place, data unprotected",
        _ => kind,
    };
}
