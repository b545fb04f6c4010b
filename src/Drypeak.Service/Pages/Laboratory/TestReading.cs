using Drypeak.Service.Contracts;
using Drypeak.Service.Laboratory;
using Drypeak.Service.Pages.Forms;
using Drypeak.Service.Pages.Tables;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Pages.Laboratory;

/// <summary>
/// A typed form as a request. A text that is no number is a fault and leaves its member out; the others stand, so that all that is wrong
/// can be said at once.
/// </summary>
public sealed class TestReading
{
    private readonly TestForm _form;
    private readonly DecimalMark? _mark;
    private readonly List<Fault> _unreadable = [];
    private readonly List<Fault> _missing = [];

    private TestReading(TestForm form)
    {
        _form = form;
        _mark = form[TestFields.DecimalMark] switch { "point" => DecimalMark.Point, "comma" => DecimalMark.Comma, _ => null };
        Request = Read();
    }

    /// <summary>The request, as far as the form could be read.</summary>
    public MoistureDensityRequest Request { get; }

    /// <summary>What could not be read.</summary>
    public IReadOnlyList<Fault> Unreadable => _unreadable;

    /// <summary>What the form lacks to be a request.</summary>
    public IReadOnlyList<Fault> Missing => _missing;

    /// <summary>The form's units. A unit that is none is a fault of its own; the cells are then read as if nothing had been chosen.</summary>
    public UnitSet Units { get; private set; } = new();

    /// <summary>The pasted table, or null where the grid was used.</summary>
    public TableReading? Table { get; private set; }

    /// <summary>The specimens as read, from the table or from the grid; null where there are none.</summary>
    public SpecimenSheet? Sheet { get; private set; }

    /// <summary>Whether <see cref="Sheet"/> is the grid.</summary>
    public bool FromGrid => Table is null;

    public static TestReading Of(TestForm form) => new(form);

    /// <summary>The row of the grid that a specimen stands in: empty rows between are no specimens.</summary>
    public int GridRowOf(int specimen) => _form.FilledRows[specimen];

    /// <summary>What a place of the request is called on the page: a specimen, or a field's label.</summary>
    public string NameOf(string place) =>
        place.StartsWith("/specimens/", StringComparison.Ordinal) && Sheet is { } sheet && int.TryParse(place.Split('/')[2], out var row) && row < sheet.Rows.Count
            ? $"Specimen {sheet.NameOf(row)}"
            : TestFields.Of(place).Label;

    /// <summary>Whether the specimen at a place, such as <c>/specimens/2</c>, brings its water content.</summary>
    public bool HasWaterContent(string place) =>
        Request.Specimens!.Where((_, i) => $"/specimens/{i}" == place)
            .Any(specimen => specimen.WaterContent is not null || specimen.WetBasis is not null || specimen.Tins is not null);

    private MoistureDensityRequest Read()
    {
        var units = new UnitsContract
        {
            Mass = _form[TestFields.MassUnit],
            TinMass = _form[TestFields.TinUnit],
            Volume = _form[TestFields.VolumeUnit],
            Density = _form[TestFields.DensityUnit],
            Length = _form[TestFields.LengthUnit],
        };
        Units = UnitsAreKnown(units) ? units.ToUnitSet() : new();
        ReadSpecimens();
        var request = new MoistureDensityRequest
        {
            Reference = Text(TestFields.Reference),
            Method = Text(TestFields.Method),
            Units = units,
            Mold = ReadMold(),
            SpecificGravity = Number(TestFields.SpecificGravity) is { } gravity
                ? new SpecificGravityContract { Value = gravity, Determined = _form[TestFields.Determined] }
                : null,
            WaterTemperature = Number(TestFields.WaterTemperature),
            Specimens = Sheet?.Specimens ?? [],
            Oversize = ReadOversize(),
            Curve = new CurveRequest { Model = _form[TestFields.CurveModel], Adopted = ReadAdopted() },
            Lines = ReadLines(),
            Trace = Text(TestFields.Working) is null ? null : true,
        };
        NoteMissingMold(request);
        return request;
    }

    private void ReadSpecimens()
    {
        var text = _form[TestFields.Table];
        var rows = _form.FilledRows;
        if (string.IsNullOrWhiteSpace(text) && rows.Count == 0)
        {
            _missing.Add(new Fault(TestFields.Table.Place, "no-specimens", "There are no specimens yet. Paste a table, or type into the grid below it."));
            return;
        }

        if (!string.IsNullOrWhiteSpace(text) && rows.Count > 0)
        {
            _missing.Add(new Fault(TestFields.Table.Place, "two-tables", "There are specimens in the pasted table and in the grid. Clear one of the two."));
        }

        if (!string.IsNullOrWhiteSpace(text))
        {
            Table = TableReader.Read(text, Units, _mark);
            Sheet = Table.Sheet;
            _unreadable.AddRange(Table.Faults);
        }
        else
        {
            Sheet = SpecimenSheet.Read(TestForm.GridColumns, [.. rows.Select(GridRow)], Units, _mark);
            _unreadable.AddRange(Sheet.Faults);
        }
    }

    private IReadOnlyList<string> GridRow(int row) =>
        [.. Enumerable.Range(0, TestForm.GridColumns.Count).Select(column => _form[new CellAt(row, column)].Trim())];

    private static bool UnitsAreKnown(UnitsContract units) =>
        UnitNames.Mass.ContainsKey(units.Mass!) && UnitNames.Mass.ContainsKey(units.TinMass!) && UnitNames.Volume.ContainsKey(units.Volume!)
        && UnitNames.Density.ContainsKey(units.Density!) && UnitNames.Length.ContainsKey(units.Length!);

    private MoldContract? ReadMold() => IfAnyTyped([TestFields.MoldMass, TestFields.MoldVolume, TestFields.MoldDiameter, TestFields.MoldHeight], () => new MoldContract
    {
        Mass = Number(TestFields.MoldMass),
        Volume = Number(TestFields.MoldVolume),
        Diameter = Number(TestFields.MoldDiameter),
        Height = Number(TestFields.MoldHeight),
    });

    private OversizeContract? ReadOversize() => IfAnyTyped([TestFields.OversizePercent, TestFields.OversizeGravity, TestFields.OversizeWater, TestFields.OversizeSieve], () => new OversizeContract
    {
        Percent = Number(TestFields.OversizePercent),
        SpecificGravity = Number(TestFields.OversizeGravity),
        WaterContent = Number(TestFields.OversizeWater),
        Sieve = Number(TestFields.OversizeSieve),
    });

    private AdoptedRequest? ReadAdopted() => IfAnyTyped([TestFields.AdoptedWater, TestFields.AdoptedDensity, TestFields.AdoptedReason], () => new AdoptedRequest
    {
        WaterContent = Number(TestFields.AdoptedWater),
        MaximumDryDensity = Number(TestFields.AdoptedDensity),
        Reason = Text(TestFields.AdoptedReason),
    });

    private LinesRequest? ReadLines() => IfAnyTyped([TestFields.SaturationLines, TestFields.AirVoidsLines], () => new LinesRequest
    {
        Saturation = Numbers(TestFields.SaturationLines),
        AirVoids = Numbers(TestFields.AirVoidsLines),
    });

    private T? IfAnyTyped<T>(FormField[] fields, Func<T> read)
        where T : class => fields.Any(field => Text(field) is not null) ? read() : null;

    /// <summary>Specimens weighed in a mold need it: said once at the mold's fields, not at every specimen.</summary>
    private void NoteMissingMold(MoistureDensityRequest request)
    {
        var specimens = request.Specimens!.Where(specimen => specimen is { WetDensity: null, DryDensity: null }).ToList();
        if (Text(TestFields.MoldMass) is null && specimens.Exists(specimen => specimen is { MoldAndWetSoil: not null, Mold.Mass: null } or { MoldAndWetSoil: not null, Mold: null }))
        {
            _missing.Add(new Fault(TestFields.MoldMass.Place, "missing-mold", "It is needed: the specimens were weighed in the mold. Give the mass of the empty mold."));
        }

        if (Text(TestFields.MoldVolume) is null && Text(TestFields.MoldDiameter) is null
            && specimens.Exists(specimen => (specimen.MoldAndWetSoil ?? specimen.WetMass) is not null && specimen.Mold?.Volume is null))
        {
            _missing.Add(new Fault(TestFields.MoldVolume.Place, "missing-mold", "It is needed to make a density of the masses. Give it, or the diameter and height under “More”."));
        }
    }

    private string? Text(FormField field) => _form[field].Trim() is { Length: > 0 } text ? text : null;

    private double? Number(FormField field)
    {
        if (Text(field) is not { } text)
        {
            return null;
        }

        if (NumberText.Read(text, _mark ?? MarkOfItself(text), out var number) is { } refusal)
        {
            _unreadable.Add(new Fault(field.Place, "not-a-number", refusal));
            return null;
        }

        return number;
    }

    /// <summary>A field stands alone, so that either mark is understood in it.</summary>
    private static DecimalMark? MarkOfItself(string text) =>
        NumberText.HasDecimals(text, DecimalMark.Comma) ? DecimalMark.Comma : NumberText.HasDecimals(text, DecimalMark.Point) ? DecimalMark.Point : null;

    /// <summary>Several numbers with spaces or semicolons between them; a comma parts them only before a space.</summary>
    private List<double>? Numbers(FormField field)
    {
        if (Text(field) is not { } text)
        {
            return null;
        }

        var numbers = new List<double>();
        foreach (var part in text.Split([' ', ';'], StringSplitOptions.RemoveEmptyEntries).Select(part => part.TrimEnd(',')).Where(part => part.Length > 0))
        {
            if (part.Contains(',', StringComparison.Ordinal) && _mark != DecimalMark.Comma)
            {
                _unreadable.Add(new Fault(field.Place, "not-a-number", $"“{NumberText.Shortened(part)}” may be one number or two. Put a space between two, and write decimals with a point."));
            }
            else if (NumberText.Read(part, _mark ?? DecimalMark.Point, out var number) is { } refusal)
            {
                _unreadable.Add(new Fault(field.Place, "not-a-number", refusal));
            }
            else
            {
                numbers.Add(number);
            }
        }

        return numbers;
    }
}
