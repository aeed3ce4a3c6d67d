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
            "scenario" => OfScenario(figure.Subject, figure.Figure),
            "factory" when Numbers(parts[1..]) is [var error] => OfFactory(parts[0], error, figure.Figure),
            "distance" when Numbers(parts[1..]) is [var error, var target] && ScalingLaws.Named(parts[0]) is { } law =>
                RequiredDistance.For(law, PatchError.Uniform(law, error), target),
            "law" when Numbers(parts[1..]) is [var error, >= 3 and var distance] && ScalingLaws.Named(parts[0]) is { } law =>
                PatchError.PerRound(law, PatchError.Uniform(law, error), (int)distance),
            "memory" when Numbers(parts[1..]) is [var error, >= 3 and var distance] => MemoryFigure.PerRound(parts[0], error, (int)distance),
            "factoring" when Numbers(parts) is [>= 2 and var bits] => OfWorkload(new Factoring((int)bits).Workload(), figure.Figure),
            "rotation" when Numbers(parts[1..]) is [var error] => RotationSynthesis.Named(parts[0])?.TPerRotation(error),
            "move" when Numbers(parts[1..]) is [var acceleration, var micrometres] => OfMove(parts[0], acceleration, micrometres * 1e-6),
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
            "simulated_suppression_3_to_5" when machine is not null => MemoryFigure.SuppressionFromThree(machine),
            _ => null,
        };
    }

    private static double SuppressionAtThree(SizedMachine machine)
    {
        NoiseStrength onePatch = machine.Point.At(MachineLoad.SinglePatch).Strength;
        return PatchError.SuppressionFactor(ScalingLaws.Simulated, onePatch, 3);
    }

    private static double? OfFactory(string name, double error, string figure)
    {
        if (!FactoryDesign.TryParse(name, out FactoryDesign? design, out _))
        {
            return null;
        }

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

    private static double? OfWorkload(Workload workload, string figure) => figure switch
    {
        "logical_qubits" => workload.LogicalQubits,
        "toffolis" => workload.Toffolis,
        "reaction_depth" => workload.ReactionDepth,
        _ => null,
    };

    private static double? OfMove(string profile, double acceleration, double metres)
    {
        MoveProfile? known = profile switch
        {
            "cubic" => MoveProfile.Cubic,
            "bang-bang" => MoveProfile.BangBang,
            "adiabatic-sine" => MoveProfile.AdiabaticSine,
            _ => null,
        };
        return known is { } shape ? MoveTime.Seconds(shape, metres, acceleration) : null;
    }

    /// <summary>The parts as numbers; null unless all are numbers above zero.</summary>
    private static double[]? Numbers(string[] parts)
    {
        double[] numbers = new double[parts.Length];
        for (int i = 0; i < parts.Length; i++)
        {
            if (!double.TryParse(parts[i], NumberStyles.Float, CultureInfo.InvariantCulture, out numbers[i])
                || !(numbers[i] > 0 && double.IsFinite(numbers[i])))
            {
                return null;
            }
        }

        return numbers;
    }
}
