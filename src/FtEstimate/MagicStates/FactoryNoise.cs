namespace FtEstimate.MagicStates;

/// <summary>The noise a magic-state factory sees: how often a patch fails, and how bad a state is when it is injected.</summary>
/// <param name="LogicalErrorPerRound">
/// Probability of any logical error of a d×d patch in one syndrome round, half of it X and half Z, given the odd distance d.
/// Values from 0 to 1; must not rise with d.
/// </param>
/// <param name="InjectedError">Pauli probability of a freshly injected T state, 0 to 1; one third each for P_{π/2}, P_{π/4} and P_{−π/4}.</param>
public sealed record FactoryNoise(Func<int, double> LogicalErrorPerRound, double InjectedError);
