using FtEstimate.Machines;
using FtEstimate.Scenarios;
using FtEstimate.Sizing;
using FtEstimate.Tests.Cycles;

namespace FtEstimate.Tests.Sizing;

public sealed class NoAnswerTests
{
    private static readonly Scenario Easy = Questions.Bench(Questions.Of(20, 1e6));

    [Fact]
    public void Noise_above_threshold_is_named_as_such()
    {
        NoAnswer none = NoAnswerOf(Questions.Bench(Questions.Of(20, 1e6), Noisier(BenchMachine.Array, 12)));

        Assert.Equal(Obstacle.AboveThreshold, none.Reason);
        Assert.True(none.Strength > 1);
        Assert.Null(none.Closest);
    }

    [Fact]
    public void A_workload_beyond_every_distance_is_named_as_such()
    {
        NoAnswer none = NoAnswerOf(Questions.Abstract(9e-3, Questions.Of(1000, 1e14)));

        Assert.Equal(Obstacle.FailureProbability, none.Reason);
        Assert.True(none.Strength < 1);
    }

    [Fact]
    public void Too_few_atoms_allowed_too_little_time_or_too_few_atoms_delivered_are_limits()
    {
        SizedMachine smallest = (Easy with { Goal = Easy.Goal with { Prefer = Preference.FewestAtoms } }).Answer().Best!;
        SizedMachine fastest = (Easy with { Goal = Easy.Goal with { Prefer = Preference.ShortestRun } }).Answer().Best!;

        NoAnswer atoms = NoAnswerOf(Easy with { Goal = Easy.Goal with { AtomsAtMost = smallest.Atoms.Total * 0.3 } });
        NoAnswer time = NoAnswerOf(Easy with { Goal = Easy.Goal with { RunSecondsAtMost = fastest.Elapsed.Seconds * 0.3 } });
        NoAnswer supply = NoAnswerOf(Easy with { Machine = Easy.Machine with { Supply = new Supply(1e-3, 0) } });

        Assert.All([atoms, time, supply], none => Assert.Equal(Obstacle.Limits, none.Reason));
        Assert.All([atoms, time, supply], none => Assert.NotNull(none.Closest));
        Assert.Equal(LimitedResource.Atoms, Assert.Single(atoms.Limits, limit => limit.Enough is not null).Resource);
        Assert.Equal(LimitedResource.ElapsedSeconds, Assert.Single(time.Limits, limit => limit.Enough is not null).Resource);
        Assert.Equal(LimitedResource.AtomsPerSecond, Assert.Single(supply.Limits, limit => limit.Enough is not null).Resource);
    }

    // a thousandth above, since the search holds factories at noise rounded up
    [Fact]
    public void What_would_be_enough_is_enough()
    {
        double atoms = Enough(Easy with { Goal = Easy.Goal with { AtomsAtMost = 1000 } });
        double seconds = Enough(Easy with { Goal = Easy.Goal with { RunSecondsAtMost = 1 } });
        double supply = Enough(Easy with { Machine = Easy.Machine with { Supply = new Supply(1e-3, 0) } });

        Assert.NotNull((Easy with { Goal = Easy.Goal with { AtomsAtMost = atoms * 1.001 } }).Answer().Best);
        Assert.NotNull((Easy with { Goal = Easy.Goal with { RunSecondsAtMost = seconds * 1.02 } }).Answer().Best);
        Assert.NotNull((Easy with { Machine = Easy.Machine with { Supply = new Supply(supply * 1.001, 0) } }).Answer().Best);

        static double Enough(Scenario scenario) => Assert.Single(NoAnswerOf(scenario).Limits, limit => limit.Enough is not null).Enough!.Value;
    }

    [Fact]
    public void Limits_that_the_machine_just_keeps_are_no_obstacle()
    {
        SizedMachine machine = Easy.Answer().Best!;
        Scenario limited = Easy with
        {

            // the search judges factories at noise rounded up by 2 %, so it needs a little more time than it reports
            Goal = Easy.Goal with { AtomsAtMost = machine.Atoms.Total, RunSecondsAtMost = machine.Elapsed.Seconds * 1.02 },
            Machine = Easy.Machine with { Supply = new Supply(machine.LossPerSecond, 0) },
        };

        SizedMachine again = limited.Answer().Best!;

        Assert.Equal(machine.Atoms.Total, again.Atoms.Total);
    }

    [Theory]
    [InlineData(6)]
    [InlineData(12)]
    public void Noise_lowered_to_the_needed_strength_gives_an_answer(double factor)
    {
        AtomArray noisy = Noisier(BenchMachine.Array, factor);
        Scenario question = Questions.Bench(Questions.Of(20, 1e6), noisy);
        NoAnswer none = NoAnswerOf(question);
        double scale = none.StrengthNeeded!.Value / none.Strength;

        // errors and loss scale the strength; waiting does too through the coherence times, though not quite linearly: 3 %
        SizingResult lower = Questions.Bench(question.Workload, Noisier(noisy, 0.97 * scale)).Answer();
        SizingResult higher = Questions.Bench(question.Workload, Noisier(noisy, 1.03 * scale)).Answer();

        Assert.NotNull(lower.Best);
        Assert.Null(higher.Best);
    }

    [Fact]
    public void Blame_is_shared_out_in_full_largest_first()
    {
        NoAnswer none = NoAnswerOf(Questions.Bench(Questions.Of(20, 1e6), Noisier(BenchMachine.Array, 12)));

        Assert.Equal(1, none.Blame.Sum(channel => channel.Share), 1e-12);
        Assert.Equal(none.Blame.OrderByDescending(channel => channel.Share), none.Blame);
    }

    // a cause with less than the excess cannot save the machine on its own; one with more must give up exactly the excess
    [Fact]
    public void A_single_cause_is_asked_for_exactly_the_excess()
    {
        NoAnswer none = NoAnswerOf(Questions.Bench(Questions.Of(20, 1e6), Noisier(BenchMachine.Array, 12)));
        double excess = (none.Strength - none.StrengthNeeded!.Value) / none.Strength;

        foreach (BlamedChannel channel in none.Blame)
        {
            if (channel.NeededPerLocation is { } needed)
            {
                Assert.Equal(excess, channel.Share * (1 - (needed / channel.PerLocation)), 1e-9);
            }
            else
            {
                Assert.True(channel.Share < excess);
            }
        }
    }

    private static NoAnswer NoAnswerOf(Scenario scenario)
    {
        SizingResult result = scenario.Answer();
        Assert.Null(result.Best);
        Assert.Empty(result.Unbeaten);
        return result.NoAnswer!;
    }

    /// <summary>Every error and loss times a factor, coherence and lifetimes over it.</summary>
    private static AtomArray Noisier(AtomArray array, double f)
    {
        MovedApart apart = (MovedApart)array.Readout;
        StatedReadout stated = (StatedReadout)apart.Detector;
        MovedAtoms moved = (MovedAtoms)array.Reach;
        return array with
        {
            Gates = array.Gates with
            {
                Cz = array.Gates.Cz with { Infidelity = array.Gates.Cz.Infidelity * f, Loss = array.Gates.Cz.Loss * f },
                OneQubitInfidelity = array.Gates.OneQubitInfidelity * f,
                ResetFlip = array.Gates.ResetFlip * f,
            },
            Coherence = array.Coherence with
            {
                T1Seconds = array.Coherence.T1Seconds / f,
                T2Seconds = array.Coherence.T2Seconds / f,
                VacuumLifetimeSeconds = array.Coherence.VacuumLifetimeSeconds / f,
            },
            Reach = moved with { HandoffInfidelity = moved.HandoffInfidelity * f, LossPerMove = moved.LossPerMove * f },
            Readout = apart with
            {
                DataDisturbancePerSecond = apart.DataDisturbancePerSecond * f,
                Detector = stated with
                {
                    DarkFlip = stated.DarkFlip * f,
                    BrightFlip = stated.BrightFlip * f,
                    LossPerLook = stated.LossPerLook * f,
                },
            },
        };
    }
}
