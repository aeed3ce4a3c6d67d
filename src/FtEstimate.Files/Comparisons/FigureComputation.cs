using System.Globalization;
using FtEstimate.Cycles;
using FtEstimate.Files.Scenarios;
using FtEstimate.Machines;
using FtEstimate.MagicStates;
using FtEstimate.Noise;
using FtEstimate.Sizing;
using FtEstimate.SurfaceCode;
using FtEstimate.Workloads;

namespace FtEstimate.Files.Comparisons;

/// <summary>Computes our side of a comparison.</summary>
/// <param name="folder">Where the scenario files stand.</param>
/// <remarks>A subject lists its parts with " @ " between them: "textbook @ 1e-3 @ 11" is law, error, distance.</remarks>
internal sealed class FigureComputation(string folder)
{
    private readonly Dictionary<string, SizedMachine?> _machines = [];

    /// <summary>Our value, or null when the figure is not one this kind has or the subject cannot be read.</summary>
    public double? Of(PublishedFigure figure)
    {
        string[] parts = figure.Subject.Split(" @ ");
        return figure.Kind switch
        {
            "scenario" => OfScenario(parts[0], figure.Figure),
            "factory" => OfFactory(parts, figure.Figure),
            "distance" => OfDistance(parts),
            "law" => OfLaw(parts),
            "factoring" => OfWorkload(new Factoring((int)Number(parts[0])).Workload(), figure.Figure),
            "rotation" => RotationSynthesis.Named(parts[0])?.TPerRotation(Number(parts[1])),
            "move" => OfMove(parts),
            _ => null,
        };
    }

    private double? OfScenario(string file, string figure)
    {
        if (!_machines.TryGetValue(file, out SizedMachine? machine))
        {
            ScenarioReading reading = ScenarioReader.Read(Path.Combine(folder, file), []);
            machine = reading.Scenario is { } scenario ? new MachineSizing(new FactoryCatalogue()).Find(scenario).Best : null;
            _machines.Add(file, machine);
        }

        return figure switch
        {
            "atoms" => machine?.Atoms.Total,
            "run_s" => machine?.RunSeconds,
            "round_s" => machine?.Clock.RoundSeconds,
            "code_distance" => machine?.Distance,
            "suppression_3_to_5" when machine is not null => SuppressionAtThree(machine),
            _ => null,
        };
    }

    private static double SuppressionAtThree(SizedMachine machine)
    {
        NoiseStrength onePatch = machine.Point.At(MachineLoad.Of(2 * 9, 3)).Strength;
        return PatchError.SuppressionFactor(ScalingLaws.PublishedFit, onePatch, 3);
    }

    private static double? OfFactory(string[] parts, string figure)
    {
        if (!FactoryDesign.TryParse(parts[0], out FactoryDesign? design, out _))
        {
            return null;
        }

        double error = Number(parts[1]);
        FactoryNoise noise = new(d => PatchError.PerRound(ScalingLaws.Textbook, PatchError.Uniform(ScalingLaws.Textbook, error), d), error);
        Factory factory = Factory.Of(design, noise);
        return figure switch
        {
            "atoms" => factory.Atoms,
            "rounds_per_output" => factory.RoundsPerOutput,
            "output_error" => factory.OutputError,
            _ => null,
        };
    }

    private static double? OfDistance(string[] parts) => ScalingLaws.Named(parts[0]) is { } law
        ? RequiredDistance.For(law, PatchError.Uniform(law, Number(parts[1])), Number(parts[2]))
        : null;

    private static double? OfLaw(string[] parts) => ScalingLaws.Named(parts[0]) is { } law
        ? PatchError.PerRound(law, PatchError.Uniform(law, Number(parts[1])), (int)Number(parts[2]))
        : null;

    private static double? OfWorkload(Workload workload, string figure) => figure switch
    {
        "logical_qubits" => workload.LogicalQubits,
        "toffolis" => workload.Toffolis,
        "reaction_depth" => workload.ReactionDepth,
        _ => null,
    };

    private static double? OfMove(string[] parts)
    {
        MoveProfile? profile = parts[0] switch
        {
            "cubic" => MoveProfile.Cubic,
            "bang-bang" => MoveProfile.BangBang,
            "adiabatic-sine" => MoveProfile.AdiabaticSine,
            _ => null,
        };
        return profile is { } known ? MoveTime.Seconds(known, Number(parts[2]) * 1e-6, Number(parts[1])) : null;
    }

    private static double Number(string text) => double.Parse(text, NumberStyles.Float, CultureInfo.InvariantCulture);
}
