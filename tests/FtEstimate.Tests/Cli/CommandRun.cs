using System.Globalization;
using FtEstimate.Cli;
using FtEstimate.Tests.Files;

namespace FtEstimate.Tests.Cli;

/// <summary>One run of the program inside this process.</summary>
internal sealed record CommandRun(int Status, string Output, string Error)
{
    /// <summary>The demonstration scenario of the repository.</summary>
    public static string FirstReport { get; } = RepositoryFiles.At("scenarios", "first-report.toml");

    /// <summary>The faults, one a line, without the line that counts them.</summary>
    public string[] Faults =>
        [.. Error.Split(Environment.NewLine, StringSplitOptions.RemoveEmptyEntries).Where(line => !line.EndsWith("nothing was computed.", StringComparison.Ordinal))];

    public static async Task<CommandRun> Of(params string[] args)
    {
        using StringWriter output = new(CultureInfo.InvariantCulture);
        using StringWriter error = new(CultureInfo.InvariantCulture);
        int status = await App.RunAsync(args, output, error);
        return new CommandRun(status, output.ToString(), error.ToString());
    }

    /// <summary>A report on the demonstration scenario with more arguments.</summary>
    public static Task<CommandRun> FirstReportWith(params string[] more) => Of(["report", FirstReport, .. more]);
}
