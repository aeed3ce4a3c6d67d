using System.Text;

namespace FtEstimate.Files;

/// <summary>Writes outputs so that a file is either the old one or the complete new one.</summary>
public static class AtomicFile
{
    private static readonly UTF8Encoding Utf8 = new(encoderShouldEmitUTF8Identifier: false);

    /// <summary>Writes a text beside the file, flushes it to the disk, and renames it.</summary>
    /// <param name="path">The file; replaced when it exists. Its folder must exist.</param>
    /// <param name="text">The whole new content, written as UTF-8.</param>
    /// <returns>Null, or why the file could not be written; then the old file is untouched.</returns>
    public static Fault? Write(string path, string text)
    {
        string? beside = null;
        try
        {
            if (IsDevice(path))
            {
                File.WriteAllText(path, text, Utf8);
                return null;
            }

            // a link stays a link: the file it points to is replaced
            string target = (File.Exists(path) ? File.ResolveLinkTarget(path, returnFinalTarget: true)?.FullName : null) ?? Path.GetFullPath(path);
            if (Directory.Exists(target))
            {
                return new Fault(path, 0, 0, "", "cannot be written: it is a folder");
            }

            beside = $"{target}.{Guid.NewGuid():N}.part";
            using (FileStream stream = new(beside, FileMode.CreateNew, FileAccess.Write))
            {
                stream.Write(Utf8.GetBytes(text));
                stream.Flush(flushToDisk: true);
            }

            KeepPermissions(target, beside);
            File.Move(beside, target, overwrite: true);
            return null;
        }
        catch (Exception problem) when (problem is IOException or UnauthorizedAccessException or ArgumentException or NotSupportedException)
        {
            Discard(beside);
            return new Fault(path, 0, 0, "", $"cannot be written: {Reason(problem)}");
        }
    }

    /// <summary>Why a file cannot be written where it is asked for, as far as that shows before writing; null: nothing speaks against it.</summary>
    /// <param name="path">The file.</param>
    public static Fault? FaultOfPlace(string path)
    {
        string? why = !IsFileName(path) ? "not a file name"
            : IsDevice(path) ? null
            : Directory.Exists(path) ? "it is a folder"
            : !Directory.Exists(Path.GetDirectoryName(Path.GetFullPath(path))) ? "its folder does not exist"
            : null;
        return why is null ? null : new Fault(path, 0, 0, "", $"cannot be written: {why}");
    }

    /// <summary>Whether a text can name a file at all.</summary>
    public static bool IsFileName(string path) => !string.IsNullOrWhiteSpace(path) && !path.Contains('\0', StringComparison.Ordinal);

    /// <summary>Whether a path names a device: renaming over /dev/stdout or /dev/null would replace it.</summary>
    public static bool IsDevice(string path) =>
        !OperatingSystem.IsWindows() && (path.StartsWith("/dev/", StringComparison.Ordinal) || path.StartsWith("/proc/", StringComparison.Ordinal));

    /// <summary>Makes a folder unless it exists.</summary>
    /// <param name="path">The folder.</param>
    /// <returns>Null, or why it could not be made.</returns>
    public static Fault? MakeFolder(string path)
    {
        try
        {
            Directory.CreateDirectory(path);
            return null;
        }
        catch (Exception problem) when (problem is IOException or UnauthorizedAccessException or ArgumentException or NotSupportedException)
        {
            return new Fault(path, 0, 0, "", $"cannot be made: {Reason(problem)}");
        }
    }

    private static string Reason(Exception problem) => problem switch
    {
        DirectoryNotFoundException => "its folder does not exist",
        UnauthorizedAccessException => "permission denied",
        ArgumentException or NotSupportedException => "not a file name",
        _ => problem.Message,
    };

    private static void KeepPermissions(string target, string beside)
    {
        if (!OperatingSystem.IsWindows() && File.Exists(target))
        {
            File.SetUnixFileMode(beside, File.GetUnixFileMode(target));
        }
    }

    private static void Discard(string? beside)
    {
        try
        {
            if (beside is not null)
            {
                File.Delete(beside);
            }
        }
        catch (Exception problem) when (problem is IOException or UnauthorizedAccessException)
        {
            // the fault that is reported already says more than a left-over part file would
        }
    }
}
