using System.Globalization;
using Drypeak.Figures;
using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using Drypeak.Soil.TestMethods;

namespace Drypeak.Service.Laboratory;

/// <summary>A laboratory sheet, as an address asks for it: the page and the file read the same parameters.</summary>
internal static class SpecimenSheetQuery
{
    public const string Method = "method", WaterContents = "waterContents", Specimens = "specimens", MassUnit = "mass", Reference = "reference";

    /// <summary>Columns where neither water contents nor a number say how many, and the method asks for no more.</summary>
    private const int UsualSpecimens = 5;

    private const double MostWater = 1000;

    private static readonly string[] Names = [Method, WaterContents, Specimens, MassUnit, Reference];
    private static readonly char[] Separators = [' ', ';', '\t', '\r', '\n', '\u00A0', '\u2009'];

    /// <summary>Reads a query; a parameter without text counts as absent.</summary>
    /// <param name="query">The query.</param>
    /// <param name="limits">Bounds.</param>
    /// <param name="faults">Receives each unknown, repeated or impossible parameter.</param>
    /// <returns>The sheet; what was at fault is left blank in it.</returns>
    public static LaboratorySheet Read(IQueryCollection query, Limits limits, ICollection<Fault> faults)
    {
        foreach (var name in query.Keys)
        {
            if (!Names.Contains(name))
            {
                faults.Add(new Fault(Places.Member("", name.Length > 40 ? name[..40] + "…" : name), "unknown-parameter", $"There is no such parameter here. Those are: {string.Join(", ", Names)}."));
            }
            else if (query[name].Count > 1)
            {
                faults.Add(new Fault("/" + name, "repeated-parameter", "The parameter stands in the address more than once. Give it once."));
            }
        }

        var method = MethodOf(Text(query, Method), faults);
        var targets = TargetsOf(Text(query, WaterContents), faults);
        return new LaboratorySheet
        {
            Reference = ReferenceOf(Text(query, Reference), limits, faults),
            Method = method,
            MassUnit = MassUnitOf(Text(query, MassUnit), faults),
            WaterContents = [.. targets, .. Enumerable.Repeat<double?>(null, CountOf(Text(query, Specimens), targets.Count, method, faults) - targets.Count)],
        };
    }

    private static string? Text(IQueryCollection query, string name) => query[name] is [{ } text] && text.Trim() is { Length: > 0 } trimmed ? trimmed : null;

    private static TestMethod? MethodOf(string? code, ICollection<Fault> faults)
    {
        var method = code is null ? null : TestMethodCatalogue.Find(code);
        if (code is not null && method is null)
        {
            faults.Add(new Fault("/" + Method, "unknown-method", $"There is no method \"{Received.Shorten(code)}\". The codes are listed at /v1/test-methods."));
        }

        return method;
    }

    private static List<double?> TargetsOf(string? text, ICollection<Fault> faults)
    {
        var targets = new List<double?>();
        foreach (var item in Items(text ?? ""))
        {
            if (double.TryParse(item, NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture, out var percent) && percent is >= 0 and <= MostWater)
            {
                targets.Add(percent);
                continue;
            }

            faults.Add(new Fault("/" + WaterContents, "out-of-range", $"Each water content is a number from 0 to {RuleWords.Text(MostWater)} %; \"{Received.Shorten(item)}\" was received."));
            return [];
        }

        if (targets.Count > LaboratorySheet.MostSpecimens)
        {
            faults.Add(new Fault("/" + WaterContents, "too-many", $"A page has columns for {LaboratorySheet.MostSpecimens} specimens; {targets.Count} water contents were received."));
            return [];
        }

        return targets;
    }

    /// <summary>The numbers of a list. A comma is a decimal mark only where something else parts the numbers.</summary>
    private static IEnumerable<string> Items(string text)
    {
        const StringSplitOptions clean = StringSplitOptions.RemoveEmptyEntries | StringSplitOptions.TrimEntries;
        var parted = text.Split(Separators, clean);
        return parted.Length == 1 || parted.Any(item => item[^1] == ',')
            ? text.Split([.. Separators, ','], clean)
            : parted.Select(item => item.Replace(',', '.'));
    }

    private static int CountOf(string? text, int targets, TestMethod? method, ICollection<Fault> faults)
    {
        var least = Math.Max(1, targets);
        if (text is null)
        {
            return targets > 0 ? targets : Math.Clamp(method?.MinimumSpecimens?.Value ?? 0, UsualSpecimens, LaboratorySheet.MostSpecimens);
        }

        if (int.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out var count) && count >= least && count <= LaboratorySheet.MostSpecimens)
        {
            return count;
        }

        faults.Add(new Fault("/" + Specimens, "out-of-range", $"It must be a whole number from {least} to {LaboratorySheet.MostSpecimens}, a column for each water content at least; \"{Received.Shorten(text)}\" was received."));
        return least;
    }

    private static Soil.Quantities.MassUnit MassUnitOf(string? name, ICollection<Fault> faults)
    {
        if (name is null)
        {
            return Soil.Quantities.MassUnit.Gram;
        }

        if (!UnitNames.Mass.TryGetValue(name, out var unit))
        {
            faults.Add(new Fault("/" + MassUnit, "unknown-unit", $"It must be one of {string.Join(", ", UnitNames.Mass.Keys)}; \"{Received.Shorten(name)}\" was received."));
        }

        return unit;
    }

    private static string? ReferenceOf(string? reference, Limits limits, ICollection<Fault> faults)
    {
        if (reference?.Length > limits.NameCharacters)
        {
            faults.Add(new Fault("/" + Reference, "too-long", $"It may have up to {limits.NameCharacters} characters; it has {reference.Length}. Shorten it."));
            return null;
        }

        return reference;
    }
}
