using System.Globalization;
using System.Text.RegularExpressions;
using Drypeak.Service.Pages.Forms;
using Drypeak.Service.Pages.Tables;

namespace Drypeak.Service.Pages.Laboratory;

/// <summary>What is wrong with a laboratory form, brought from the request to the field or cell that it came from.</summary>
internal static partial class TestFaults
{
    /// <summary>From the top of the form to its end; in the table from specimen to specimen.</summary>
    public static IComparer<FormFault> AsOnThePage { get; } = Comparer<FormFault>.Create((one, other) => (Position(one), one.Row).CompareTo((Position(other), other.Row)));

    /// <summary>The members that a message may name, as the form calls them.</summary>
    private static readonly Dictionary<string, string> FormWords = new(StringComparer.Ordinal)
    {
        ["mold.mass"] = TestFields.MoldMass.Label,
        ["mold.volume"] = TestFields.MoldVolume.Label,
        ["mold.diameter"] = TestFields.MoldDiameter.Label,
        ["mold.height"] = TestFields.MoldHeight.Label,
        ["moldAndWetSoil"] = ColumnKind.MoldAndWetSoil.Heading,
        ["wetMass"] = ColumnKind.WetMass.Heading,
        ["wetDensity"] = ColumnKind.WetDensity.Heading,
        ["dryDensity"] = ColumnKind.DryDensity.Heading,
        ["waterContent"] = ColumnKind.WaterContent.Heading,
        ["wetBasis"] = ColumnKind.WetBasis.Heading,
    };

    /// <summary>What the form cannot offer, said with what it can.</summary>
    private static string InFormWords(string message) => MemberName().Replace(
        message.Replace("Give waterContent, tins, wetBasis or carbide; or a wet and a dry density.", "Give it, or the three weighings of a tin.", StringComparison.Ordinal),
        member => FormWords.GetValueOrDefault(member.Value, member.Value));

    /// <summary>A fault of the request, brought to the field that it came from.</summary>
    public static FormFault Of(Fault fault, TestReading reading)
    {
        var field = TestFields.Of(fault.Place);
        var message = InFormWords(fault.Message);
        if (field != TestFields.Table || SpecimenAt().Match(fault.Place) is not { Success: true } at || reading.Sheet is not { } sheet)
        {
            return new FormFault(field.Name, field, field.Label, message);
        }

        var row = int.Parse(at.Groups["row"].ValueSpan, CultureInfo.InvariantCulture);
        var cell = sheet.CellOf(fault.Place);
        var where = cell is { } known ? $"Specimen {sheet.NameOf(row)}, {sheet.Columns[known.Column].Heading}" : $"Specimen {sheet.NameOf(row)}";
        return new FormFault(ControlOf(reading, row, cell), field, where, message, row);
    }

    /// <summary>The control that holds a place of the request; for a finding too.</summary>
    public static string ControlOf(string place, TestReading reading) =>
        TestFields.Of(place) is var field && field == TestFields.Table && SpecimenAt().Match(place) is { Success: true } at && reading.Sheet is { } sheet
            ? ControlOf(reading, int.Parse(at.Groups["row"].ValueSpan, CultureInfo.InvariantCulture), sheet.CellOf(place))
            : field.Name;

    private static string ControlOf(TestReading reading, int row, CellAt? cell) =>
        reading.FromGrid ? TestForm.CellName(new CellAt(reading.GridRowOf(row), cell?.Column ?? 0)) : TestFields.Table.Name;

    private static int Position(FormFault fault) => TestFields.All.TakeWhile(field => field != fault.Field).Count();

    [GeneratedRegex("^/specimens/(?<row>[0-9]+)")]
    private static partial Regex SpecimenAt();

    [GeneratedRegex(@"\b(?:mold\.)?[a-z]+[A-Z]?[A-Za-z]*\b")]
    private static partial Regex MemberName();
}
