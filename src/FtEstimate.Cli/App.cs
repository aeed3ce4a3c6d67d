using System.CommandLine;
using System.CommandLine.Invocation;

namespace FtEstimate.Cli;

/// <summary>The command line: builds the commands, runs one, turns its outcome into an exit status.</summary>
public static class App
{
    /// <summary>Runs one command line.</summary>
    /// <param name="args">The words after the program's name.</param>
    /// <param name="output">Where reports go.</param>
    /// <param name="error">Where faults and progress go.</param>
    /// <param name="cancel">Interrupts what can be interrupted, like a signal.</param>
    /// <returns>0 an answer, 2 wrong input, 3 no machine meets the goal, 130 interrupted.</returns>
    public static async Task<int> RunAsync(IReadOnlyList<string> args, TextWriter output, TextWriter error, CancellationToken cancel = default)
    {
        RootCommand root = new(
            "FtEstimate: from bench numbers of a neutral-atom machine to the atoms and the time a fault-tolerant run needs.")
        {
            ReportCommand.Create(),
            WorkloadCommand.Create(),
            FactoriesCommand.Create(),
            MemoryCommand.Create(),
            ValidationCommand.Create(),
            RareCommand.Create(),
            CalibrateCommand.Create(),
        };
        root.SetAction(parsed => new System.CommandLine.Help.HelpAction().Invoke(parsed));

        // "@file" is an ordinary word here
        ParseResult parsed = root.Parse(args, new ParserConfiguration { ResponseFileTokenReplacer = null });
        if (parsed.Action is ParseErrorAction parseError)
        {
            parseError.ShowHelp = false;
        }

        // what is said about a wrong command line is no report
        bool isWrong = parsed.Action is ParseErrorAction;
        InvocationConfiguration io = new()
        {
            Output = isWrong ? error : output,
            Error = error,
            EnableDefaultExceptionHandler = false,

            // commands that run long listen for signals themselves and finish what they are at, however long they take
            ProcessTerminationTimeout = null,
        };
        try
        {
            int status = await parsed.InvokeAsync(io, cancel).ConfigureAwait(false);
            return isWrong ? ExitStatus.WrongInput : status;
        }
        catch (OperationCanceledException)
        {
            await error.WriteLineAsync("interrupted").ConfigureAwait(false);
            return ExitStatus.Interrupted;
        }
    }
}

/// <summary>What the program tells the shell.</summary>
public static class ExitStatus
{
    /// <summary>An answer.</summary>
    public const int Answer = 0;

    /// <summary>The input is wrong.</summary>
    public const int WrongInput = 2;

    /// <summary>The input is right, but no machine meets the goal.</summary>
    public const int NoMachine = 3;

    /// <summary>Interrupted.</summary>
    public const int Interrupted = 130;
}
