using System.Collections.Immutable;
using System.CommandLine;
using FtEstimate.Files;
using FtEstimate.Files.Scenarios;
using FtEstimate.MagicStates;
using FtEstimate.Reports.Json;
using FtEstimate.Reports.Listings;
using FtEstimate.Sizing;

namespace FtEstimate.Cli;

/// <summary>`factories SCENARIO` or `factories --uniform P`: what magic states would cost.</summary>
internal static class FactoriesCommand
{
    private const double LargestUniform = 0.01;

    /// <summary>The command.</summary>
    public static Command Create()
    {
        Argument<string?> scenario = new("scenario") { Description = "Scenario file (TOML)", Arity = ArgumentArity.ZeroOrOne };
        Option<double?> uniform = new("--uniform")
        {
            Description = "Every location errs with probability P, textbook law, instead of a scenario",
            HelpName = "P",
            CustomParser = CommandLineNumbers.Between("--uniform", 0, LargestUniform),
        };
        Option<bool> all = new("--all") { Description = "List the whole grid, beaten designs too" };
        Option<string?> design = new("--design") { Description = "Evaluate one design, e.g. \"15-to-1:13,5,5*6 > 15-to-1:29,11,13\"", HelpName = "DESIGN" };
        OutputOptions options = new();
        Command command = new("factories", "What magic states would cost: factories at this noise, and which no other beats") { scenario, uniform, all, design };
        options.AddTo(command);
        command.Validators.Add(result =>
        {
            if (result.GetResult(scenario) is { Tokens.Count: > 0 } == result.GetResult(uniform) is not null)
            {
                result.AddError("Give either a scenario file or --uniform P.");
            }

            if (result.GetResult(options.Set) is not null && result.GetResult(uniform) is not null)
            {
                result.AddError("--set replaces inputs of a scenario; with --uniform there are none.");
            }

            if (result.GetResult(all) is { Implicit: false } && result.GetResult(design) is not null)
            {
                result.AddError("Give either --all or --design.");
            }
        });
        command.SetAction(parsed => Run(
            new FactoriesRequest(
                parsed.GetValue(scenario), parsed.GetValue(uniform), parsed.GetValue(all), parsed.GetValue(design)),
            options.Settings(parsed),
            options.Places(parsed),
            parsed.InvocationConfiguration.Output,
            parsed.InvocationConfiguration.Error));
        return command;
    }

    private static int Run(
        FactoriesRequest request, IReadOnlyList<string> settings, OutputPlaces places, TextWriter output, TextWriter error)
    {
        FactoryDesign? design = null;
        List<Fault> faults = [];
        if (request.Design is { } text && !FactoryDesign.TryParse(text, out design, out string? fault))
        {
            faults.Add(new Fault("--design", 0, 0, "", fault));
        }

        ScenarioReading? reading = request.Scenario is { } path ? ScenarioReader.Read(path, settings) : null;
        if (FaultOutput.Stop([.. reading?.Faults ?? [], .. faults, .. places.Faults(reading?.Files ?? [])], error))
        {
            return ExitStatus.WrongInput;
        }

        CatalogueNoise noise = reading?.Scenario is { } scenario
            ? CatalogueNoise.Of(new MachineSizing(new FactoryCatalogue()).Find(scenario))
            : CatalogueNoise.Uniform(request.Uniform!.Value);
        FactoryQuestion question = new(
            reading?.Scenario is { } asked ? $"Magic states for {asked.Title}" : FormattableString.Invariant($"Magic states at a uniform error of {request.Uniform}"),
            noise.Law.Name,
            noise.Strength,
            noise.InjectedError,
            request.All || design is not null ? null : noise.ErrorAtMost);
        ImmutableArray<CatalogueEntry> entries = noise.Entries(design, request.All);
        bool written = ReportOutput.Write(
            FactoriesReport.Of(question, entries), () => JsonFigures.Of(question, entries), places, output, error);
        return written ? ExitStatus.Answer : ExitStatus.WrongInput;
    }

    /// <summary>What was asked.</summary>
    private sealed record FactoriesRequest(string? Scenario, double? Uniform, bool All, string? Design);
}
