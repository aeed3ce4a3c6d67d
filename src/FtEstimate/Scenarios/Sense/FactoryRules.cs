using FtEstimate.MagicStates;
using FtEstimate.Scenarios.Keys;

namespace FtEstimate.Scenarios.Sense;

/// <summary>The text that names a magic-state factory.</summary>
internal static class FactoryRules
{
    private const string Expected =
        $"expected \"{TileFactory.ScenarioName}\", \"15-to-1:17,7,7\", or two levels such as \"15-to-1:13,5,5*6 > 15-to-1:29,11,13\"";

    private static readonly string Factory = MethodKeys.Method.PathOf(MethodKeys.Factory);

    public static void Check(ScenarioDraft draft, List<SenseFault> faults)
    {
        if (draft.Text(Factory) is string text
            && text != TileFactory.ScenarioName
            && !FactoryDesign.TryParse(text, out _, out string? fault))
        {
            faults.Add(new SenseFault(Factory, $"{fault.TrimEnd('.')}; {Expected}"));
        }
    }
}
