using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout;

/// <summary>Labels that stand in their line and follow its slope; the line leaves a gap for them.</summary>
internal static class LineLabels
{
    /// <summary>How far a line may bend away from the straight label on it, em.</summary>
    private const double LargestBend = 0.15;

    /// <summary>Parts a line for its label where there is a free place along it; null where there is none.</summary>
    /// <param name="labels">The label, the fullest wording first.</param>
    /// <param name="owner">The owner of the line's own segments in <paramref name="space"/>.</param>
    /// <param name="course">The line.</param>
    /// <param name="size">Of the label, px.</param>
    /// <param name="color">Of the label.</param>
    /// <param name="space">The room that is left.</param>
    public static IReadOnlyList<IReadOnlyList<Place>>? Place(IReadOnlyList<string> labels, object owner, Course course, double size, ColorRole color, LabelSpace space)
    {
        var candidates = labels.SelectMany(text => Candidates(text, course, size, color)).ToList();
        var placed = space.Place(candidates.Select(candidate => candidate.Text), Barriers.All, owner);
        if (placed is null)
        {
            return null;
        }

        var at = candidates.Find(candidate => ReferenceEquals(candidate.Text, placed)).At;
        var half = (placed.Width / 2) + (0.3 * size);
        return [course.Part(0, at - half), course.Part(at + half, course.Length)];
    }

    /// <summary>From the upper end on, where lines fan out; level text reads best, so a place where the line is too bent is passed over.</summary>
    private static IEnumerable<(TextRun Text, double At)> Candidates(string text, Course course, double size, ColorRole color)
    {
        var half = EmbeddedFont.Regular.Measure(text, size) / 2;
        var margin = half + (1.2 * size);
        var step = Math.Max(size / 2, course.Length / 60);
        for (var at = margin; at <= course.Length - margin; at += step)
        {
            var (before, middle, after) = (course.At(at - half), course.At(at), course.At(at + half));
            var chord = before.Toward(after, 0.5);
            if (chord.To(middle) > LargestBend * size)
            {
                continue;
            }

            var (sine, cosine) = ((after.Y - before.Y) / (2 * half), (after.X - before.X) / (2 * half));
            var angle = Math.Atan2(sine, cosine) * 180 / Math.PI;
            var center = chord.Toward(middle, 0.5);
            var baseline = new Place(center.X - (0.31 * size * sine), center.Y + (0.31 * size * cosine));
            yield return (new TextRun(text, baseline, size, EmbeddedFont.Regular, color, TextAnchor.Middle, angle), at);
        }
    }
}
