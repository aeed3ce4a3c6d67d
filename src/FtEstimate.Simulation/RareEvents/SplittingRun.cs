using FtEstimate.Simulation.Sampling;

namespace FtEstimate.Simulation.RareEvents;

/// <summary>What one ladder found.</summary>
/// <param name="LogProbability">ln of the failure probability at each level, by Bennett's ratios.</param>
/// <param name="LogForward">The same from ratios that look down only.</param>
/// <param name="Acceptance">Share of the proposed changes that were made, at each level.</param>
/// <param name="StartShots">Shots at the first level.</param>
/// <param name="SurvivingStarts">Starting shots from which samples of the last level descend.</param>
internal sealed record SplittingTrace(double[] LogProbability, double[] LogForward, double[] Acceptance, long StartShots, int SurvivingStarts);

/// <summary>
/// One ladder: failing shots at the first level by plain Monte Carlo, then level by level chains that begin with samples of the level above,
/// chosen by their weight at the new one.
/// </summary>
/// <remarks>
/// All samples of a level are candidates, not the last of each chain only (Dau 2022, arXiv:2011.02328, from memory): noise far from the logical error,
/// which chains change quickly, then hardly decides which chains live on. The choice makes the product of forward ratios free of bias however slowly chains move.
/// </remarks>
internal sealed class SplittingRun
{
    private readonly NoiseLadder ladder;
    private readonly LadderPlan plan;
    private readonly FailingChain chain;
    private readonly Action levelDone;
    private readonly CancellationToken cancel;
    private readonly double[] down;
    private readonly double[] up;
    private readonly double[] downAbove;
    private readonly int[] beginnings;
    private SamplePool above = new();
    private SamplePool here = new();
    private RandomBits random;

    public SplittingRun(NoiseLadder ladder, LadderPlan plan, int number, Action levelDone, CancellationToken cancel)
    {
        this.ladder = ladder;
        this.plan = plan;
        this.levelDone = levelDone;
        this.cancel = cancel;
        chain = new FailingChain(ladder);
        random = new RandomBits(plan.Seed, (ulong)number);
        int samples = plan.Walkers * plan.SamplesPerLevel;
        down = new double[samples];
        up = new double[samples];
        downAbove = new double[samples];
        beginnings = new int[plan.Walkers];
    }

    /// <summary>Climbs down.</summary>
    public SplittingTrace Run()
    {
        NoiseLevel[] levels = ladder.Levels;
        double[] probability = new double[levels.Length];
        double[] forward = new double[levels.Length];
        double[] acceptance = new double[levels.Length];
        long shots = DrawStarts();

        // without bias where shots are drawn until a number of failures (Haldane 1945)
        probability[0] = Math.Log((plan.StartFailures - 1.0) / (shots - 1));
        forward[0] = probability[0];
        for (int level = 0; level < levels.Length; level++)
        {
            acceptance[level] = WalkAt(level);
            if (level > 0)
            {
                probability[level] = probability[level - 1] + BennettRatio.LogOf(downAbove, up);
                forward[level] = forward[level - 1] + BennettRatio.LogForward(downAbove);
            }

            (above, here) = (here, above);
            down.CopyTo(downAbove, 0);
            levelDone();
        }

        return new SplittingTrace(probability, forward, acceptance, shots, above.DistinctRoots());
    }

    private long DrawStarts()
    {
        long shots = 0;
        int failures = 0;
        while (failures < plan.StartFailures)
        {
            cancel.ThrowIfCancellationRequested();
            shots++;
            if (chain.DrawAnew(ladder.Levels[0], ref random))
            {
                if (failures < plan.Walkers)
                {
                    above.Add(chain.Faults, failures);
                }

                failures++;
            }
        }

        return shots;
    }

    private double WalkAt(int number)
    {
        NoiseLevel level = ladder.Levels[number];
        NoiseLevel higher = ladder.Levels[Math.Max(number - 1, 0)];
        NoiseLevel lower = ladder.Levels[Math.Min(number + 1, ladder.Levels.Length - 1)];
        ChooseBeginnings(number);
        here.Clear();
        long made = 0;
        for (int walker = 0; walker < plan.Walkers; walker++)
        {
            cancel.ThrowIfCancellationRequested();
            chain.StartFrom(above.At(beginnings[walker]));
            int root = above.RootOf(beginnings[walker]);
            for (int sample = 0; sample < plan.SamplesPerLevel; sample++)
            {
                made += chain.Walk(level, plan.MovesPerSample, ref random);
                ReadOnlySpan<int> faults = chain.Faults;
                double log = level.LogProbabilityOf(faults);
                up[here.Count] = log - higher.LogProbabilityOf(faults);
                down[here.Count] = lower.LogProbabilityOf(faults) - log;
                here.Add(faults, root);
            }
        }

        return (double)made / ((long)down.Length * plan.MovesPerSample);
    }

    // evenly spaced points on the summed weights: the number of copies of a sample is its share, rounded up or down
    private void ChooseBeginnings(int level)
    {
        if (level == 0)
        {
            for (int walker = 0; walker < beginnings.Length; walker++)
            {
                beginnings[walker] = walker;
            }

            return;
        }

        double mean = BennettRatio.LogForward(downAbove);
        double spacing = (double)above.Count / beginnings.Length;
        double point = spacing * random.NextUnit();
        double sum = 0;
        int chosen = 0;
        for (int sample = 0; sample < above.Count; sample++)
        {
            sum += Math.Exp(downAbove[sample] - mean);
            while (chosen < beginnings.Length && (point <= sum || sample == above.Count - 1))
            {
                beginnings[chosen++] = sample;
                point += spacing;
            }
        }
    }
}
