using Drypeak.Soil.Curves;

namespace Drypeak.AccuracyStudy;

/// <summary>A published test with five or more points; water contents in %, dry densities in kg/m³, reduced here from what was published.</summary>
/// <param name="Name">Short.</param>
/// <param name="Source">Where it was published.</param>
/// <param name="Data">The points.</param>
internal sealed record PublishedTest(string Name, string Source, CompactionData Data)
{
    private const double Water = 998.2;
    private const double PoundsPerCubicFoot = 0.45359237 / (0.3048 * 0.3048 * 0.3048);

    public static readonly PublishedTest[] All =
    [
        new("five specimens, 1 % apart",
            "G. N. Smith and I. G. N. Smith, Elements of Soil Mechanics, exercise (attribution of the copy read not certain); mold of 1000 cm³",
            FromWet(2.65, 1, [10, 11, 12, 13, 14], [3168 - 1125, 3300 - 1125, 3334 - 1125, 3350 - 1125, 3320 - 1125])),
        new("six specimens, three above the zero-air-voids line",
            "question bank, standard compaction test",
            FromWet(2.70, 1000, [10, 12, 16, 20, 24, 30], [1.75, 1.87, 2.15, 2.20, 2.10, 1.95])),
        new("eight specimens, no specific gravity",
            "B. M. Das, Principles of Geotechnical Engineering, problem 5.7; mold of 943.3 cm³",
            FromWet(null, 1e6 / 943.3, [9.9, 10.6, 12.1, 13.8, 15.1, 17.4, 19.4, 21.2], [1.68, 1.71, 1.77, 1.83, 1.86, 1.88, 1.87, 1.85])),
        new("five specimens, steep",
            "B. M. Das and K. Sobhan, Principles of Geotechnical Engineering, 9th ed., problems 6.4 and 6.5; mold of 1/30 ft³",
            FromWet(2.69, 30 * PoundsPerCubicFoot, [8.6, 10.6, 12.5, 14.9, 16.7], [3.70, 4.15, 4.69, 4.62, 4.02])),
        new("eight specimens that follow no curve",
            "laboratory sheet; mold of 902.75 cm³",
            FromTins(
                2.60,
                1000 / 902.75,
                [5362, 5593, 5814, 5931, 5691, 5771, 5495, 5303],
                4150.5,
                [9.3, 36.2, 29.99, 9.2, 36.9, 27.25, 9.2, 34.3, 26.13, 9.3, 37.11, 28.5, 9.4, 37.45, 26.99, 8.7, 35.26, 27.22, 8.9, 36.38, 27.03, 8.6, 36.69, 27.12])),
    ];

    /// <param name="specificGravity">Or null.</param>
    /// <param name="scale">kg/m³ of wet density for one of the values.</param>
    /// <param name="percent">Water contents.</param>
    /// <param name="wet">Wet masses or densities.</param>
    private static CompactionData FromWet(double? specificGravity, double scale, double[] percent, double[] wet) =>
        new([.. percent.Zip(wet, (w, value) => new CompactionPoint(w / 100, scale * value / (1 + (w / 100))))], specificGravity, Water);

    /// <param name="specificGravity">Or null.</param>
    /// <param name="scale">kg/m³ for a gram in the mold.</param>
    /// <param name="moldAndWet">Grams.</param>
    /// <param name="mold">Grams.</param>
    /// <param name="tins">Tin, tin and wet soil, tin and dry soil, specimen by specimen; grams.</param>
    private static CompactionData FromTins(double? specificGravity, double scale, double[] moldAndWet, double mold, double[] tins) =>
        FromWet(
            specificGravity,
            scale,
            [.. tins.Chunk(3).Select(tin => 100 * (tin[1] - tin[2]) / (tin[2] - tin[0]))],
            [.. moldAndWet.Select(mass => mass - mold)]);
}
