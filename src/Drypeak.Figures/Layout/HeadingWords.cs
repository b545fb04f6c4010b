namespace Drypeak.Figures.Layout;

/// <summary>What is written over the plot.</summary>
/// <param name="Title">In one line; empty for none.</param>
/// <param name="Halves">The title in two lines, for a picture too narrow for one; null where it is then elided.</param>
/// <param name="Subtitles">Two lines of texts; empty texts are passed over.</param>
internal sealed record HeadingWords(string Title, (string First, string Second)? Halves, IReadOnlyList<IReadOnlyList<string>> Subtitles);
