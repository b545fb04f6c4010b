using System.Globalization;
using System.Text.RegularExpressions;
using Drypeak.Service.Pages.Tables;

namespace Drypeak.Service.Pages.Laboratory;

/// <summary>What is wrong with a field of the form.</summary>
/// <param name="Control">Identifier of the control that it is about: what a link goes to.</param>
/// <param name="Field">The field that the control belongs to; the grid's cells belong to the table.</param>
/// <param name="Where">The field's label, or specimen and column.</param>
/// <param name="Advice">A sentence on what is wrong and what to do.</param>
/// <param name="Specimen">Position of the specimen that it is about, from 0; −1 where it is about none.</param>
public sealed partial record FormFault(string Control, Field Field, string Where, string Advice, int Specimen = -1)
{
    /// <summary>The whole sentence, for where the field is not in view.</summary>
    public string Message => $"{Where}: {(Advice.StartsWith("It ", StringComparison.Ordinal) ? "it " + Advice[3..] : Advice)}";

    /// <summary>From the top of the form to its end; in the table from specimen to specimen.</summary>
    public static IComparer<FormFault> AsOnThePage { get; } = Comparer<FormFault>.Create((one, other) => (Position(one), one.Specimen).CompareTo((Position(other), other.Specimen)));

    /// <summary>The members that a message may name, as the form calls them.</summary>
    private static readonly Dictionary<string, string> FormWords = new(StringComparer.Ordinal)
    {
        ["mold.mass"] = Field.MoldMass.Label,
        ["mold.volume"] = Field.MoldVolume.Label,
        ["mold.diameter"] = Field.MoldDiameter.Label,
        ["mold.height"] = Field.MoldHeight.Label,
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
    public static FormFault Of(Fault fault, FormReading reading)
    {
        var field = Field.Of(fault.Place);
        var message = InFormWords(fault.Message);
        if (field != Field.Table || SpecimenAt().Match(fault.Place) is not { Success: true } at || reading.Sheet is not { } sheet)
        {
            return new FormFault(field.Name, field, field.Label, message);
        }

        var row = int.Parse(at.Groups["row"].ValueSpan, CultureInfo.InvariantCulture);
        var cell = sheet.CellOf(fault.Place);
        var where = cell is { } known ? $"Specimen {sheet.NameOf(row)}, {sheet.Columns[known.Column].Heading}" : $"Specimen {sheet.NameOf(row)}";
        return new FormFault(ControlOf(reading, row, cell), field, where, message, row);
    }

    /// <summary>The control that holds a place of the request; for a finding too.</summary>
    public static string ControlOf(string place, FormReading reading) =>
        Field.Of(place) is var field && field == Field.Table && SpecimenAt().Match(place) is { Success: true } at && reading.Sheet is { } sheet
            ? ControlOf(reading, int.Parse(at.Groups["row"].ValueSpan, CultureInfo.InvariantCulture), sheet.CellOf(place))
            : field.Name;

    private static string ControlOf(FormReading reading, int row, CellAt? cell) =>
        reading.FromGrid ? TestForm.CellName(new CellAt(reading.GridRowOf(row), cell?.Column ?? 0)) : Field.Table.Name;

    private static int Position(FormFault fault) => Field.All.TakeWhile(field => field != fault.Field).Count();

    [GeneratedRegex("^/specimens/(?<row>[0-9]+)")]
    private static partial Regex SpecimenAt();

    [GeneratedRegex(@"\b(?:mold\.)?[a-z]+[A-Z]?[A-Za-z]*\b")]
    private static partial Regex MemberName();
}
