using CsCheck;
using FtEstimate.Machines;
using FtEstimate.MagicStates;
using FtEstimate.Scenarios;
using FtEstimate.Sizing;
using FtEstimate.Tests.Cycles;
using FtEstimate.Tests.Noise;

namespace FtEstimate.Tests.Sizing;

/// <summary>What must hold for every sane machine and workload: all kinds of readout and reach, both laws, all preferences.</summary>
public sealed class SizingInvariantTests
{
    /// <summary>
    /// The search walks sizes in steps of 20 % with four factory counts in each, so neighbouring machines differ by up to 5 %, and
    /// which of them are tried shifts with the input. Mostly another machine fills the gap: of 860
    /// random machines, each made worse in up to six ways, none gained more than 0.1 %.
    /// </summary>
    private const double Resolution = 0.01;

    internal static readonly Gen<Scenario> Scenarios = Gen.Select(
        MachineGenerators.Arrays,
        Gen.Double[0.7, 2.5],
        Gen.Double[4, 9],
        Gen.OneOf(Gen.Const("published-fit"), Gen.Const("textbook")),
        Gen.Int[0, 2],
        (array, logQubits, logTStates, law, preference) =>
            Questions.Bench(Questions.Of(Math.Round(Math.Pow(10, logQubits)), Math.Round(Math.Pow(10, logTStates))), array) with
            {
                Method = Questions.Open with { Law = law },
                Goal = Questions.OnePercent with { Prefer = (Preference)preference },
            });

    private static readonly Lazy<(Scenario Question, SizingResult Answer)[]> Sized = new(() =>
        [.. Drawn.Cases(Scenarios, 40, seed: 11).Select(scenario => (scenario, scenario.Answer()))]);

    [Fact]
    public void Most_of_the_drawn_questions_have_an_answer() =>
        Assert.InRange(Sized.Value.Count(sized => sized.Answer.Best is not null), 20, 39);

    [Fact]
    public void A_worse_input_never_improves_the_answer()
    {
        Gen<(Scenario Question, ArrayChange Change, double Factor)> cases = Gen.Select(
            Scenarios, Gen.Int[0, ArrayChanges.All.Count - 1], Gen.Double[1.02, 3], (scenario, change, factor) => (scenario, ArrayChanges.All[change], factor));
        int compared = 0;
        foreach ((Scenario question, ArrayChange change, double factor) in Drawn.Cases(cases, 120, seed: 5))
        {
            Scenario worse = Worse(question, change, factor);
            if (worse == question || worse.Answer().Best is not { } after)
            {
                continue;
            }

            SizedMachine? before = question.Answer().Best;
            Assert.True(before is not null, $"{change} x {factor} turned no answer into one");
            double was = Questions.MeasureOf(before, question.Goal.Prefer);
            double became = Questions.MeasureOf(after, question.Goal.Prefer);
            Assert.True(became >= was * (1 - Resolution), $"{change} x {factor}: {question.Goal.Prefer} {was} to {became}");
            compared++;
        }

        Assert.True(compared > 30, $"only {compared} comparisons");
    }

    // at the noise of every location alike there is nothing but the law: steps in the noise are steps in the answer
    [Fact]
    public void A_noisier_abstract_machine_is_never_smaller()
    {
        double[] measures =
        [
            .. Enumerable.Range(0, 30).Select(i => Questions.MeasureOf(
                Questions.Abstract(1e-4 * Math.Pow(1.1, i), Questions.Of(50, 1e7)).Answer().Best!, Preference.LeastAtomHours)),
        ];

        for (int i = 1; i < measures.Length; i++)
        {
            Assert.True(measures[i] >= measures[i - 1] * (1 - Resolution), $"step {i}: {measures[i - 1]} to {measures[i]}");
        }
    }

    [Fact]
    public void No_listed_machine_is_beaten_in_atoms_and_run_time_at_once()
    {
        foreach ((_, SizingResult answer) in Sized.Value)
        {
            Assert.All(answer.Unbeaten, machine => Assert.DoesNotContain(answer.Unbeaten, other => other != machine
                && other.Atoms.Total <= machine.Atoms.Total && other.RunSeconds <= machine.RunSeconds));
        }
    }

    [Fact]
    public void Every_listed_machine_meets_the_goal()
    {
        foreach ((Scenario question, SizingResult answer) in Sized.Value)
        {
            Assert.All(answer.Unbeaten, machine => Assert.InRange(machine.Failure.Total, 0, question.Goal.FailureProbability));
        }
    }

    [Fact]
    public void The_preferred_machine_is_the_best_of_the_listed_ones()
    {
        foreach ((Scenario question, SizingResult answer) in Sized.Value.Where(sized => sized.Answer.Best is not null))
        {
            Assert.Equal(
                answer.Unbeaten.Min(machine => Questions.MeasureOf(machine, question.Goal.Prefer)),
                Questions.MeasureOf(answer.Best!, question.Goal.Prefer));
        }
    }

    [Fact]
    public void The_same_question_gets_the_same_answer_from_a_fresh_catalogue()
    {
        foreach ((Scenario question, SizingResult answer) in Sized.Value.Take(10))
        {
            Assert.Equal(Figures(answer), Figures(new MachineSizing(new FactoryCatalogue()).Find(question)));
        }
    }

    // a change of the unit of time: every time and lifetime times c, rates over c, so the run takes c times as long on the same atoms
    [Theory]
    [InlineData(0.3)]
    [InlineData(7)]
    public void Stretching_all_times_stretches_the_run_and_nothing_else(double stretch)
    {
        foreach ((Scenario question, SizingResult answer) in Sized.Value.Take(25))
        {
            SizedMachine? best = answer.Best;
            SizedMachine? slow = TimeUnit.Stretched(question, stretch).Answer().Best;

            Assert.Equal(best is null, slow is null);
            if (best is not null)
            {
                Assert.Equal(best.Atoms.Total, slow!.Atoms.Total);
                Assert.Equal(stretch, slow.RunSeconds / best.RunSeconds, 1e-9 * stretch);
            }
        }
    }

    // with machine-wide limits the noise grows with the machine: factories must be judged at the noise of all of them together
    [Fact]
    public void A_fixed_number_of_factories_sees_the_noise_of_the_whole_machine()
    {
        AtomArray limited = BenchMachine.Array with
        {
            Gates = BenchMachine.Array.Gates with { CzPairsAtOnce = 2000, Cz = BenchMachine.Array.Gates.Cz with { Seconds = 2e-6 } },
        };
        foreach (int count in (int[])[1, 5, 20, 40, 80])
        {
            SizingResult result = (Questions.Bench(Questions.Of(20, 1e6), limited) with { Method = Questions.Open with { FactoryCount = count } }).Answer();

            Assert.All(result.Unbeaten, machine => Assert.Equal(count, machine.FactoryCount));
            Assert.All(result.Unbeaten, machine => Assert.InRange(machine.Failure.Total, 0, 0.01));
        }
    }

    private static Scenario Worse(Scenario scenario, ArrayChange change, double factor) => scenario with
    {
        Machine = scenario.Machine with { Apparatus = change.Worse((AtomArray)scenario.Machine.Apparatus, factor) },
    };

    private static (double Atoms, double Seconds, int Distance)[] Figures(SizingResult result) =>
        [.. result.Unbeaten.Select(machine => (machine.Atoms.Total, machine.RunSeconds, machine.Distance))];
}
