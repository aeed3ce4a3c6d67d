using FtEstimate.Noise;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Graphs;
using FtEstimate.Simulation.Sampling;

namespace FtEstimate.Tests.Simulation.Circuits;

/// <summary>One error in an otherwise quiet circuit: by quantum mechanics, by hand, by frames and by mechanisms.</summary>
public sealed class SingleFaultTests
{
    [Theory]
    [InlineData("textbook", PauliBasis.Z)]
    [InlineData("textbook", PauliBasis.X)]
    [InlineData("atoms", PauliBasis.Z)]
    [InlineData("atoms", PauliBasis.X)]
    public void An_error_anywhere_fires_the_detectors_that_quantum_mechanics_says(string name, PauliBasis basis)
    {
        Circuit quiet = Quiet(name, 3, 2, basis);
        RandomBits random = new(5, basis == PauliBasis.Z ? 0UL : 1UL);
        Assert.Equal(new Outcome("", "", false), Outcome.Of(quiet, StateVector.Results(quiet, -1, 0, PauliBasis.X, ref random)));
        int seen = 0;
        for (int trial = 0; trial < 16; trial++)
        {
            int before = quiet.AtomCount + random.NextBelow(quiet.Operations.Length - quiet.AtomCount);
            int atom = random.NextBelow(quiet.AtomCount);
            PauliBasis fault = random.NextBelow(2) == 0 ? PauliBasis.X : PauliBasis.Z;

            Outcome truth = Outcome.Of(quiet, StateVector.Results(quiet, before, atom, fault, ref random));

            Assert.Equal(truth, ByMechanisms(quiet, before, atom, fault));
            Assert.Equal(truth with { OtherType = "" }, ByFrames(quiet, before, atom, fault));
            seen += truth.OwnType.Length > 0 || truth.OtherType.Length > 0 ? 1 : 0;
        }

        Assert.True(seen >= 5);
    }

    // by hand: data atoms 0 1 2 / 3 4 5 / 6 7 8; Z checks 0 of 0 1 3 4, 1 of 2 5, 2 of 3 6, 3 of 4 5 7 8; four detectors a round; observable 0 1 2
    [Theory]
    [InlineData(0, "0", true)]
    [InlineData(1, "0", true)]
    [InlineData(2, "1", true)]
    [InlineData(3, "0 2", false)]
    [InlineData(4, "0 3", false)]
    [InlineData(7, "3", false)]
    public void An_X_error_before_the_first_round_fires_the_Z_checks_beside_it(int atom, string defects, bool flips)
    {
        Circuit quiet = Quiet("textbook", 3, 2, PauliBasis.Z);
        int before = IndexOf(quiet, OperationKind.Hadamard);

        Assert.Equal(new Outcome(defects, "", flips), ByFrames(quiet, before, atom, PauliBasis.X));
        Assert.Equal(new Outcome("", "", false), ByFrames(quiet, before, atom, PauliBasis.Z));
    }

    [Fact]
    public void An_X_error_before_the_final_reading_fires_the_last_detectors_beside_it()
    {
        Circuit quiet = Quiet("atoms", 3, 2, PauliBasis.Z);

        Assert.Equal(new Outcome("8 11", "", false), ByFrames(quiet, quiet.Operations.Length - 9, 4, PauliBasis.X));
    }

    [Fact]
    public void A_misread_check_fires_its_detectors_in_this_round_and_the_next()
    {
        Circuit quiet = Quiet("textbook", 3, 2, PauliBasis.Z);
        int atom = quiet.Operations.First(operation => operation.Kind == OperationKind.ControlledX && operation.A == 4 && operation.B >= 9).B;
        int before = IndexOf(quiet, OperationKind.MeasureZ);
        string defects = ByFrames(quiet, before, atom, PauliBasis.X).OwnType;

        Assert.Contains(defects, (string[])["0 4", "3 7"]);
    }

    [Theory]
    [InlineData("textbook")]
    [InlineData("atoms")]
    public void A_quiet_circuit_never_fires(string name)
    {
        Circuit quiet = Quiet(name, 5, 5, PauliBasis.Z);
        MemoryModel model = FaultPropagation.Of(quiet);
        FrameSampler frames = new(quiet, model);
        MechanismSampler mechanisms = new(model);
        frames.Begin(1, 0);
        mechanisms.Begin(1, 0);
        for (int shot = 0; shot < 200; shot++)
        {
            SampledShot byFrames = frames.NextShot();
            Assert.True(byFrames.Defects.IsEmpty && byFrames.Told.IsEmpty && !byFrames.ObservableFlipped);
            SampledShot byMechanisms = mechanisms.NextShot();
            Assert.True(byMechanisms.Defects.IsEmpty && byMechanisms.Told.IsEmpty && !byMechanisms.ObservableFlipped);
        }
    }

    private static int IndexOf(Circuit circuit, OperationKind kind) =>
        circuit.Operations.Select((operation, index) => (operation, index)).First(entry => entry.operation.Kind == kind).index;

    private static Circuit Quiet(string name, int distance, int rounds, PauliBasis basis) => name == "textbook"
        ? TextbookCircuit.Of(distance, rounds, basis, UniformNoise.EveryPlace(0))
        : AtomCircuit.Of(distance, rounds, basis, new RoundErrors());

    private static Circuit Struck(Circuit quiet, int before, int atom, PauliBasis fault, double probability) => TestCircuits.With(
        quiet,
        before,
        new Operation(
            OperationKind.PauliNoise, atom, Channel: fault == PauliBasis.X ? new PauliChannel(probability, 0, 0) : new PauliChannel(0, 0, probability)));

    private static Outcome ByFrames(Circuit quiet, int before, int atom, PauliBasis fault)
    {
        Circuit struck = Struck(quiet, before, atom, fault, 1);
        FrameSampler sampler = new(struck, FaultPropagation.Of(quiet));
        sampler.Begin(3, 0);
        SampledShot shot = sampler.NextShot();
        return new Outcome(string.Join(' ', shot.Defects.ToArray()), "", shot.ObservableFlipped);
    }

    private static Outcome ByMechanisms(Circuit quiet, int before, int atom, PauliBasis fault)
    {
        Circuit struck = Struck(quiet, before, atom, fault, 0.25);
        (string own, bool flips) = OnlyMechanism(FaultPropagation.Of(struck).Graph);
        PauliBasis other = quiet.Basis == PauliBasis.X ? PauliBasis.Z : PauliBasis.X;
        return new Outcome(own, OnlyMechanism(FaultPropagation.Of(struck, other).Graph).Detectors, flips);
    }

    private static (string Detectors, bool Flips) OnlyMechanism(DetectorGraph graph)
    {
        if (graph.Edges.IsEmpty)
        {
            return ("", false);
        }

        GraphEdge edge = Assert.Single(graph.Edges);
        Assert.Equal(0.25, edge.Probability, 12);
        return (edge.MeetsBoundary ? $"{edge.A}" : $"{edge.A} {edge.B}", edge.FlipsObservable);
    }

    private sealed record Outcome(string OwnType, string OtherType, bool FlipsObservable)
    {
        public static Outcome Of(Circuit circuit, bool[] results)
        {
            string Fired(bool own) => string.Join(' ', circuit.Detectors
                .Where(detector => detector.Basis == circuit.Basis == own)
                .Select((detector, number) => (Number: number, Fired: detector.Measurements.Count(result => results[result]) % 2 == 1))
                .Where(entry => entry.Fired)
                .Select(entry => entry.Number));
            return new Outcome(Fired(true), Fired(false), circuit.Observable.Count(result => results[result]) % 2 == 1);
        }
    }
}
