namespace Drypeak.Service.Pages.Tables;

/// <summary>The order of columns that a table without a header has, by how many there are.</summary>
internal static class DefaultOrder
{
    private const int CellsOfTin = 3;

    /// <summary>
    /// Two columns: water content, dry density. Three: the specimen before them. Four, or three more for each further tin: mold + wet
    /// soil, then tin, tin + wet soil, tin + dry soil. Five, or three more: the specimen before those. Null for any other number.
    /// </summary>
    public static IReadOnlyList<Column>? Of(int count) => count switch
    {
        2 => [new(ColumnKind.WaterContent), new(ColumnKind.DryDensity)],
        3 => [new(ColumnKind.Specimen), new(ColumnKind.WaterContent), new(ColumnKind.DryDensity)],
        >= 4 when count % CellsOfTin == 1 => [new(ColumnKind.MoldAndWetSoil), .. Tins(count / CellsOfTin)],
        >= 5 when count % CellsOfTin == 2 => [new(ColumnKind.Specimen), new(ColumnKind.MoldAndWetSoil), .. Tins(count / CellsOfTin)],
        _ => null,
    };

    private static IEnumerable<Column> Tins(int count) => Enumerable.Range(0, count).SelectMany(tin => new Column[]
    {
        new(ColumnKind.Tin, tin), new(ColumnKind.TinAndWet, tin), new(ColumnKind.TinAndDry, tin),
    });
}
