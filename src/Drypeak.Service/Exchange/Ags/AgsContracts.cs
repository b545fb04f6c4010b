using Drypeak.Service.Exchange.Files;
using Drypeak.Service.Laboratory;

namespace Drypeak.Service.Exchange.Ags;

/// <summary>An AGS4 file computed.</summary>
/// <param name="Edition" example="4.1.1">The file's edition, from TRAN_AGS; null where it does not say.</param>
/// <param name="Groups">Its groups, in their order.</param>
/// <param name="Tests">Compaction tests: each row of CMPG that has points in CMPT.</param>
/// <param name="FieldTests">Field density tests: each row of IDEN that has a density and a water content.</param>
/// <param name="Findings">What there is to say about the file, in the order of its lines.</param>
public sealed record AgsAnswer(
    string? Edition, IReadOnlyList<AgsGroupAnswer> Groups, IReadOnlyList<AgsTestAnswer> Tests, IReadOnlyList<AgsFieldTestAnswer> FieldTests, IReadOnlyList<FileFinding> Findings);

/// <summary>A group of the file.</summary>
/// <param name="Group" example="CMPT">Its name.</param>
/// <param name="Rows" example="5">Its DATA lines.</param>
public sealed record AgsGroupAnswer(string Group, int Rows);

/// <summary>A compaction test of the file.</summary>
/// <param name="Key">The key of its row in CMPG, as the file has it.</param>
/// <param name="Answer">What /v1/moisture-density says of it; densities in Mg/m3.</param>
public sealed record AgsTestAnswer(IReadOnlyDictionary<string, string> Key, MoistureDensityAnswer Answer);

/// <summary>A field density test of the file.</summary>
/// <param name="Key">The key of its row in IDEN, as the file has it.</param>
/// <param name="DryDensity" example="1.835">Mg/m3, from the bulk density and the water content.</param>
/// <param name="WaterContent" example="11.2">% of dry mass.</param>
/// <param name="RelativeCompaction" example="96.6">%; null where the address names no maximumDryDensity.</param>
public sealed record AgsFieldTestAnswer(IReadOnlyDictionary<string, string> Key, double? DryDensity, double? WaterContent, double? RelativeCompaction);
