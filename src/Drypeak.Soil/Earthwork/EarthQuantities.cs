using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Earthwork;

/// <summary>Loads of a truck, by both of its bounds.</summary>
/// <param name="ByVolume">Whole loads by loose volume; null where the volume of truck or soil is not known.</param>
/// <param name="ByMass">Whole loads by wet mass; null where the truck has no such bound.</param>
/// <param name="VolumeGoverns">Whether the volume fills up first.</param>
public sealed record Truckloads(double? ByVolume, double? ByMass, bool VolumeGoverns)
{
    /// <summary>Loads that are needed: by the bound that governs.</summary>
    public double Needed => VolumeGoverns ? ByVolume!.Value : ByMass!.Value;

    /// <summary>Loads of one draw; null where neither bound can be used.</summary>
    public static Truckloads? Of(Draw draw, Truck truck)
    {
        var byVolume = draw.LooseVolume?.CubicMeters / truck.Volume?.CubicMeters;
        var byMass = draw.HauledMass.Kilograms / truck.Mass?.Kilograms;
        return byVolume is null && byMass is null ? null : new Truckloads(RoundedUp(byVolume), RoundedUp(byMass), !(byMass > byVolume) && byVolume is { });
    }

    /// <summary>Loads of several draws: no truck carries soil of two areas.</summary>
    public static Truckloads? Sum(IEnumerable<Truckloads?> loads)
    {
        var all = loads.OfType<Truckloads>().ToList();
        if (all.Count == 0)
        {
            return null;
        }

        var (byVolume, byMass) = (all.Sum(one => one.ByVolume), all.Sum(one => one.ByMass));
        var (volume, mass) = (all[0].ByVolume is null ? null : byVolume, all[0].ByMass is null ? null : byMass);
        return new Truckloads(volume, mass, volume is { } && !(mass > volume) && (mass != volume || all.MaxBy(one => one.Needed)!.VolumeGoverns));
    }

    private static double? RoundedUp(double? quotient) => quotient is { } given ? Count.RoundedUp(given) : null;
}

/// <summary>
/// Bank, loose and compacted volumes of one fill. Solids are neither lost nor gained on the way: the volume of borrow is the fill's
/// times the ratio of dry densities, never of wet ones and never mixed with a void ratio.
/// </summary>
/// <param name="Fill">The fill.</param>
/// <param name="Draws">What each borrow area gives.</param>
/// <param name="MissingSolids">Solids that no borrow area gives.</param>
/// <param name="Truck">The truck; null where none was named.</param>
/// <param name="Water">Density of water.</param>
public sealed record EarthQuantities(Fill Fill, IReadOnlyList<Draw> Draws, Mass MissingSolids, Truck? Truck, Density Water)
{
    /// <summary>Bank volume of all areas.</summary>
    public Volume BankVolume => new(Draws.Sum(draw => draw.BankVolume.CubicMeters));

    /// <summary>Soil and water in the bank.</summary>
    public Mass WetMass => new(Draws.Sum(draw => draw.WetMass.Kilograms));

    /// <summary>Water in the bank.</summary>
    public Mass WaterMass => new(Draws.Sum(draw => draw.WaterMass.Kilograms));

    /// <summary>Soil and water in trucks.</summary>
    public Mass HauledMass => new(Draws.Sum(draw => draw.HauledMass.Kilograms));

    /// <summary>Volume in trucks; null where nothing is known of the loose soil.</summary>
    public Volume? LooseVolume => Draws[0].Loose is null ? null : new Volume(Draws.Sum(draw => draw.LooseVolume!.Value.CubicMeters));

    /// <summary>Fill that the draws make: all of it, unless solids are missing.</summary>
    public Volume FillServed => new(Draws.Sum(draw => draw.DryMass.Kilograms) / Fill.DryDensity.KilogramsPerCubicMeter);

    /// <summary>Fill that no borrow area serves.</summary>
    public Volume FillMissing => new(MissingSolids.Kilograms / Fill.DryDensity.KilogramsPerCubicMeter);

    /// <summary>Water from the borrow's to the fill's water content; negative where it is to be lost; null where the fill's is not known.</summary>
    public WaterAmount? ToAdd => Fill.WaterContent is { } w ? Draws.Select(draw => draw.ToAdd(w, Water)).Aggregate((sum, next) => sum + next) : null;

    /// <summary>(Vbank − Vfill)/Vbank: the bank volume that compaction takes, over the bank volume.</summary>
    public double ShrinkageOfBorrow => 1 - (FillServed.CubicMeters / BankVolume.CubicMeters);

    /// <summary>(Vbank − Vfill)/Vfill: the same over the fill's volume.</summary>
    public double ShrinkageOfFill => (BankVolume.CubicMeters / FillServed.CubicMeters) - 1;

    /// <summary>(Vloose − Vbank)/Vbank: growth on digging, over the bank volume.</summary>
    public double? SwellOfBank => (LooseVolume?.CubicMeters / BankVolume.CubicMeters) - 1;

    /// <summary>(Vloose − Vbank)/Vloose: the same over the loose volume.</summary>
    public double? SwellOfLoose => 1 - (BankVolume.CubicMeters / LooseVolume?.CubicMeters);

    /// <summary>Truck loads of each draw; null where they cannot be counted.</summary>
    public IReadOnlyList<Truckloads?> LoadsOfDraws => [.. Draws.Select(draw => Truck is null || draw.DryMass.Kilograms == 0 ? null : Truckloads.Of(draw, Truck))];

    /// <summary>Truck loads of all draws.</summary>
    public Truckloads? Loads => Truckloads.Sum(LoadsOfDraws);

    /// <summary>What a careful reviewer says.</summary>
    /// <param name="placeOf">JSON pointer to a borrow area.</param>
    /// <param name="units">The units that texts speak.</param>
    public IEnumerable<Finding> Review(Func<int, string> placeOf, EarthworkUnits units)
    {
        var waters = Draws.Select(draw => draw.Area.WaterContent).Concat(Fill.WaterContent is { } ofFill ? [ofFill] : []);
        foreach (var finding in PlausibilityReview.DryDensity(Fill.DryDensity, "/fill", units)
            .Concat(Draws.SelectMany((draw, i) => PlausibilityReview.DryDensity(draw.Area.DryDensity, placeOf(i), units)))
            .Concat(PlausibilityReview.Fractions(waters, "")))
        {
            yield return finding;
        }

        if (MissingSolids.Kilograms > 0)
        {
            yield return EarthworkFindingKinds.BorrowShort.At("/borrowAreas",
                $"The borrow areas serve {ReaderText.Of(FillServed, units.BulkVolume)} of the fill; {ReaderText.Of(FillMissing, units.BulkVolume)} are missing. Open another area, or raise a capacity or a share.");
        }

        foreach (var finding in ReviewWater(units))
        {
            yield return finding;
        }

        if (ShrinkageOfBorrow < -1e-9)
        {
            yield return EarthworkFindingKinds.FillLooserThanBorrow.At("/fill",
                $"The fill takes {ReaderText.Percent(-ShrinkageOfBorrow)} more room than its soil has in the bank. So it is with rock and with dense deposits; check both dry densities otherwise.");
        }

        if (SwellOfBank < -1e-9)
        {
            yield return EarthworkFindingKinds.LooseDenserThanBank.At("/loose",
                $"Loose, the soil takes {ReaderText.Percent(-SwellOfBank.Value)} less room than in the bank. Digging loosens: check the loose density, its water content, and that all densities are dry or all wet.");
        }

        if (Draws.Any(draw => draw.Loose?.WaterContent is { } loose && loose.Fraction < draw.Area.WaterContent.Fraction - 1e-12))
        {
            yield return EarthworkFindingKinds.DriesInHaul.At("/loose/waterContent",
                "The soil is drier in the truck than in the bank. The water to add is counted from the bank: what dries out on the way has to be added as well.");
        }

        if (Truck?.Volume is { } && LooseVolume is null)
        {
            yield return EarthworkFindingKinds.LooseDensityMissing.At("/truck/volume",
                "The truck has a volume, but nothing is known of the loose soil, so that no loads are counted by it. Give loose, by density or by swell.");
        }
    }

    private IEnumerable<Finding> ReviewWater(EarthworkUnits units)
    {
        if (Fill.WaterContent is not { } ofFill || ToAdd is not { } total)
        {
            yield break;
        }

        var served = new Mass(Fill.DryMass.Kilograms - MissingSolids.Kilograms);
        var (wetter, drier) = (Draws.Where(draw => draw.Area.WaterContent.Fraction > ofFill.Fraction + 1e-12).ToList(), Draws.Where(draw => draw.Area.WaterContent.Fraction < ofFill.Fraction - 1e-12).ToList());
        if (wetter.Exists(draw => draw.DryMass.Kilograms > 0) && drier.Exists(draw => draw.DryMass.Kilograms > 0))
        {
            yield return EarthworkFindingKinds.WaterBothWays.At("/borrowAreas",
                $"Soil from {string.Join(", ", wetter.Select(draw => draw.Area.Label))} has to lose water, and soil from {string.Join(", ", drier.Select(draw => draw.Area.Label))} needs some; the sum sets one against the other. Use the numbers of each area, unless both are mixed in one lift.");
        }
        else if (total.Mass.Kilograms < 0 && !total.IsNoneIn(served))
        {
            yield return EarthworkFindingKinds.WaterToLose.At("/fill/waterContent",
                $"The borrow is wetter than the {ReaderText.Of(ofFill)} of the fill: {ReaderText.Of(new Mass(-total.Mass.Kilograms), units.Mass)} of water have to be lost. Drain the borrow area, turn and air the soil, or mix in drier soil.");
        }
    }
}
