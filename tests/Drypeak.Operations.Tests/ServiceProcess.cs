using System.Diagnostics;
using System.Globalization;
using System.Net;
using System.Net.Sockets;
using System.Text.Json;
using Xunit;

namespace Drypeak.Operations.Tests;

/// <summary>The program as it is run, in a process of its own on a port of this machine.</summary>
internal sealed class ServiceProcess : IDisposable
{
    private readonly Process _process;

    private ServiceProcess(Process process, int port)
    {
        _process = process;
        Port = port;
    }

    public int Port { get; }

    public Uri Address => new($"http://127.0.0.1:{Port}");

    /// <summary>Resident memory, bytes.</summary>
    public long Memory
    {
        get
        {
            _process.Refresh();
            return _process.WorkingSet64;
        }
    }

    /// <summary>A port that was free a moment ago.</summary>
    public static int FreePort()
    {
        using var listener = new TcpListener(IPAddress.Loopback, 0);
        listener.Start();
        return ((IPEndPoint)listener.LocalEndpoint).Port;
    }

    /// <summary>Starts the program and waits until it is ready.</summary>
    /// <param name="port">The port; 0 for a free one.</param>
    /// <param name="settings">Environment variables, such as <c>Limits__Specimens</c>.</param>
    public static async Task<ServiceProcess> StartAsync(int port = 0, params (string Name, string Value)[] settings)
    {
        port = port == 0 ? FreePort() : port;
        var start = new ProcessStartInfo("dotnet", [typeof(Program).Assembly.Location, "--urls", $"http://127.0.0.1:{port}"]) { RedirectStandardOutput = true };
        start.Environment["ASPNETCORE_ENVIRONMENT"] = "Production";
        start.Environment["DOTNET_EnableDiagnostics"] = "0";
        foreach (var (name, value) in settings)
        {
            start.Environment[name] = value;
        }

        var process = Process.Start(start)!;
        // The log is read so that the pipe does not fill, and thrown away.
        process.OutputDataReceived += (_, _) => { };
        process.BeginOutputReadLine();
        var service = new ServiceProcess(process, port);
        await service.ReadyAsync();
        return service;
    }

    /// <summary>Waits until the program says that it is ready.</summary>
    public async Task ReadyAsync()
    {
        using var client = new HttpClient { BaseAddress = Address };
        using var patience = new CancellationTokenSource(TimeSpan.FromSeconds(60));
        while (true)
        {
            try
            {
                using var answer = await client.GetAsync("/health/ready", patience.Token);
                if (answer.IsSuccessStatusCode)
                {
                    return;
                }
            }
            catch (HttpRequestException)
            {
                // It does not listen yet.
            }

            await Task.Delay(20, patience.Token);
        }
    }

    /// <summary>Tells the program to end, as an operator's tools do, and gives its exit code.</summary>
    public async Task<int> StopAsync()
    {
        using var signal = Process.Start("kill", ["-TERM", _process.Id.ToString(CultureInfo.InvariantCulture)]);
        await _process.WaitForExitAsync(TestContext.Current.CancellationToken).WaitAsync(TimeSpan.FromSeconds(10), TestContext.Current.CancellationToken);
        return _process.ExitCode;
    }

    /// <summary>Ends the program without a word (SIGKILL).</summary>
    public void Kill() => _process.Kill();

    public void Dispose()
    {
        if (!_process.HasExited)
        {
            _process.Kill();
        }

        _process.Dispose();
    }
}

/// <summary>Requests for a running service.</summary>
internal static class Requests
{
    public static string Example(string job) => File.ReadAllText(Repository.File($"src/Drypeak.Service/Examples/{job}.json"));

    /// <summary>An example as one line of JSON.</summary>
    public static string Line(string job) => JsonSerializer.Serialize(JsonSerializer.Deserialize<JsonElement>(Example(job)));
}
