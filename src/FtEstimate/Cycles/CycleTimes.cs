namespace FtEstimate.Cycles;

/// <summary>The durations of one average round that time, errors and loss are computed from.</summary>
/// <param name="RoundSeconds">The round: the critical path.</param>
/// <param name="LayerSeconds">One CZ layer with its moves, the mean of the four.</param>
/// <param name="WaitingSeconds">Data atoms waiting outside the gate sequence, unshelved.</param>
/// <param name="ShelvedSeconds">Data atoms waiting shelved.</param>
/// <param name="ChecksMoveInGroups">Whether checks are picked up and dropped for every layer because not all move at once.</param>
public readonly record struct CycleTimes(
    double RoundSeconds,
    double LayerSeconds,
    double WaitingSeconds,
    double ShelvedSeconds,
    bool ChecksMoveInGroups);

/// <summary>One phase of a round as it is reported.</summary>
/// <param name="Name">What is done.</param>
/// <param name="Part">Which part of the round it belongs to.</param>
/// <param name="StartSeconds">From the start of the round.</param>
/// <param name="Seconds">Duration, averaged over rounds when it is not done in each.</param>
/// <param name="Goes">Groups served one after another.</param>
/// <param name="Data">What the data atoms do.</param>
public sealed record CyclePhase(string Name, CyclePart Part, double StartSeconds, double Seconds, double Goes, DataState Data);
