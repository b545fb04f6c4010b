namespace Drypeak.Service.Tests.Exchange;

/// <summary>Small AGS4 files of Ternmarsh, made from one sound file by changing lines of it.</summary>
internal static class AgsTexts
{
    /// <summary>The sound file of the API description.</summary>
    public static string Sound { get; } = Examples.Ags4;

    /// <summary>The sound file with a text put in another's place; the text must stand in it.</summary>
    public static string With(string old, string put) => Sound.Contains(old, StringComparison.Ordinal)
        ? Sound.Replace(old, put, StringComparison.Ordinal)
        : throw new ArgumentException($"The sound file has no {old}", nameof(old));

    /// <summary>The sound file without a group.</summary>
    public static string Without(string group)
    {
        var start = Sound.IndexOf($"\"GROUP\",\"{group}\"", StringComparison.Ordinal);
        var end = Sound.IndexOf("\"GROUP\"", start + 1, StringComparison.Ordinal);
        return Sound[..start] + (end < 0 ? "" : Sound[end..]);
    }

    /// <summary>The sound file with more lines at its end.</summary>
    public static string And(params string[] lines) => Sound + "\r\n" + string.Join("\r\n", lines) + "\r\n";

    /// <summary>The line, from 1, on which a text first stands.</summary>
    public static int LineOf(string file, string text) => 1 + file[..file.IndexOf(text, StringComparison.Ordinal)].Count(letter => letter == '\n');
}
