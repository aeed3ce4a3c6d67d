using FtEstimate.Cycles;
using FtEstimate.Machines;
using FtEstimate.Noise;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Sizing;
using FtEstimate.SurfaceCode;

namespace FtEstimate.Simulation.Memory;

/// <summary>What is simulated, and where it comes from.</summary>
/// <param name="Noise">Circuit and rates.</param>
/// <param name="Origin">Where they come from.</param>
public sealed record MemorySubject(MemoryNoise Noise, MemoryOrigin Origin)
{
    /// <summary>
    /// The round of a sized machine at its full load; where no machine meets the goal, that of the closest one, or of a single patch of distance 3
    /// under the quietest readout. An abstract machine has no round: the textbook circuit at its uniform error.
    /// </summary>
    public static MemorySubject Of(SizingResult result)
    {
        SearchSpace space = result.Space;
        SizedMachine? machine = result.Best ?? result.NoAnswer?.Closest;
        OperatingPoint point = machine?.Point ?? space.Points[0];
        OperatingState state = machine?.State ?? point.At(MachineLoad.SinglePatch);
        string title = $"Simulated memory for {space.Scenario.Title}";
        if (space.Scenario.Machine.Apparatus is AbstractApparatus { UniformError: var error })
        {
            return new MemorySubject(
                new TextbookMemoryNoise(UniformNoise.EveryPlace(error), error),
                new MemoryOrigin(
                    title,
                    "The machine is abstract: it states a uniform error and has no round of its own. Its stand-in is the textbook circuit in which every place errs with that probability.",
                    space.Law.Name,
                    state.Strength));
        }

        return new MemorySubject(
            new AtomMemoryNoise(((AtomOperatingPoint)point).Noise.Errors(state.Times)),
            new MemoryOrigin(title, Whose(result, machine), space.Law.Name, state.Strength));
    }

    /// <summary>The textbook circuit at one error rate, beside the default law.</summary>
    /// <param name="rates">Its rates.</param>
    /// <param name="error">The number they follow from.</param>
    public static MemorySubject Of(UniformNoise rates, double error)
    {
        IScalingLaw law = ScalingLaws.Simulated;
        return new MemorySubject(
            new TextbookMemoryNoise(rates, error),
            new MemoryOrigin(
                FormattableString.Invariant($"Simulated memory at a uniform error of {error}"),
                rates.Name == UniformNoise.EveryPlace(error).Name
                    ? "The law is asked at the same uniform error."
                    : "The law is asked at the same number, but it knows only the noise in which every place errs alike: the comparison is rough.",
                law.Name,
                PatchError.Uniform(law, error)));
    }

    private static string Whose(SizingResult result, SizedMachine? machine) => machine switch
    {
        null => "No machine meets the goal, so the noise is that of a single patch of distance 3 under the quietest readout.",
        _ when result.Best is null => $"No machine meets the goal, so the noise is that of the machine that comes closest: {Load(machine)}.",
        _ => $"The noise is that of the machine the report chooses, under its full load: {Load(machine)}.",
    };

    private static string Load(SizedMachine machine)
    {
        string transversal = machine.Layout.NoiseFactor > 1 ? "; its transversal gates are not simulated" : "";
        return FormattableString.Invariant(
            $"{Quantities.Show.Atoms(machine.Atoms.Sites)} sites, patches of distance {machine.Distance}, a round of {Quantities.Show.Duration(machine.State.Times.RoundSeconds)}{transversal}");
    }
}
