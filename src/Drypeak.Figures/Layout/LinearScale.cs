namespace Drypeak.Figures.Layout;

/// <summary>A closed range of numbers with <paramref name="From"/> below <paramref name="To"/>.</summary>
internal readonly record struct Interval(double From, double To)
{
    public double Span => To - From;

    public static Interval Of(double value) => new(value, value);

    /// <summary>The range of all values, or null where there is none.</summary>
    public static Interval? Of(IEnumerable<double> values)
    {
        Interval? range = null;
        foreach (var value in values)
        {
            range = range?.With(value) ?? Of(value);
        }

        return range;
    }

    /// <summary>The largest value without its sign.</summary>
    public double Magnitude => Math.Max(Math.Abs(From), Math.Abs(To));

    public Interval With(double value) => new(Math.Min(From, value), Math.Max(To, value));

    public double Clamp(double value) => Math.Clamp(value, From, To);

    /// <summary>With shares of its span as room at both ends, but not below 0 for what is never negative.</summary>
    public Interval Padded(double before, double after)
    {
        var from = From - (Span * before);
        return new Interval(From >= 0 ? Math.Max(0, from) : from, To + (Span * after));
    }

    /// <summary>The range about the same middle that spans at least <paramref name="span"/>.</summary>
    public Interval AtLeast(double span) => Span >= span ? this : new(((From + To) / 2) - (span / 2), ((From + To) / 2) + (span / 2));
}

/// <summary>Turns numbers of a range into px between two ends.</summary>
internal readonly record struct LinearScale(Interval Range, double Start, double End)
{
    public double At(double value) => Start + ((value - Range.From) / Range.Span * (End - Start));
}
