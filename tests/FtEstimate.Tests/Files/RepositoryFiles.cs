namespace FtEstimate.Tests.Files;

/// <summary>Files of the repository, found from the test binaries upwards.</summary>
internal static class RepositoryFiles
{
    /// <summary>Whether committed files are rewritten instead of compared.</summary>
    public static bool AreRenewed => Environment.GetEnvironmentVariable("UPDATE_GOLDEN") == "1";

    public static string At(params string[] parts) => Path.Combine([Root(), .. parts]);

    private static string Root()
    {
        DirectoryInfo? folder = new(AppContext.BaseDirectory);
        while (folder is not null && !File.Exists(Path.Combine(folder.FullName, "FtEstimate.sln")))
        {
            folder = folder.Parent;
        }

        return folder?.FullName ?? throw new InvalidOperationException("no FtEstimate.sln above the test binaries");
    }
}
