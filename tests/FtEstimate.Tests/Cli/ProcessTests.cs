using System.Diagnostics;
using FtEstimate.Cli;
using FtEstimate.Tests.Files;

namespace FtEstimate.Tests.Cli;

/// <summary>The built program as a process of its own.</summary>
public sealed class ProcessTests
{
    private static readonly string[] PartsOfTheProgram =
    [
        "FtEstimate.Cli.dll", "FtEstimate.Cli.runtimeconfig.json", "FtEstimate.dll", "FtEstimate.Files.dll", "FtEstimate.Reports.dll",
        "System.CommandLine.dll", "Tomlyn.dll",
    ];

    [Fact]
    public async Task The_program_says_the_same_as_the_commands_inside_it()
    {
        CommandRun inside = await CommandRun.FirstReportWith();
        CommandRun process = await Run(AppContext.BaseDirectory, "report", CommandRun.FirstReport);

        Assert.Equal((ExitStatus.Answer, ""), (process.Status, process.Error));
        Assert.Equal(inside.Output, process.Output);
    }

    [Fact]
    public async Task The_program_tells_the_shell_how_it_went()
    {
        Assert.Equal(ExitStatus.WrongInput, (await Run(AppContext.BaseDirectory, "report", "nowhere.toml")).Status);
        Assert.Equal(
            ExitStatus.NoMachine, (await Run(AppContext.BaseDirectory, "report", CommandRun.FirstReport, "--set", "goal.atoms_at_most=1000")).Status);
    }

    // loading the libraries for drawing and for pages takes longer than the estimate itself
    [Fact]
    public async Task Markdown_and_figures_come_without_the_libraries_for_drawing_and_pages()
    {
        using TemporaryFolder folder = new();
        foreach (string part in PartsOfTheProgram)
        {
            File.Copy(Path.Combine(AppContext.BaseDirectory, part), folder.At(part));
        }

        CommandRun run = await Run(folder.Root, "report", CommandRun.FirstReport, "--json", folder.At("r.json"));

        Assert.Equal((ExitStatus.Answer, ""), (run.Status, run.Error));
        Assert.NotEqual(ExitStatus.Answer, (await Run(folder.Root, "report", CommandRun.FirstReport, "--html", folder.At("r.html"))).Status);
    }

    private static async Task<CommandRun> Run(string folder, params string[] args)
    {
        ProcessStartInfo start = new("dotnet", [Path.Combine(folder, "FtEstimate.Cli.dll"), .. args])
        {
            RedirectStandardOutput = true,
            RedirectStandardError = true,
            StandardOutputEncoding = System.Text.Encoding.UTF8,
        };
        using Process process = Process.Start(start)!;
        Task<string> output = process.StandardOutput.ReadToEndAsync();
        Task<string> error = process.StandardError.ReadToEndAsync();
        await process.WaitForExitAsync();
        return new CommandRun(process.ExitCode, await output, await error);
    }
}
