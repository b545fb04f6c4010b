using System.Globalization;

namespace Drypeak.Soil.Tests.Curves;

/// <summary>A NIST statistical reference data set for least squares, as its file in <c>tests/Published/Nist</c> has it.</summary>
internal sealed class NistDataSet
{
    private NistDataSet(string name)
    {
        var lines = File.ReadAllLines(Path.Combine(Folder(), name + ".dat"));
        var data = Array.FindIndex(lines, line => line.StartsWith("Data:", StringComparison.Ordinal));
        var parameters = lines[..data].Where(line => line.TrimStart() is ['b' or 'B', >= '0' and <= '9', ..]).Select(Numbers).ToArray();

        // Linear sets give estimate and deviation, nonlinear ones two starting values before them.
        Certified = [.. parameters.Select(row => row[^2])];
        Deviations = [.. parameters.Select(row => row[^1])];
        Starts = parameters[0].Length == 4 ? [[.. parameters.Select(row => row[0])], [.. parameters.Select(row => row[1])]] : [];
        var rows = lines[(data + 1)..].Where(line => line.Trim().Length > 0).Select(line => Numbers("y " + line)).ToArray();
        Y = [.. rows.Select(row => row[0])];
        X = [.. rows.Select(row => row[1])];
        Spread = Numbers("s " + lines[..data].Last(line => line.Contains("Residual Sum of Squares", StringComparison.Ordinal)
            || line.Contains("Standard Deviation  ", StringComparison.Ordinal)).Split("  ")[^1])[0];
    }

    public double[] X { get; }

    public double[] Y { get; }

    public double[] Certified { get; }

    public double[] Deviations { get; }

    /// <summary>Residual standard deviation of a linear set, residual sum of squares of a nonlinear one.</summary>
    public double Spread { get; }

    /// <summary>Starting values of a nonlinear set, the far ones first.</summary>
    public double[][] Starts { get; }

    public static NistDataSet Read(string name) => new(name);

    /// <summary>Digits that agree: −log10 of the relative error (absolute where the certified value is 0), at most the 15 that doubles have.</summary>
    public static double Digits(double value, double certified)
    {
        var error = certified == 0 ? Math.Abs(value) : Math.Abs((value - certified) / certified);
        return error == 0 ? 15 : Math.Min(15, -Math.Log10(error));
    }

    /// <summary>The numbers of a line after its first word.</summary>
    private static double[] Numbers(string line) =>
    [
        .. line.Replace("=", " ", StringComparison.Ordinal).Split(' ', StringSplitOptions.RemoveEmptyEntries).Skip(1)
            .Select(text => double.Parse(text, CultureInfo.InvariantCulture)),
    ];

    private static string Folder()
    {
        var folder = new DirectoryInfo(AppContext.BaseDirectory);
        while (folder is not null && !Directory.Exists(Path.Combine(folder.FullName, "tests", "Published", "Nist")))
        {
            folder = folder.Parent;
        }

        return Path.Combine(folder?.FullName ?? throw new DirectoryNotFoundException("tests/Published/Nist"), "tests", "Published", "Nist");
    }
}
