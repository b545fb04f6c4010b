namespace Drypeak.Service.Tests.Documents;

/// <summary>Files of the repository, found upward from where the tests run.</summary>
internal static class Repository
{
    public static string File(string path)
    {
        var folder = new DirectoryInfo(AppContext.BaseDirectory);
        while (folder is not null && !System.IO.File.Exists(Path.Combine(folder.FullName, "Drypeak.slnx")))
        {
            folder = folder.Parent;
        }

        return Path.Combine(folder?.FullName ?? throw new InvalidOperationException("The tests do not run inside the repository."), path);
    }
}
