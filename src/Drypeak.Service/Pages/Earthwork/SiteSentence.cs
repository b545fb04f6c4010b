namespace Drypeak.Service.Pages.Earthwork;

/// <summary>An answer in one sentence, with what matters set bold: that part does not break over lines, and is short.</summary>
/// <param name="Before">What stands before it.</param>
/// <param name="Bold">What matters.</param>
/// <param name="After">What stands after it.</param>
internal readonly record struct SiteSentence(string Before, string Bold, string After)
{
    /// <summary>The whole sentence.</summary>
    public override string ToString() => $"{Before} {Bold} {After}".Trim();
}
