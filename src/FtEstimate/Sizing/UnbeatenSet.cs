namespace FtEstimate.Sizing;

/// <summary>The candidates that no other beats in atoms and run time at once, kept sorted by atoms.</summary>
internal sealed class UnbeatenSet
{
    private readonly List<Candidate> _byAtoms = [];

    /// <summary>The members: atoms rise, run times fall.</summary>
    public IReadOnlyList<Candidate> Members => _byAtoms;

    /// <summary>Whether some member has at most these atoms and at most this run time.</summary>
    public bool Beats(double atoms, double runSeconds)
    {
        int index = LastWithAtMost(atoms);
        return index >= 0 && _byAtoms[index].RunSeconds <= runSeconds;
    }

    /// <summary>Takes a candidate in unless it is beaten, and drops those it beats.</summary>
    public void Offer(Candidate candidate)
    {
        if (Beats(candidate.Atoms, candidate.RunSeconds))
        {
            return;
        }

        int first = LastWithAtMost(candidate.Atoms) + 1;
        while (first > 0 && _byAtoms[first - 1].Atoms == candidate.Atoms)
        {
            first--;
        }

        int end = first;
        while (end < _byAtoms.Count && _byAtoms[end].RunSeconds >= candidate.RunSeconds)
        {
            end++;
        }

        _byAtoms.RemoveRange(first, end - first);
        _byAtoms.Insert(first, candidate);
    }

    private int LastWithAtMost(double atoms)
    {
        int low = 0;
        int high = _byAtoms.Count;
        while (low < high)
        {
            int middle = (low + high) / 2;
            if (_byAtoms[middle].Atoms <= atoms)
            {
                low = middle + 1;
            }
            else
            {
                high = middle;
            }
        }

        return low - 1;
    }
}
