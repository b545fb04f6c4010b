using System.Reflection;

namespace Drypeak.Service.Hosting;

/// <summary>The version of the program, from one place: <c>Version</c> in Directory.Build.props.</summary>
internal static class ServiceVersion
{
    public static string Text { get; } =
        typeof(ServiceVersion).Assembly.GetCustomAttribute<AssemblyInformationalVersionAttribute>()!.InformationalVersion;
}
