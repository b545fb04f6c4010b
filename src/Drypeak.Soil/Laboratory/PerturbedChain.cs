using Drypeak.Soil.Curves;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Laboratory;

/// <summary>The chain from weighings to points with an error on each uncertain measurement: draws in, points out.</summary>
internal sealed class PerturbedChain
{
    private readonly MoistureDensityTest _test;
    private readonly List<Perturbed> _specimens = [];
    private readonly List<string> _inputs = [];
    private readonly int? _specificGravity;

    public PerturbedChain(MoistureDensityTest test, IReadOnlyList<Specimen> specimens)
    {
        _test = test;
        var u = test.Uncertainty ?? new MeasurementUncertainty();
        var molds = new Dictionary<Mold, (int? Mass, int? Volume)>(ReferenceEqualityComparer.Instance);

        var kept = specimens.Zip(test.Specimens).Where(pair => pair.First.SetAside is null)
            .OrderBy(pair => pair.First.WaterContent.Fraction).ThenBy(pair => pair.First.DryDensity.KilogramsPerCubicMeter);
        foreach (var (specimen, measured) in kept)
        {
            var byMass = specimen.MoldVolume is { };
            var weighedInMold = byMass && measured.MoldAndWetSoil is { };
            (int? Mass, int? Volume) mold = (null, null);
            if (byMass && (measured.Mold ?? test.Mold) is { } itsMold)
            {
                if (!molds.TryGetValue(itsMold, out mold))
                {
                    mold.Volume = Input("volume", u.Volume?.CubicMeters);
                }

                // The mold's mass comes in with the first specimen that was weighed in it, which need not be the driest.
                mold.Mass ??= weighedInMold ? Input("mass", u.Mass?.Kilograms) : null;
                molds[itsMold] = mold;
            }

            _specimens.Add(new Perturbed(
                specimen,
                measured.Tins,
                byMass ? Input("mass", u.Mass?.Kilograms) : null,
                weighedInMold ? mold.Mass : null,
                mold.Volume,
                [.. measured.Tins.Select(_ => (Input("tinMass", u.TinMass?.Kilograms), Input("tinMass", u.TinMass?.Kilograms), Input("tinMass", u.TinMass?.Kilograms)))],
                Input("waterContent", u.WaterContent?.Fraction),
                Input("dryDensity", u.DryDensity?.KilogramsPerCubicMeter),
                measured.WetDensity is null && !byMass));
        }

        _specificGravity = test.SpecificGravity is { } ? Input("specificGravity", u.SpecificGravity) : null;
    }

    /// <summary>The quantity of each independent error, in the order of the draws.</summary>
    public IReadOnlyList<string> Inputs => _inputs;

    public int SpecimenCount => _specimens.Count;

    /// <summary>The specimens' labels, in the order of the points.</summary>
    public IEnumerable<string> Labels => _specimens.Select(item => item.Specimen.Label);

    /// <summary>The points with these errors, each in standard uncertainties.</summary>
    public CompactionData Points(double[] draws)
    {
        var u = _test.Uncertainty!;
        double Error(int? input, double? standard) => input is { } i ? draws[i] * standard!.Value : 0;

        var points = new CompactionPoint[_specimens.Count];
        for (var i = 0; i < points.Length; i++)
        {
            var item = _specimens[i];
            var w = item.Specimen.WaterContent.Fraction;
            for (var t = 0; t < item.Tins.Count; t++)
            {
                var (tin, wet, dry) = item.TinErrors[t];
                var perturbed = new MoistureTin(
                    new Mass(item.Tins[t].Tin.Kilograms + Error(tin, u.TinMass?.Kilograms)),
                    new Mass(item.Tins[t].TinAndWetSoil.Kilograms + Error(wet, u.TinMass?.Kilograms)),
                    new Mass(item.Tins[t].TinAndDrySoil.Kilograms + Error(dry, u.TinMass?.Kilograms)));
                w += (perturbed.WaterContent.Fraction - item.Tins[t].WaterContent.Fraction) / item.Tins.Count;
            }

            w = Math.Clamp(w + Error(item.WaterError, u.WaterContent?.Fraction), 0, MeasuredWater.Greatest);
            var dryDensity = item.Specimen.DryDensity.KilogramsPerCubicMeter;
            if (!item.DryDensityGiven)
            {
                var wet = item.Specimen.WetDensity.KilogramsPerCubicMeter;
                if (item.Specimen is { SoilVolume: { } volume, MoldVolume: { } whole })
                {
                    var mass = (wet * volume.CubicMeters) + Error(item.MassError, u.Mass?.Kilograms) - Error(item.MoldMassError, u.Mass?.Kilograms);
                    var filled = volume.CubicMeters / whole.CubicMeters;
                    wet = mass / (volume.CubicMeters + (filled * Error(item.VolumeError, u.Volume?.CubicMeters)));
                }

                dryDensity = wet / (1 + w);
            }

            dryDensity += Error(item.DensityError, u.DryDensity?.KilogramsPerCubicMeter);
            points[i] = new CompactionPoint(w, Math.Clamp(dryDensity, SpecimenReduction.LeastDryDensity, SpecimenReduction.GreatestDryDensity));
        }

        var gravity = _test.SpecificGravity is { } gs ? Math.Max(gs.Value + Error(_specificGravity, u.SpecificGravity), 0.5) : (double?)null;
        return new CompactionData(points, gravity, _test.WaterDensity.KilogramsPerCubicMeter);
    }

    private int? Input(string quantity, double? standard)
    {
        if (standard is not > 0)
        {
            return null;
        }

        _inputs.Add(quantity);
        return _inputs.Count - 1;
    }

    private sealed record Perturbed(
        Specimen Specimen,
        IReadOnlyList<MoistureTin> Tins,
        int? MassError,
        int? MoldMassError,
        int? VolumeError,
        IReadOnlyList<(int? Tin, int? Wet, int? Dry)> TinErrors,
        int? WaterError,
        int? DensityError,
        bool DryDensityGiven);
}
