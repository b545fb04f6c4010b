using System.Diagnostics;
using Xunit;

namespace Drypeak.Browser.Tests.Figures;

/// <summary>A program of Debian's that reads what the service writes.</summary>
internal static class OtherProgram
{
    /// <summary>Runs it on a file and gives its output.</summary>
    /// <param name="name">Of the program.</param>
    /// <param name="arguments">{file} stands for the file's path, {out} for that of a PNG that it may write, {root} for the same without its suffix.</param>
    /// <param name="content">Of the file.</param>
    /// <returns>What it printed; and the bytes that it wrote to {out}, empty where it wrote none.</returns>
    public static async Task<(string Printed, byte[] Written)> RunAsync(string name, string[] arguments, byte[] content)
    {
        var folder = Directory.CreateTempSubdirectory("figures-");
        try
        {
            var (file, result) = (Path.Combine(folder.FullName, "file"), Path.Combine(folder.FullName, "out.png"));
            await File.WriteAllBytesAsync(file, content);
            var start = new ProcessStartInfo(name) { RedirectStandardOutput = true, RedirectStandardError = true };
            foreach (var argument in arguments)
            {
                start.ArgumentList.Add(argument.Replace("{file}", file, StringComparison.Ordinal).Replace("{out}", result, StringComparison.Ordinal).Replace("{root}", Path.ChangeExtension(result, null), StringComparison.Ordinal));
            }

            using var process = Process.Start(start) ?? throw new InvalidOperationException($"{name} did not start.");
            var (output, errors) = (process.StandardOutput.ReadToEndAsync(), process.StandardError.ReadToEndAsync());
            await process.WaitForExitAsync().WaitAsync(Browser.Patience);
            Assert.True(process.ExitCode == 0, $"{name} ended with {process.ExitCode}: {await errors}{await output}");
            return (await output + await errors, File.Exists(result) ? await File.ReadAllBytesAsync(result) : []);
        }
        finally
        {
            folder.Delete(recursive: true);
        }
    }
}
