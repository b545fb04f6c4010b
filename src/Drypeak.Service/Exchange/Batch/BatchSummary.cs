namespace Drypeak.Service.Exchange.Batch;

/// <summary>The last line of a batch, where it was asked for.</summary>
/// <param name="Summary">The counts.</param>
public sealed record BatchSummaryLine(BatchSummary Summary);

/// <summary>What became of a batch.</summary>
/// <param name="Complete" example="true">Whether every line of the body was read and answered; false where the body broke off or the service had to stop.</param>
/// <param name="Lines" example="2000">Lines of the body, blank ones too.</param>
/// <param name="Blank" example="1">Lines with nothing in them; they have no answer.</param>
/// <param name="Answered" example="1997">Lines that were computed.</param>
/// <param name="Refused" example="2">Lines that were answered by a problem.</param>
/// <param name="WithErrors" example="14">Of those computed: tests whose worst finding is an error.</param>
/// <param name="WithWarnings" example="390">Of those computed: tests whose worst finding is a warning.</param>
public sealed record BatchSummary(bool Complete, long Lines, long Blank, long Answered, long Refused, long WithErrors, long WithWarnings);
