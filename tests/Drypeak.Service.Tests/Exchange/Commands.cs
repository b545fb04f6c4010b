using System.Diagnostics;
using Drypeak.Service.Tests.Documents;
using Xunit;

namespace Drypeak.Service.Tests.Exchange;

/// <summary>Runs other programs for a test.</summary>
internal static class Commands
{
    private static readonly TimeSpan Patience = TimeSpan.FromMinutes(5);

    /// <summary>Whether a program is on the machine.</summary>
    public static bool Has(string program) => (Environment.GetEnvironmentVariable("PATH") ?? "").Split(':').Any(folder => File.Exists(Path.Combine(folder, program)));

    /// <summary>Runs a program in a folder of the repository and gives what it prints; one that fails fails the test.</summary>
    public static async Task<string> RunAsync(string folder, string program, string[] arguments, string input = "")
    {
        var start = new ProcessStartInfo(program, arguments)
        {
            WorkingDirectory = Repository.File(folder),
            RedirectStandardInput = true,
            RedirectStandardOutput = true,
            RedirectStandardError = true,
        };
        start.Environment["KIOTA_UPDATE__DISABLED"] = "true";
        start.Environment["KIOTA_TELEMETRY_OPTOUT"] = "true";
        using var process = Process.Start(start)!;
        var (output, errors) = (process.StandardOutput.ReadToEndAsync(), process.StandardError.ReadToEndAsync());
        await process.StandardInput.WriteAsync(input);
        process.StandardInput.Close();
        await process.WaitForExitAsync(TestContext.Current.CancellationToken).WaitAsync(Patience);
        Assert.True(process.ExitCode == 0, $"{program} {string.Join(' ', arguments)} ended with {process.ExitCode}.\n{await output}\n{await errors}");
        return await output;
    }
}
