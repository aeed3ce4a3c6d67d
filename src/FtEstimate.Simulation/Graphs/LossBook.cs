using System.Collections.Immutable;
using FtEstimate.Simulation.Circuits;

namespace FtEstimate.Simulation.Graphs;

/// <summary>Cuts the lives of the atoms into windows between two looks while a circuit is walked backwards.</summary>
/// <param name="circuit">The circuit.</param>
/// <param name="mechanisms">The mechanisms of the circuit.</param>
internal sealed class LossBook(Circuit circuit, MechanismTable mechanisms)
{
    private const int NoLook = -1;

    private readonly List<LossStep>?[] open = new List<LossStep>?[circuit.AtomCount];
    private readonly bool[] told = new bool[circuit.AtomCount];
    private readonly int[] look = [.. Enumerable.Repeat(NoLook, circuit.AtomCount)];
    private readonly List<LossWindow> windows = [];
    private int looks = circuit.Operations.Count(operation => operation.Kind is OperationKind.ReplaceTold or OperationKind.ReplaceUntold);

    /// <summary>An instant at which an atom may be lost or a lost one gets a fresh Pauli.</summary>
    public void Step(int atom, double lossProbability, Symptom seen) =>
        (open[atom] ??= []).Add(new LossStep(lossProbability, mechanisms.IndexOf(seen)));

    /// <summary>A look at an atom: the window after it is complete, the one before it begins.</summary>
    public void Look(int atom, bool isTold)
    {
        CloseWindow(atom);
        told[atom] = isTold;
        look[atom] = --looks;
    }

    /// <summary>All windows, earliest last look first.</summary>
    public ImmutableArray<LossWindow> Close()
    {
        for (int atom = 0; atom < open.Length; atom++)
        {
            CloseWindow(atom);
        }

        windows.Reverse();
        return [.. windows];
    }

    /// <summary>Probabilities of the mechanisms with losses that nobody tells, each as often as it happens on average.</summary>
    public static double[] WithUntold(ImmutableArray<double> pauli, ImmutableArray<LossWindow> windows)
    {
        double[] all = [.. pauli];
        foreach (LossWindow window in windows)
        {
            if (window.Told)
            {
                continue;
            }

            double lost = window.LossProbability;
            foreach (LossConsequence consequence in window.Consequences)
            {
                all[consequence.Edge] = MechanismTable.EitherNotBoth(all[consequence.Edge], lost * consequence.Probability);
            }
        }

        return all;
    }

    private void CloseWindow(int atom)
    {
        if (open[atom] is { } steps)
        {
            steps.Reverse();
            LossWindow window = new(look[atom], told[atom], [.. steps], []);
            if (window.LossProbability > 0 && steps.Exists(step => step.Edge >= 0))
            {
                windows.Add(window with { Consequences = ConsequencesOf(steps, window.LossProbability) });
            }
        }

        open[atom] = null;
        told[atom] = false;
        look[atom] = NoLook;
    }

    /// <summary>A mechanism is flipped with probability one half if the loss came before one of its draws, whatever else is drawn.</summary>
    private static ImmutableArray<LossConsequence> ConsequencesOf(List<LossStep> steps, double lossProbability)
    {
        Dictionary<int, double> drawn = [];
        double kept = 1;
        for (int lostAt = 0; lostAt < steps.Count; lostAt++)
        {
            double here = kept * steps[lostAt].LossProbability;
            kept *= 1 - steps[lostAt].LossProbability;
            if (here > 0)
            {
                foreach (int edge in DrawnEdges(steps, lostAt))
                {
                    drawn[edge] = drawn.GetValueOrDefault(edge) + (here / lossProbability);
                }
            }
        }

        return [.. drawn.Select(entry => new LossConsequence(entry.Key, Math.Min(entry.Value, 1) / 2))];
    }

    /// <summary>Mechanisms that a loss at a step flips at random: that of the step, and those of every later step at which the Pauli is drawn anew.</summary>
    private static IEnumerable<int> DrawnEdges(List<LossStep> steps, int lostAt) => steps
        .Where((step, index) => step.Edge >= 0 && (index == lostAt || (index > lostAt && step.LossProbability == 0)))
        .Select(step => step.Edge)
        .Distinct();
}
