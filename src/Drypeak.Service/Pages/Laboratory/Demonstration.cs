using Drypeak.Service.Pages.Forms;
using Microsoft.Extensions.Primitives;

namespace Drypeak.Service.Pages.Laboratory;

/// <summary>A worked test from the Ternmarsh embankment, an invented site, one click away.</summary>
/// <param name="Name">Its name in the address.</param>
/// <param name="Label">What it shows.</param>
/// <param name="Form">The form, filled.</param>
internal sealed record Demonstration(string Name, string Label, TestForm Form)
{
    /// <summary>Five specimens by their weighings, two tins each: what most laboratories have.</summary>
    public static readonly Demonstration Weighings = new("weighings", "five specimens from their weighings", Filled(
        (TestFields.Reference, "Ternmarsh, borrow area 7, sample 3"),
        (TestFields.Method, "astm-d698-a"),
        (TestFields.MoldMass, "4250"),
        (TestFields.MoldVolume, "943.3"),
        (TestFields.SpecificGravity, "2.68"),
        (TestFields.Determined, "measured"),
        (TestFields.SaturationLines, "80 90"),
        (TestFields.Table, """
            Specimen	Mold + wet soil	Tin	Tin + wet soil	Tin + dry soil	Tin 2	Tin 2 + wet soil	Tin 2 + dry soil
            1	6027	29.42	138.80	129.06	28.93	136.50	126.92
            2	6137	33.51	180.20	164.53	29.33	162.59	148.48
            3	6212	29.04	142.42	128.82	33.56	184.08	165.86
            4	6218	32.80	152.84	136.50	31.76	180.02	159.70
            5	6186	33.28	149.91	132.18	32.03	170.79	149.80
            """)));

    /// <summary>Four specimens that rise and never fall: no optimum, and what to do about it.</summary>
    public static readonly Demonstration StillRising = new("still-rising", "a test that never reached its peak", Filled(
        (TestFields.Reference, "Ternmarsh, borrow area 9, sample 1"),
        (TestFields.MoldMass, "4250"),
        (TestFields.MoldVolume, "943.3"),
        (TestFields.SpecificGravity, "2.70"),
        (TestFields.Table, """
            Specimen	Mold + wet soil	Tin	Tin + wet soil	Tin + dry soil
            1	5938	30.84	137.98	129.86
            2	6014	33.19	164.62	152.83
            3	6110	33.45	168.81	154.21
            4	6196	33.09	167.21	150.97
            """)));

    /// <summary>Densities already reduced, in pounds per cubic foot, with stones that did not fit the mold and one point set aside.</summary>
    public static readonly Demonstration Stones = new("stones", "densities in lb/ft³, with oversize to correct for", Filled(
        (TestFields.Reference, "Ternmarsh, crest, trial strip 2"),
        (TestFields.DensityUnit, "lb/ft3"),
        (TestFields.SpecificGravity, "2.71"),
        (TestFields.Determined, "measured"),
        (TestFields.OversizePercent, "14"),
        (TestFields.OversizeGravity, "2.65"),
        (TestFields.OversizeWater, "1.5"),
        (TestFields.Table, """
            Specimen	Water content	Dry density	Set aside
            A	6.9	118.6
            B	8.8	122.9
            C	10.6	125.4
            D	11.4	119.0	mold not full
            E	12.5	123.1
            F	14.3	118.8
            """)));

    public static IReadOnlyList<Demonstration> All { get; } = [Weighings, StillRising, Stones];

    /// <summary>Its address.</summary>
    public string Address => "/?demo=" + Name;

    public static Demonstration? Find(string name) => All.FirstOrDefault(demonstration => demonstration.Name == name);

    private static TestForm Filled(params (FormField Field, string Text)[] texts) =>
        TestForm.From(texts.Select(text => KeyValuePair.Create(text.Field.Name, new StringValues(text.Text))));
}
