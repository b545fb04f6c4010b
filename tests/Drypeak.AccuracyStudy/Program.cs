using System.Diagnostics;
using Drypeak.AccuracyStudy;
using Drypeak.Soil.Tests.Curves.Accuracy;

var soils = args.Length > 1 ? int.Parse(args[1], System.Globalization.CultureInfo.InvariantCulture) : 2000;
var watch = Stopwatch.StartNew();
var main = Cells(SoilFamily.Main, withSpecificGravity: true);
var without = Cells(SoilFamily.Main, withSpecificGravity: false);
var further = Cells(SoilFamily.Further, withSpecificGravity: true);

var report = new Report();
report.Preface(soils);
report.Averaged("The averaged model (auto), four families", main);
report.Averaged("The averaged model without specific gravity", without);
report.Averaged("The averaged model, further shapes", further);
report.Models("Every model, four families", main);
report.Published();
File.WriteAllText(args[0], report.ToString());
Console.WriteLine($"{args[0]}: {main.Length + without.Length + further.Length} cells of {soils} soils in {watch.Elapsed.TotalSeconds:0} s");

StudyCell[] Cells(SoilFamily[] families, bool withSpecificGravity) =>
[
    .. families.SelectMany(family => Enumerable.Range(4, 3).Select(points => (family, points)))
        .AsParallel().AsOrdered().Select(cell => StudyCell.Run(cell.family, cell.points, soils, withSpecificGravity)),
];
