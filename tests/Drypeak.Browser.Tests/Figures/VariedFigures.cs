using Drypeak.Figures;
using Drypeak.Figures.Tests;
using Drypeak.Soil.Quantities;

namespace Drypeak.Browser.Tests.Figures;

/// <summary>Sixty figures that differ in what they show, in size, theme, language, axes and script.</summary>
internal static class VariedFigures
{
    private static readonly FigureSize[] Sizes = [new(480, 360), FigureSize.Default, new(1920, 1200)];

    public static IReadOnlyList<(string Name, Figure Figure)> All { get; } = [.. OfCompaction(), .. OfPlots()];

    /// <summary>13 charts in 3 sizes, each in the next theme and language.</summary>
    private static IEnumerable<(string, Figure)> OfCompaction()
    {
        (string Name, CompactionChart Chart, FigureOptions Options)[] charts =
        [
            ("usual", Charts.Ternmarsh, new FigureOptions()),
            ("full", Charts.Full, new FigureOptions()),
            ("field tests", Charts.InTheField, new FigureOptions()),
            ("models", Charts.WithModels, new FigureOptions { Models = ["parabola", "spline"] }),
            ("void ratio", Charts.Ternmarsh, new FigureOptions { Second = SecondAxis.VoidRatio }),
            ("second unit", Charts.Full, new FigureOptions { Second = new SecondAxis(DensityUnit.PoundPerCubicFoot) }),
            ("no optimum", Charts.WithoutOptimum, new FigureOptions()),
            ("own title", Charts.Full, new FigureOptions { Title = "Ternmarsh flood embankment: clay of borrow area 7, all samples of the first season" }),
            ("error bars", Charts.Ternmarsh with { Specimens = [.. Charts.Ternmarsh.Specimens.Select(specimen => specimen with { WaterContentPlusMinus = 0.3, DryDensityPlusMinus = 0.014 })] }, new FigureOptions()),
            ("crowded", Charts.Full with { Specimens = [.. Enumerable.Range(0, 35).Select(i => new ChartSpecimen(9 + (i * 0.25), 1.70 + (i * 37 % 13 * 0.01), $"S{i + 1}", i % 9 == 0))], Saturation = [100, 95, 90, 85, 80, 70], AirVoids = [2, 5, 10, 15] }, new FigureOptions()),
            ("Arabic", Charts.Full with { Reference = "سد الفيضان 7, منطقة الاستعارة" }, new FigureOptions()),
            ("Han", Charts.Full with { Reference = "防洪堤 第七取土区 样品三", Specimens = [.. Charts.Full.Specimens.Select(specimen => specimen with { Label = $"样{specimen.Label}" })] }, new FigureOptions()),
            ("markup", Charts.Full with { Reference = "<b>&\"'</b> " + new string('W', 120) }, new FigureOptions()),
        ];
        return charts.SelectMany((chart, i) => Sizes.Select((size, j) => (
            $"{chart.Name} {size.Width}",
            CompactionFigure.Draw(chart.Chart, chart.Options with { Size = size, Theme = Theme.All[(i + j) % 3], Language = Language.All[(i + (2 * j)) % Language.All.Count] }))));
    }

    /// <summary>7 plots in 3 sizes.</summary>
    private static IEnumerable<(string, Figure)> OfPlots() => PlotCharts.ByName.SelectMany((plot, i) => Sizes.Select((size, j) => (
        $"{plot.Key} {size.Width}",
        PlotFigure.Draw(plot.Value, new FigureOptions { Size = size, Theme = Theme.All[(i + j) % 3] }))));
}
