using System.Diagnostics;
using Xunit;

namespace Drypeak.Operations.Tests;

/// <summary>A program of Debian's that a test needs; <c>tests/run</c> installs it.</summary>
internal static class Tool
{
    /// <summary>Skips the test where a program is not installed.</summary>
    public static void Needs(string name) =>
        Assert.SkipUnless(Find(name) is { }, $"{name} is not installed; tests/run installs it.");

    /// <summary>Runs a program to its end.</summary>
    /// <returns>Its exit code, and all that it wrote.</returns>
    public static async Task<(int Code, string Output)> RunAsync(string name, params string[] arguments)
    {
        using var process = Process.Start(new ProcessStartInfo(Find(name) ?? name, arguments) { RedirectStandardOutput = true, RedirectStandardError = true })!;
        var output = process.StandardOutput.ReadToEndAsync(TestContext.Current.CancellationToken);
        var error = process.StandardError.ReadToEndAsync(TestContext.Current.CancellationToken);
        await process.WaitForExitAsync(TestContext.Current.CancellationToken);
        return (process.ExitCode, await output + await error);
    }

    /// <summary>Starts a program that goes on until it is killed.</summary>
    public static Process Start(string name, params string[] arguments)
    {
        var process = Process.Start(new ProcessStartInfo(Find(name)!, arguments) { RedirectStandardOutput = true, RedirectStandardError = true })!;
        process.OutputDataReceived += (_, _) => { };
        process.ErrorDataReceived += (_, _) => { };
        process.BeginOutputReadLine();
        process.BeginErrorReadLine();
        return process;
    }

    private static string? Find(string name) => new[] { "/usr/local/bin", "/usr/bin", "/usr/sbin" }.Select(folder => Path.Combine(folder, name)).FirstOrDefault(File.Exists);
}
