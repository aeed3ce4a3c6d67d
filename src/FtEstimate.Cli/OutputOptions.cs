using System.CommandLine;
using System.CommandLine.Parsing;

namespace FtEstimate.Cli;

/// <summary>The options every reporting command has.</summary>
internal sealed class OutputOptions
{
    /// <summary>Where the Markdown goes instead of standard output.</summary>
    public Option<string?> Out { get; } = new("--out") { Description = "Write the report to FILE, its pictures beside it, instead of standard output", HelpName = "FILE" };

    /// <summary>Where the page goes.</summary>
    public Option<string?> Html { get; } = new("--html") { Description = "Also write the report as one self-contained page", HelpName = "FILE" };

    /// <summary>Where the figures go.</summary>
    public Option<string?> Json { get; } = new("--json") { Description = "Also write the figures for scripts", HelpName = "FILE" };

    /// <summary>Settings that replace inputs.</summary>
    public Option<string[]> Set { get; } = new("--set")
    {
        Description = "Replace one input, e.g. machine.gates.cz_error=1e-3; may be repeated",
        HelpName = "KEY=VALUE",
        Arity = ArgumentArity.OneOrMore,
        AllowMultipleArgumentsPerToken = false,
    };

    /// <summary>Adds the options to a command.</summary>
    public void AddTo(Command command)
    {
        command.Options.Add(Out);
        command.Options.Add(Html);
        command.Options.Add(Json);
        command.Options.Add(Set);
    }

    /// <summary>The settings given.</summary>
    public IReadOnlyList<string> Settings(ParseResult parsed) => parsed.GetValue(Set) ?? [];

    /// <summary>The places asked for.</summary>
    public OutputPlaces Places(ParseResult parsed) => new(parsed.GetValue(Out), parsed.GetValue(Html), parsed.GetValue(Json));
}

/// <summary>Numbers on the command line, always with a decimal point.</summary>
internal static class CommandLineNumbers
{
    /// <summary>Parses a number strictly between two bounds; the library's own parser would follow the culture.</summary>
    public static Func<ArgumentResult, double?> Between(string option, double low, double high) => result =>
    {
        string text = result.Tokens[0].Value;
        bool isNumber = double.TryParse(
            text, System.Globalization.NumberStyles.Float, System.Globalization.CultureInfo.InvariantCulture, out double value);
        if (!isNumber || !(value > low && value < high))
        {
            result.AddError(FormattableString.Invariant($"{option}: expected a number between {low} and {high}, found '{text}'"));
            return null;
        }

        return value;
    };
}
