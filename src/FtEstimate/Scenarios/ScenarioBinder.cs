using FtEstimate.Scenarios.Keys;

namespace FtEstimate.Scenarios;

/// <summary>Turns inputs into the records the models read: likely values, SI units, defaults filled in.</summary>
public static class ScenarioBinder
{
    /// <summary>The scenario that checked inputs describe. Pure, and quick enough to be called for every draw of an uncertainty run.</summary>
    /// <param name="inputs">Inputs with the bounds of <see cref="ScenarioKeys"/> for which <see cref="PhysicalSense"/> finds no fault.</param>
    /// <exception cref="InvalidOperationException">A needed input is missing: the inputs were not checked.</exception>
    public static Scenario Bind(InputSet inputs) => new(
        new TableInputs(inputs, "").Text(GoalKeys.Title),
        MachineBinder.Bind(inputs),
        WorkloadBinder.Bind(inputs),
        BindGoal(new TableInputs(inputs, GoalKeys.Goal.Path)),
        BindMethod(new TableInputs(inputs, MethodKeys.Method.Path)),
        inputs);

    private static Goal BindGoal(TableInputs goal) => new(
        goal.Number(GoalKeys.FailureProbability),
        goal.Text(GoalKeys.Prefer) switch
        {
            "least-atom-hours" => Preference.LeastAtomHours,
            "fewest-atoms" => Preference.FewestAtoms,
            "shortest-run" => Preference.ShortestRun,
            string other => throw new InvalidOperationException($"unchecked preference {other}"),
        },
        goal.NumberOrNull(GoalKeys.AtomsAtMost),
        goal.NumberOrNull(GoalKeys.RunAtMostDays));

    private static Method BindMethod(TableInputs method) => new(
        method.Text(MethodKeys.Law),
        method.Text(MethodKeys.Patch),
        method.TextOrNull(MethodKeys.Style),
        method.TextOrNull(MethodKeys.Block),
        method.TextOrNull(MethodKeys.Factory),
        (int?)method.NumberOrNull(MethodKeys.FactoryCount),
        method.NumberOrNull(MethodKeys.Patches),
        method.NumberOrNull(MethodKeys.InjectedError),
        method.Text(MethodKeys.FailureSplit),
        method.Text(MethodKeys.Synthesis),
        method.Number(MethodKeys.RoutingFraction),
        method.NumberOrNull(MethodKeys.GatesPerRound));
}
