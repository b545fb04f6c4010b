namespace Drypeak.Figures.Layout;

/// <summary>Where an axis is marked, and with what.</summary>
internal interface IAxisTicks
{
    /// <summary>The labeled places.</summary>
    IEnumerable<double> Values { get; }

    /// <summary>Places of shorter ticks without a label.</summary>
    IEnumerable<double> Halves { get; }

    /// <summary>Whether lines lead from the labeled places through the plot.</summary>
    bool HasGrid { get; }

    /// <summary>The label of a place.</summary>
    string Label(double value);
}

/// <summary>Places that have names in place of numbers.</summary>
internal sealed class NamedTicks(IReadOnlyList<(double At, string Name)> positions) : IAxisTicks
{
    private readonly Dictionary<double, string> _names = positions.DistinctBy(position => position.At).ToDictionary(position => position.At, position => position.Name);

    public IEnumerable<double> Values => _names.Keys;

    public IEnumerable<double> Halves => [];

    public bool HasGrid => false;

    public string Label(double value) => _names[value];
}
