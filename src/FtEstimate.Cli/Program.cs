using FtEstimate.Cli;

return await App.RunAsync(args, Console.Out, Console.Error).ConfigureAwait(false);
