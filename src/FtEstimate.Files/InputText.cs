using System.Globalization;
using System.Text;

namespace FtEstimate.Files;

/// <summary>The text of an input file, or why there is none.</summary>
/// <param name="Text">The text without a byte-order mark; null: there is a problem.</param>
/// <param name="Problem">Why the file cannot be read; null: it was.</param>
/// <param name="Line">Line of the problem, from 1; 0: none.</param>
internal readonly record struct InputText(string? Text, string? Problem, int Line = 0)
{
    /// <summary>The largest file that is read, in bytes; hand-written inputs are a thousand times smaller.</summary>
    public const int LargestBytes = 1 << 20;

    private static readonly UTF8Encoding StrictUtf8 = new(encoderShouldEmitUTF8Identifier: false, throwOnInvalidBytes: true);

    /// <summary>Reads a file of at most <see cref="LargestBytes"/>, without ever throwing for what the file or the disk is like.</summary>
    public static InputText Read(string path)
    {
        try
        {
            if (Directory.Exists(path))
            {
                return Failed("this is a folder, not a file");
            }

            using FileStream stream = new(path, FileMode.Open, FileAccess.Read, FileShare.ReadWrite, bufferSize: 1);
            if (stream.CanSeek && stream.Length > LargestBytes)
            {
                return TooLarge();
            }

            // a pipe or device does not know its length: read one byte more than allowed
            byte[] bytes = new byte[stream.CanSeek && stream.Length > 0 ? (int)stream.Length + 1 : LargestBytes + 1];
            int count = stream.ReadAtLeast(bytes, bytes.Length, throwOnEndOfStream: false);
            return count > LargestBytes ? TooLarge() : Decode(bytes.AsSpan(0, count));
        }
        catch (Exception problem) when (problem is FileNotFoundException or DirectoryNotFoundException)
        {
            return Failed("no such file");
        }
        catch (UnauthorizedAccessException)
        {
            return Failed("the file cannot be read: permission denied");
        }
        catch (Exception problem) when (problem is ArgumentException or NotSupportedException)
        {
            return Failed("this is not a file name");
        }
        catch (IOException problem)
        {
            return Failed($"the file cannot be read: {problem.Message}");
        }
    }

    private static InputText Decode(ReadOnlySpan<byte> bytes)
    {
        if (bytes is [0xFE, 0xFF, ..] or [0xFF, 0xFE, ..])
        {
            return Failed("the file is encoded as UTF-16; expected UTF-8");
        }

        // IndexOf comes compiled with the runtime, Contains would have to be compiled at every start
        if (bytes.IndexOf((byte)0) >= 0)
        {
            return Failed("this is a binary file; expected TOML text");
        }

        try
        {
            string text = StrictUtf8.GetString(bytes);
            text = text.StartsWith('\uFEFF') ? text[1..] : text;
            return string.IsNullOrWhiteSpace(text) ? Failed("the file is empty") : new InputText(text, null);
        }
        catch (DecoderFallbackException problem)
        {
            int line = 1 + bytes[..Math.Clamp(problem.Index, 0, bytes.Length)].Count((byte)'\n');
            return new InputText(null, "this line is not encoded as UTF-8", line);
        }
    }

    private static InputText Failed(string problem) => new(null, problem);

    private static InputText TooLarge() => Failed(string.Create(
        CultureInfo.InvariantCulture, $"the file is larger than {LargestBytes / 1024 / 1024} MiB; input files are short texts"));
}
