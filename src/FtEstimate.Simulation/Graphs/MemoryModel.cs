using System.Collections.Immutable;

namespace FtEstimate.Simulation.Graphs;

/// <summary>A memory experiment reduced to what can go wrong: independent mechanisms, and losses, each of which flips several mechanisms at random.</summary>
/// <param name="Graph">What the decoder knows: mechanisms with their probabilities, untold losses included at their average.</param>
/// <param name="PauliProbabilities">Probability of each edge of the graph from Pauli errors alone.</param>
/// <param name="Windows">Every stretch of an atom's life in which it may be lost.</param>
public sealed record MemoryModel(
    DetectorGraph Graph, ImmutableArray<double> PauliProbabilities, ImmutableArray<LossWindow> Windows);

/// <summary>One atom from a replacement to the next look.</summary>
/// <param name="Look">Number of the look that ends it, counted through the circuit; −1 where the circuit ends first.</param>
/// <param name="Told">Whether the decoder learns at the end that the atom was lost.</param>
/// <param name="Steps">In order of time.</param>
/// <param name="Consequences">Each mechanism that the loss may flip, with its probability given a loss in this window; no mechanism twice.</param>
public sealed record LossWindow(int Look, bool Told, ImmutableArray<LossStep> Steps, ImmutableArray<LossConsequence> Consequences)
{
    /// <summary>Probability that the atom is lost in this window.</summary>
    public double LossProbability
    {
        get
        {
            double kept = 1;
            foreach (LossStep step in Steps)
            {
                kept *= 1 - step.LossProbability;
            }

            return 1 - kept;
        }
    }
}

/// <summary>An instant at which an atom may be lost, and from which on a lost atom carries a fresh random Pauli.</summary>
/// <param name="LossProbability">Probability to be lost here if not lost before; 0 where only the Pauli is drawn anew.</param>
/// <param name="Edge">The mechanism that the random Pauli flips with probability one half, or −1 where it is not seen.</param>
public readonly record struct LossStep(double LossProbability, int Edge);

/// <summary>What a loss somewhere in a window means for one mechanism.</summary>
/// <param name="Edge">The mechanism.</param>
/// <param name="Probability">That it is flipped by the loss, given the loss; at most one half.</param>
public readonly record struct LossConsequence(int Edge, double Probability);
