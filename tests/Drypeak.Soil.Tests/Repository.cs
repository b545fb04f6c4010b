namespace Drypeak.Soil.Tests;

/// <summary>The checkout that the tests run from, for what stands in files and not in assemblies.</summary>
internal static class Repository
{
    /// <summary>The folder with the solution in it.</summary>
    public static string Root { get; } = FindRoot();

    /// <summary>A path below the root.</summary>
    public static string At(params string[] parts) => Path.Combine([Root, .. parts]);

    private static string FindRoot()
    {
        for (var folder = new DirectoryInfo(AppContext.BaseDirectory); folder is not null; folder = folder.Parent)
        {
            if (File.Exists(Path.Combine(folder.FullName, "Drypeak.slnx")))
            {
                return folder.FullName;
            }
        }

        throw new InvalidOperationException("The tests must run from within a checkout: no Drypeak.slnx stands above them.");
    }
}
