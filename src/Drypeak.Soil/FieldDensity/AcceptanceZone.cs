using Drypeak.Soil.Acceptance;
using Drypeak.Soil.Curves;
using Drypeak.Soil.Phases;
using Drypeak.Soil.Quantities;
using MathNet.Numerics.RootFinding;

namespace Drypeak.Soil.FieldDensity;

/// <summary>
/// Where a soil would meet every requirement of its specification, in the plane of water content and dry density. At one water content each
/// quantity only rises or only falls with the dry density, so that each limit is crossed once, and what is met is one stretch.
/// </summary>
public static class AcceptanceZone
{
    private const int Columns = 41;
    private const int MostSteps = 200;
    private const double Precision = 1e-9;

    /// <summary>Just below the zero-air-voids line the phases still have their volumes.</summary>
    private const double BelowZeroAirVoids = 1 - 1e-9;

    /// <summary>The zone's corners in turn; empty where it is empty, or nothing is required of density or water content.</summary>
    /// <param name="soil">The soil; its dry density and water content are moved through the plane.</param>
    /// <param name="requirements">The specification.</param>
    /// <param name="plane">The driest and lightest, and the wettest and densest corner looked at.</param>
    public static IReadOnlyList<CompactionPoint> Of(JudgedSoil soil, IReadOnlyList<Requirement> requirements, (CompactionPoint Lowest, CompactionPoint Highest) plane)
    {
        if (requirements.Count == 0)
        {
            return [];
        }

        // Any density will do to see which water contents are met: these quantities do not look at it.
        var water = requirements.Where(requirement => requirement.Quantity is AcceptedQuantity.WaterContent or AcceptedQuantity.WaterContentFromOptimum).ToList();
        var (driest, wettest) = water.Aggregate((plane.Lowest.WaterContent, plane.Highest.WaterContent), (range, requirement) =>
            (soil with { WaterContent = 0 }).ValueOf(requirement.Quantity) is { } atZero
                ? (Math.Max(range.Item1, (requirement.Minimum ?? double.NegativeInfinity) - atZero), Math.Min(range.Item2, (requirement.Maximum ?? double.PositiveInfinity) - atZero))
                : (double.PositiveInfinity, double.NegativeInfinity));
        if (driest >= wettest)
        {
            return [];
        }

        var stretches = Enumerable.Range(0, Columns).Select(i => driest + ((wettest - driest) * i / (Columns - 1)))
            .Select(w => (W: w, Met: StretchAt(w, soil, [.. requirements.Except(water)], plane.Lowest.DryDensity, plane.Highest.DryDensity)))
            .Where(column => column.Met is { }).ToList();
        return stretches.Count < 2 ? []
            :
            [
                .. stretches.Select(column => new CompactionPoint(column.W, column.Met!.Value.Least)),
                .. stretches.AsEnumerable().Reverse().Select(column => new CompactionPoint(column.W, column.Met!.Value.Greatest)),
            ];
    }

    private static (double Least, double Greatest)? StretchAt(double w, JudgedSoil soil, IReadOnlyList<Requirement> requirements, double least, double greatest)
    {
        if (soil.SpecificGravity is { } gravity)
        {
            greatest = Math.Min(greatest, BelowZeroAirVoids * PhaseRelations.OnZeroAirVoidsLine(new WaterContent(w), gravity, new Density(soil.WaterDensity)).KilogramsPerCubicMeter);
        }

        foreach (var requirement in requirements)
        {
            double? Value(double dry) => (soil with { WaterContent = w, DryDensity = dry, WetDensityAlone = null }).ValueOf(requirement.Quantity);
            if (Value(least) is not { } atLeast || Value(greatest) is not { } atGreatest)
            {
                return null;
            }

            var sign = atGreatest > atLeast ? 1 : -1;
            var (first, second) = sign > 0 ? (requirement.Minimum, requirement.Maximum) : (requirement.Maximum, requirement.Minimum);
            (least, greatest) = (first is { } entry ? Crossing(entry) : least, second is { } exit ? Crossing(exit) : greatest);
            if (least >= greatest)
            {
                return null;
            }

            // A limit beyond what is looked at is crossed at its edge.
            double Crossing(double limit) => sign * (atLeast - limit) >= 0 ? least
                : sign * (atGreatest - limit) <= 0 ? greatest
                : Brent.FindRoot(dry => Value(dry)!.Value - limit, least, greatest, Precision, MostSteps);
        }

        return (least, greatest);
    }
}
