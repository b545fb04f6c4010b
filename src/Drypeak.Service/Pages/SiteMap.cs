namespace Drypeak.Service.Pages;

/// <summary>The pages in the order of the work, for the navigation.</summary>
internal static class SiteMap
{
    public static IReadOnlyList<(string Group, IReadOnlyList<(string Address, string Name)> Links)> Groups { get; } =
    [
        ("Laboratory", [("/", "Compaction test"), ("/specimen-sheet", "Blank sheet")]),
        ("Field", [("/field", "Field density test")]),
        ("Reference", [("/test-methods", "Test methods"), ("/findings", "Findings"), ("/reference", "For programs")]),
    ];
}
