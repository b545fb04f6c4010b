namespace Drypeak.Soil.Curves;

/// <summary>How far the points are from any single peak.</summary>
internal static class OnePeak
{
    /// <summary>
    /// U: the root of the least sum of squares between the points in order of water content and any sequence that rises once and then falls
    /// (points at one water content are averaged first; only rising or only falling counts). In the unit of the densities.
    /// </summary>
    /// <remarks>Rising and falling parts by pooling adjacent violators (M. Ayer and others, Annals of Mathematical Statistics 26 (1955) 641–647), each split in one pass.</remarks>
    public static double Departure(TestedPoints points)
    {
        var densities = Averaged(points);
        var rising = RisingErrors(densities);
        Array.Reverse(densities);
        var falling = RisingErrors(densities);
        var least = double.PositiveInfinity;
        for (var split = 0; split <= densities.Length; split++)
        {
            least = Math.Min(least, rising[split] + falling[densities.Length - split]);
        }

        return Math.Sqrt(least);
    }

    private static double[] Averaged(TestedPoints points)
    {
        var (sums, counts) = (new double[points.DistinctCount], new int[points.DistinctCount]);
        for (var i = 0; i < points.Count; i++)
        {
            sums[points.Distinct[i]] += points.Densities[i];
            counts[points.Distinct[i]]++;
        }

        for (var i = 0; i < sums.Length; i++)
        {
            sums[i] /= counts[i];
        }

        return sums;
    }

    /// <summary>For each number of leading values, the least sum of squares to a rising sequence.</summary>
    private static double[] RisingErrors(ReadOnlySpan<double> values)
    {
        var errors = new double[values.Length + 1];
        Span<Block> blocks = values.Length <= 64 ? stackalloc Block[values.Length] : new Block[values.Length];
        var (count, error) = (0, 0.0);
        for (var i = 0; i < values.Length; i++)
        {
            var block = new Block(values[i], 1);
            while (count > 0 && blocks[count - 1].Mean > block.Mean)
            {
                block = block.Join(blocks[--count], ref error);
            }

            blocks[count++] = block;
            errors[i + 1] = error;
        }

        return errors;
    }

    /// <summary>Neighbors that share one value.</summary>
    private readonly record struct Block(double Mean, double Weight)
    {
        public Block Join(in Block other, ref double error)
        {
            var weight = Weight + other.Weight;
            var apart = other.Mean - Mean;
            error += apart * apart * Weight * other.Weight / weight;
            return new(Mean + (apart * other.Weight / weight), weight);
        }
    }
}
