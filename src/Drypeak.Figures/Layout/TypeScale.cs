namespace Drypeak.Figures.Layout;

/// <summary>
/// Sizes of text and of marks, px: those of the default figure, growing with the square root of a larger picture, so that it also gains
/// room, and shrinking slower than a smaller one, so that it stays readable.
/// </summary>
internal sealed class TypeScale
{
    private const double SmallestText = 9.5;

    public TypeScale(FigureSize size)
    {
        var relative = Math.Min((double)size.Width / FigureSize.Default.Width, (double)size.Height / FigureSize.Default.Height);
        Unit = relative >= 1 ? Math.Sqrt(relative) : Math.Pow(relative, 0.22);
    }

    /// <summary>1 at the default size; also the size of marks and the width of lines.</summary>
    public double Unit { get; }

    public double Title => Text(21);

    public double Subtitle => Text(14);

    public double AxisTitle => Text(13.5);

    public double Value => Text(14);

    public double Label => Text(13);

    public double Margin => Math.Round(18 * Unit * Unit);

    public double MarkRadius => 4 * Unit;

    public double TickLength => 5 * Unit;

    public static double LeastText => SmallestText;

    /// <summary>Lengths of dash and gap that are meant at the default size.</summary>
    public double[] Dash(IReadOnlyList<double> atDefaultSize) => [.. atDefaultSize.Select(length => length * Unit)];

    private double Text(double size) => Math.Max(SmallestText, Math.Round(size * Unit * 2) / 2);
}
