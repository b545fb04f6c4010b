using Drypeak.Soil.Phases;
using Drypeak.Soil.Quantities;
using static Drypeak.Soil.Laboratory.Workings.WorkingNumbers;

namespace Drypeak.Soil.Laboratory.Workings;

/// <summary>The whole working of a laboratory test in order: each formula with its numbers put in, in the caller's units.</summary>
public static class Working
{
    /// <summary>Every step from the weighings to the peak and its correction.</summary>
    /// <param name="test">The test.</param>
    /// <param name="result">Its result.</param>
    public static IReadOnlyList<WorkingStep> Of(MoistureDensityTest test, MoistureDensityResult result)
    {
        var sheet = new Sheet(test);
        sheet.WaterDensity();
        sheet.Effort(result.Specimens);
        for (var i = 0; i < result.Specimens.Count; i++)
        {
            sheet.Specimen(test.Specimens[i], result.Specimens[i], $" of specimen {result.Specimens[i].Label}");
        }

        sheet.Peak(result);
        sheet.Correction(result);
        return sheet.Steps;
    }

    /// <summary>The steps of one specimen from its weighings to its densities.</summary>
    /// <param name="measured">As measured.</param>
    /// <param name="specimen">As reduced.</param>
    /// <param name="units">The caller's units.</param>
    /// <param name="of">What is added to each quantity's name: <c> of the point</c>.</param>
    public static IReadOnlyList<WorkingStep> OfSpecimen(SpecimenMeasurement measured, Specimen specimen, UnitSet units, string of)
    {
        var sheet = new Sheet(new MoistureDensityTest { Specimens = [measured], Units = units, WaterDensity = Soil.Phases.WaterDensity.At(Soil.Phases.WaterDensity.DefaultTemperature) });
        sheet.Specimen(measured, specimen, of);
        return sheet.Steps;
    }

    private sealed class Sheet(MoistureDensityTest test)
    {
        private readonly List<WorkingStep> _steps = [];
        private readonly HashSet<Mold> _shown = new(ReferenceEqualityComparer.Instance);

        public IReadOnlyList<WorkingStep> Steps => _steps;

        private DensityUnit DensityUnit => test.Units.Density;

        private string WaterDensityText => Number(test.WaterDensity.In(DensityUnit));

        public void WaterDensity()
        {
            if (test.WaterTemperature is { } t)
            {
                var inUnit = Factor(1 / DensityUnit.InKilogramsPerCubicMeter());
                Add("density of water", Formulas.WaterDensity,
                    $"999.97495*(1 - ({Number(t)} - 3.983035)^2*({Number(t)} + 301.797)/(522528.9*({Number(t)} + 69.34881))){inUnit}",
                    test.WaterDensity.In(DensityUnit), DensityUnit.Symbol());
            }
        }

        /// <summary>Of the method with its nominal apparatus, or of the caller's own in the mold that was used.</summary>
        public void Effort(IReadOnlyList<Specimen> specimens)
        {
            if (EffortSeries.EffortOf(test, specimens) is not { } effort)
            {
                return;
            }

            var (rammer, drop, layers, blows, mold) = test.Method is { RammerMass: { } mass, Drop: { } height, BlowsPerLayer: { } perLayer } method
                ? (mass.Value, height.Value, method.Layers.Value, perLayer.Value, method.MoldVolume.Value)
                : (test.CustomEffort!.Rammer, test.CustomEffort.Drop, test.CustomEffort.Layers, test.CustomEffort.BlowsPerLayer,
                    specimens.Select(specimen => specimen.MoldVolume).First(volume => volume is { })!.Value);
            Add("compactive effort", Formulas.Effort,
                $"{Number(rammer.Kilograms)}*{Number(UnitTable.StandardGravity)}*{Number(drop.Meters)}*{layers}*{blows}/{Number(mold.CubicMeters)}/1000",
                effort.KilojoulesPerCubicMeter, "kJ/m³");
        }

        public void Specimen(SpecimenMeasurement measured, Specimen specimen, string of)
        {
            WaterContent(measured, specimen, of);
            if (specimen is { MoldVolume: { } moldVolume, SoilVolume: { } volume })
            {
                var mold = measured.Mold?.Over(test.Mold) ?? test.Mold!;
                MoldVolume(mold, moldVolume);
                SoilVolume(measured.DepthBelowRim, mold, moldVolume, volume, of);
                var mass = WetMass(measured, of);
                var factor = test.Units.Mass.InKilograms() / test.Units.Volume.InCubicMeters() / DensityUnit.InKilogramsPerCubicMeter();
                Add("wet density" + of, Formulas.WetDensity, $"{Number(mass)}/{Number(volume.In(test.Units.Volume))}{Factor(factor)}",
                    specimen.WetDensity.In(DensityUnit), DensityUnit.Symbol());
            }

            var (wet, dry) = (specimen.WetDensity.In(DensityUnit), specimen.DryDensity.In(DensityUnit));
            if (specimen.MoldVolume is null && measured.WetDensity is null)
            {
                Add("wet density" + of, Formulas.WetFromDry, $"{Number(dry)}*(1 + {Number(specimen.WaterContent.Percent)}/100)", wet, DensityUnit.Symbol());
            }
            else
            {
                Add("dry density" + of, Formulas.DryDensity, $"{Number(wet)}/(1 + {Number(specimen.WaterContent.Percent)}/100)", dry, DensityUnit.Symbol());
            }

            if (specimen.PhasesWith(test.SpecificGravity?.Value, test.WaterDensity) is { } phases)
            {
                Phases(specimen.WaterContent, specimen.DryDensity, phases, of);
            }
        }

        public void Peak(MoistureDensityResult result)
        {
            if (result.Optimum is not { } optimum)
            {
                return;
            }

            var formula = Formulas.Peak(result.Curve!.Chosen.Model.ToString().ToLowerInvariant());
            var (w, density) = (new WaterContent(optimum.WaterContent.Value), new Density(optimum.MaximumDryDensity.Value));
            Add("optimum water content", formula, null, w.Percent, "%");
            Add("maximum dry density", formula, null, density.In(DensityUnit), DensityUnit.Symbol());
            if (test.SpecificGravity is { } gravity && PhaseRelations.VoidRatio(density, gravity.Value, test.WaterDensity) is (> 0 and var e))
            {
                Add("void ratio at the optimum", Formulas.VoidRatio, $"{Number(gravity.Value)}*{WaterDensityText}/{Number(density.In(DensityUnit))} - 1", e, "");
                Add("saturation at the optimum", Formulas.Saturation, $"{Number(w.Percent)}*{Number(gravity.Value)}/{Number(e)}", PhaseRelations.Saturation(w, e, gravity.Value) * 100, "%");
            }
        }

        public void Correction(MoistureDensityResult result)
        {
            if (result.Corrected is null || test.Oversize is not { } oversize)
            {
                return;
            }

            var (w, density) = test.Adopted is { } adopted
                ? (adopted.WaterContent, adopted.MaximumDryDensity)
                : (new WaterContent(result.Optimum!.WaterContent.Value), new Density(result.Optimum.MaximumDryDensity.Value));
            _steps.AddRange(OversizeWorking.Of(
                new DensityAndWater(density, w), oversize, test.WaterDensity, toTotal: true, DensityUnit, "maximum dry density", "optimum water content"));
        }

        private void WaterContent(SpecimenMeasurement measured, Specimen specimen, string of)
        {
            var tins = measured.Tins;
            for (var i = 0; i < tins.Count; i++)
            {
                string In(Mass mass) => Number(mass.In(test.Units.TinMass));
                Add("water content" + (tins.Count > 1 ? $" of tin {i + 1}" : "") + of, Formulas.WaterContentOfTin,
                    $"100*({In(tins[i].TinAndWetSoil)} - {In(tins[i].TinAndDrySoil)})/({In(tins[i].TinAndDrySoil)} - {In(tins[i].Tin)})",
                    tins[i].WaterContent.Percent, "%");
            }

            if (tins.Count > 1)
            {
                Add("water content" + of, Formulas.MeanOfTins,
                    $"({string.Join(" + ", tins.Select(tin => Number(tin.WaterContent.Percent)))})/{tins.Count}", specimen.WaterContent.Percent, "%");
            }
            else if (tins.Count == 0 && measured.WaterContent is null)
            {
                if ((measured.WaterContentFromWetBasis ?? measured.WaterContentFromCarbide) is { } converted)
                {
                    var reading = 100 * converted.Fraction / (1 + converted.Fraction);
                    Add("water content" + of, Formulas.WaterContentFromWetBasis, $"100*{Number(reading)}/(100 - {Number(reading)})", converted.Percent, "%");
                }
                else
                {
                    Add("water content" + of, Formulas.WaterContentFromDensities,
                        $"100*({Number(specimen.WetDensity.In(DensityUnit))}/{Number(measured.DryDensity!.Value.In(DensityUnit))} - 1)", specimen.WaterContent.Percent, "%");
                }
            }
        }

        private void MoldVolume(Mold mold, Volume volume)
        {
            if (!_shown.Add(mold))
            {
                return;
            }

            if (mold is { Mass: null, WaterFilling: { Plate: { } plate } filling })
            {
                Add("mass of the mold", Formulas.MassWithoutPlate, $"{Number(filling.Empty.In(test.Units.Mass))} - {Number(plate.In(test.Units.Mass))}", filling.MoldMass.In(test.Units.Mass), test.Units.Mass.Code());
            }

            Readings("diameter of the mold", mold.Diameter);
            Readings("height of the mold", mold.Height);
            if (mold.Volume is { })
            {
                return;
            }

            var value = volume.In(test.Units.Volume);
            if (mold.WaterFilling is { } water)
            {
                var factor = test.Units.Mass.InKilograms() / test.Units.Volume.InCubicMeters();
                Add("volume of the mold", Formulas.VolumeByWater,
                    $"({Number(water.WithWater.In(test.Units.Mass))} - {Number(water.Empty.In(test.Units.Mass))})/{Number(water.Water.KilogramsPerCubicMeter)}{Factor(factor)}", value, test.Units.Volume.Symbol());
            }
            else
            {
                var length = test.Units.Length.InMeters();
                Add("volume of the mold", Formulas.VolumeOfCylinder,
                    $"{Number(Math.PI)}*{Number(mold.Diameter!.Value.In(test.Units.Length))}^2*{Number(mold.Height!.Value.In(test.Units.Length))}/4{Factor(length * length * length / test.Units.Volume.InCubicMeters())}",
                    value, test.Units.Volume.Symbol());
            }
        }

        /// <summary>What the soil takes up where it ends below the rim.</summary>
        private void SoilVolume(MeasuredLength? depth, Mold mold, Volume whole, Volume soil, string of)
        {
            if (depth is null)
            {
                return;
            }

            Readings("depth below the rim" + of, depth);
            string In(MeasuredLength length) => Number(length.Value.In(test.Units.Length));
            Add("volume" + of, Formulas.VolumeOfSoil,
                $"{Number(whole.In(test.Units.Volume))}*({In(mold.Height!)} - {In(depth)})/{In(mold.Height!)}",
                soil.In(test.Units.Volume), test.Units.Volume.Symbol());
        }

        /// <summary>The mean of readings, where it is what is reckoned with.</summary>
        private void Readings(string quantity, MeasuredLength? length)
        {
            if (length is { Given: null, Mean: { } mean, Readings: { Count: > 1 } readings })
            {
                Add(quantity, Formulas.MeanOfReadings,
                    $"({string.Join(" + ", readings.Select(reading => Number(reading.In(test.Units.Length))))})/{readings.Count}",
                    mean.In(test.Units.Length), test.Units.Length.Code());
            }
        }

        /// <summary>The wet mass in the caller's unit, with its step where the mold is taken off.</summary>
        private double WetMass(SpecimenMeasurement measured, string of)
        {
            var mold = measured.Mold?.Over(test.Mold) ?? test.Mold;
            if (measured.MoldAndWetSoil is not { } full || mold?.EmptyMass is not { } empty)
            {
                return measured.WetMass!.Value.In(test.Units.Mass);
            }

            var mass = (full - empty).In(test.Units.Mass);
            Add("mass of wet soil" + of, Formulas.WetMass, $"{Number(full.In(test.Units.Mass))} - {Number(empty.In(test.Units.Mass))}", mass, test.Units.Mass.Code());
            return mass;
        }

        private void Phases(WaterContent w, Density dry, Laboratory.Phases phases, string of)
        {
            var gravity = Number(test.SpecificGravity!.Value);
            Add("void ratio" + of, Formulas.VoidRatio, $"{gravity}*{WaterDensityText}/{Number(dry.In(DensityUnit))} - 1", phases.VoidRatio, "");
            Add("porosity" + of, Formulas.Porosity, $"100*{Number(phases.VoidRatio)}/(1 + {Number(phases.VoidRatio)})", phases.Porosity * 100, "%");
            Add("saturation" + of, Formulas.Saturation, $"{Number(w.Percent)}*{gravity}/{Number(phases.VoidRatio)}", phases.Saturation * 100, "%");
            Add("air voids" + of, Formulas.AirVoids, $"{Number(phases.Porosity * 100)}*(1 - {Number(phases.Saturation * 100)}/100)", phases.AirVoids * 100, "%");
        }

        private void Add(string quantity, Formula formula, string? substitution, double value, string unit) =>
            _steps.Add(formula.Step(quantity, substitution, value, unit));

        /// <summary>A change of unit, or nothing where the units match.</summary>
        private static string Factor(double factor) => Math.Abs(factor - 1) < 1e-12 ? "" : "*" + Number(factor);
    }
}
