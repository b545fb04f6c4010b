namespace Drypeak.Figures.Layout;

/// <summary>What is written along the axes.</summary>
/// <param name="X">Title of the axis to the right, with its unit.</param>
/// <param name="Y">Title of the axis upward, with its unit.</param>
internal sealed record AxisWords(string X, string Y)
{
    /// <summary>The second axis, at the right, or null where there is none.</summary>
    public SecondAxisWords? Second { get; init; }

    /// <summary>A value of the result that stands among the labels of the axis to the right.</summary>
    public AxisValue? XValue { get; init; }

    /// <summary>A value of the result that stands among the labels of the axis upward.</summary>
    public AxisValue? YValue { get; init; }

    /// <summary>A number with a decimal point as the reader's language writes it.</summary>
    public Func<string, string> Number { get; init; } = text => text;
}

/// <summary>A second axis upward.</summary>
/// <param name="Title">Its title.</param>
/// <param name="FromFirst">A value of the first axis on the second; rising or falling throughout.</param>
/// <param name="ToFirst">The way back.</param>
internal sealed record SecondAxisWords(string Title, Func<double, double> FromFirst, Func<double, double> ToFirst);

/// <summary>A value on an axis with its own text.</summary>
internal sealed record AxisValue(double At, string Text);
