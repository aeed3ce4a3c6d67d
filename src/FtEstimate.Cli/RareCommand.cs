using System.CommandLine;
using System.Globalization;
using FtEstimate.Files;
using FtEstimate.Quantities;
using FtEstimate.Reports.Memory;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Graphs;
using FtEstimate.Simulation.RareEvents;
using FtEstimate.SurfaceCode;

namespace FtEstimate.Cli;

/// <summary>`rare --uniform P --distance D`: a logical error too rare for plain Monte Carlo, by splitting.</summary>
internal static class RareCommand
{
    private const double SmallestUniform = 1e-5;
    private const double LargestUniform = 0.02;
    private const int MostRounds = 1000;
    private const int MostWalkers = 100_000;

    /// <summary>Failures per shot at the first level: one in some thirty is common enough, and leaves a short ladder.</summary>
    private const double CommonFailure = 0.03;

    /// <summary>The command.</summary>
    public static Command Create()
    {
        Option<double?> uniform = new("--uniform")
        {
            Description = "Error probability of the textbook circuit",
            HelpName = "P",
            Required = true,
            CustomParser = CommandLineNumbers.Between("--uniform", SmallestUniform, LargestUniform),
        };
        Option<string> noise = new("--noise") { Description = "How rates follow from P", DefaultValueFactory = _ => "every-place" };
        noise.AcceptOnlyFromAmong("every-place", "slow-readout");
        Option<string> basis = new("--basis") { Description = "Logical basis of the memory", DefaultValueFactory = _ => "z" };
        basis.AcceptOnlyFromAmong("z", "x");
        Option<int> distance = Whole("--distance", "Odd code distance", 13);
        Option<int> rounds = Whole("--rounds", "Syndrome rounds; 0: three times the distance", 0);
        Option<int> walkers = Whole("--walkers", "Chains of each ladder: four times as many halve the error", 64);
        Option<int> seed = Whole("--seed", "The same seed gives the same estimate", 1);
        Option<int> threads = Whole("--threads", "Threads; the estimate does not depend on them", Environment.ProcessorCount);
        Option<string?> file = new("--out") { Description = "Write the report to FILE instead of standard output", HelpName = "FILE" };
        Command command = new("rare", "A logical error too rare for plain Monte Carlo, by splitting") { uniform, noise, basis, distance, rounds, walkers, seed, threads, file };
        command.SetAction((parsed, cancel) => Task.FromResult(Run(
            new RareRequest(
                parsed.GetValue(uniform)!.Value,
                parsed.GetValue(noise)!,
                parsed.GetValue(basis) == "x" ? PauliBasis.X : PauliBasis.Z,
                parsed.GetValue(distance),
                parsed.GetValue(rounds),
                parsed.GetValue(walkers),
                parsed.GetValue(seed),
                parsed.GetValue(threads)),
            new OutputPlaces(parsed.GetValue(file), null, null),
            parsed.InvocationConfiguration,
            cancel)));
        return command;
    }

    private static int Run(RareRequest request, OutputPlaces places, InvocationConfiguration io, CancellationToken cancel)
    {
        double start = request.StartError();
        Fault[] faults = [.. request.Faults(start), .. places.Faults([])];
        if (FaultOutput.Stop(faults, io.Error))
        {
            return ExitStatus.WrongInput;
        }

        LadderPlan plan = new(start, request.Error, (ulong)request.Seed, StartFailures: Math.Max(64, request.Walkers), Walkers: request.Walkers);
        using Interruption interruption = new(cancel);
        RareEventEstimate estimate = Splitting.Estimate(request.ModelAt, plan, request.Threads, new RareProgress(io.Error), interruption.Token);
        RareQuestion question = new(
            request.Noise, request.Error, request.Distance, request.RoundsOrDefault, request.Basis.ToString(), ScalingLaws.Simulated.Name, request.LawPerRound(request.Error), request.LawRemark());
        return ReportOutput.Write(RareReport.Of(question, plan, estimate), () => "{}", places, io.Output, io.Error) ? ExitStatus.Answer : ExitStatus.WrongInput;
    }

    private static Option<int> Whole(string name, string description, int value) => new(name)
    {
        Description = description,
        HelpName = "N",
        DefaultValueFactory = _ => value,
        CustomParser = result =>
        {
            if (int.TryParse(result.Tokens[0].Value, NumberStyles.None, CultureInfo.InvariantCulture, out int number))
            {
                return number;
            }

            result.AddError($"{name}: expected a whole number, found '{result.Tokens[0].Value}'");
            return 0;
        },
    };

    /// <summary>What was asked.</summary>
    private sealed record RareRequest(double Error, string Noise, PauliBasis Basis, int Distance, int Rounds, int Walkers, int Seed, int Threads)
    {
        public int RoundsOrDefault => Rounds == 0 ? 3 * Distance : Rounds;

        public MemoryModel ModelAt(double error) => FaultPropagation.Of(TextbookCircuit.Of(
            Distance, RoundsOrDefault, Basis, Noise == "slow-readout" ? UniformNoise.SlowReadout(error) : UniformNoise.EveryPlace(error)));

        /// <summary>One observable per round by the law, for noise at every place.</summary>
        public double LawPerRound(double error) =>
            0.5 * PatchError.PerRound(ScalingLaws.Simulated, PatchError.Uniform(ScalingLaws.Simulated, error), Math.Max(Distance, 3));

        /// <summary>How far the law can be trusted here.</summary>
        public string LawRemark()
        {
            string reach = ScalingLaws.Simulated.Reach(Error / ScalingLaws.Simulated.Threshold, Distance).Sentence;
            return Noise == "slow-readout" ? $"It is asked for noise at every place, so the comparison is rough. {reach}" : reach;
        }

        /// <summary>Noise at which failures are common, by the law.</summary>
        public double StartError()
        {
            double error = Error;
            while (LawPerRound(error) * RoundsOrDefault < CommonFailure && error < LargestUniform)
            {
                error *= 1.05;
            }

            return error;
        }

        public IEnumerable<Fault> Faults(double start)
        {
            if (Distance is < 3 or > 51 || Distance % 2 == 0)
            {
                yield return new Fault("--distance", 0, 0, "", $"expected an odd number from 3 to 51, found {Distance}");
            }
            else if (start <= Error)
            {
                yield return new Fault("--uniform", 0, 0, "", $"failures are not rare at {Show.Probability(Error)}: `memory` counts them directly");
            }

            if (Walkers is < 2 or > MostWalkers)
            {
                yield return new Fault("--walkers", 0, 0, "", $"expected at least 2 and at most {MostWalkers}, found {Walkers}");
            }

            if (Rounds > MostRounds)
            {
                yield return new Fault("--rounds", 0, 0, "", $"expected at most {MostRounds}, found {Rounds}");
            }

            if (Threads < 1)
            {
                yield return new Fault("--threads", 0, 0, "", $"expected at least 1, found {Threads}");
            }
        }
    }
}
