using System.Runtime.CompilerServices;

namespace FtEstimate.MagicStates;

/// <summary>
/// The factories that none beats in atoms, rounds per state and error at once, gathered in order of rising atoms.
/// </summary>
/// <param name="errorFloor">Errors below this count as equal: less buys nothing.</param>
internal sealed class FactoryFront(double errorFloor)
{
    private readonly List<Factory> _members = [];
    private double[] _rounds = new double[64];
    private double[] _errors = new double[64];
    private int _count;

    /// <summary>The members in order of rising atoms.</summary>
    public IReadOnlyList<Factory> Members => _members;

    /// <summary>Whether a member does at least as well as a factory with as many atoms as the last member or more.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public bool Beats(double roundsPerOutput, double outputError)
    {
        double counted = Math.Max(outputError, errorFloor);
        for (int i = 0; i < _count; i++)
        {
            if (_rounds[i] <= roundsPerOutput && _errors[i] <= counted)
            {
                return true;
            }
        }

        return false;
    }

    /// <summary>Adds a factory unless a member beats it; must not have fewer atoms than the last member.</summary>
    public void Offer(Factory factory)
    {
        double rounds = factory.RoundsPerOutput;
        double counted = Math.Max(factory.OutputError, errorFloor);
        if (Beats(rounds, counted))
        {
            return;
        }

        _members.RemoveAll(member => member.Atoms == factory.Atoms
            && member.RoundsPerOutput >= rounds
            && Math.Max(member.OutputError, errorFloor) >= counted);
        _members.Add(factory);
        KeepStaircase(rounds, counted);
    }

    // All members so far have no more atoms than what comes, so only those unbeaten in rounds and error decide.
    private void KeepStaircase(double rounds, double error)
    {
        int kept = 0;
        for (int i = 0; i < _count; i++)
        {
            if (_rounds[i] < rounds || _errors[i] < error)
            {
                _rounds[kept] = _rounds[i];
                _errors[kept++] = _errors[i];
            }
        }

        if (kept == _rounds.Length)
        {
            Array.Resize(ref _rounds, 2 * kept);
            Array.Resize(ref _errors, 2 * kept);
        }

        _rounds[kept] = rounds;
        _errors[kept] = error;
        _count = kept + 1;
    }
}
