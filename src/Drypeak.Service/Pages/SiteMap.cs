namespace Drypeak.Service.Pages;

/// <summary>The pages in the order of the work, for the navigation.</summary>
internal static class SiteMap
{
    public static IReadOnlyList<(string Group, IReadOnlyList<(string Address, string Name)> Links)> Groups { get; } =
    [
        ("Laboratory", [("/", "Compaction test"), ("/specimen-sheet", "Blank sheet")]),
        ("Field", [("/field", "Field density test"), ("/rapid-method", "Rapid method"), ("/one-point", "One point on a family"), ("/relative-density", "Relative density")]),
        ("Lots", [("/lot", "Lot acceptance"), ("/plan", "What a plan risks")]),
        ("Earthwork",
        [
            ("/earthwork/specimen-water", "Water for specimens"), ("/earthwork/lift-water", "Water for a lift"), ("/earthwork/quantities", "Quantities and haulage"),
            ("/earthwork/test-locations", "Test locations"), ("/earthwork/roller-output", "Roller output"), ("/earthwork/test-strip", "Trial strip"),
        ]),
        ("Files", [("/exchange", "CSV and AGS4")]),
        ("Reference", [("/test-methods", "Test methods"), ("/findings", "Findings"), ("/reference", "For programs")]),
    ];
}
