using System.Numerics;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Graphs;

namespace FtEstimate.Simulation.Sampling;

/// <summary>
/// Draws shots by running the circuit itself: every atom carries the X and Z parts of its error, 64 shots to a machine word. Slower than drawing
/// mechanisms, and independent of how those were found: the two must agree.
/// </summary>
public sealed class FrameSampler : IShotSampler
{
    private readonly Circuit circuit;
    private readonly FrameBatch batch;
    private readonly int[][] detectorResults;
    private readonly int[][] defects;
    private readonly int[] counts = new int[FrameBatch.Shots];
    private readonly Dictionary<int, LossWindow> windowOfLook;
    private readonly ToldLosses told;
    private ulong observable;
    private int shot;
    private RandomBits random;

    /// <summary>A sampler of a circuit.</summary>
    /// <param name="circuit">The circuit.</param>
    /// <param name="model">Its model, which says what told losses mean.</param>
    public FrameSampler(Circuit circuit, MemoryModel model)
    {
        this.circuit = circuit;
        batch = new FrameBatch(circuit);
        detectorResults = [.. circuit.Detectors.Where(detector => detector.Basis == circuit.Basis).Select(detector => detector.Measurements.ToArray())];
        defects = [.. Enumerable.Range(0, FrameBatch.Shots).Select(_ => new int[detectorResults.Length])];
        windowOfLook = model.Windows.Where(window => window.Told).ToDictionary(window => window.Look);
        told = new ToldLosses(model.Graph);
    }

    /// <inheritdoc/>
    public void Begin(ulong seed, ulong block)
    {
        random = new RandomBits(seed, block);
        batch.Begin(ref random);
        shot = FrameBatch.Shots;
    }

    /// <inheritdoc/>
    public SampledShot NextShot()
    {
        if (shot == FrameBatch.Shots)
        {
            RunBatch();
        }

        foreach ((int look, LossWindow window) in windowOfLook)
        {
            if (((batch.LostAtLook[look] >> shot) & 1) != 0)
            {
                told.Add(window);
            }
        }

        SampledShot sampled = new(defects[shot].AsSpan(0, counts[shot]), told.Take(), ((observable >> shot) & 1) != 0);
        shot++;
        return sampled;
    }

    private void RunBatch()
    {
        batch.Run(ref random);
        shot = 0;
        Array.Clear(counts);
        for (int detector = 0; detector < detectorResults.Length; detector++)
        {
            ulong fired = 0;
            foreach (int result in detectorResults[detector])
            {
                fired ^= batch.Results[result];
            }

            for (; fired != 0; fired &= fired - 1)
            {
                int of = BitOperations.TrailingZeroCount(fired);
                defects[of][counts[of]++] = detector;
            }
        }

        observable = 0;
        foreach (int result in circuit.Observable)
        {
            observable ^= batch.Results[result];
        }
    }
}
