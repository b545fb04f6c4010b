using Drypeak.Figures;
using Drypeak.Service.Charts;

namespace Drypeak.Service.Pages.Forms;

/// <summary>An answer for a page.</summary>
/// <typeparam name="TAnswer">The job's answer.</typeparam>
/// <param name="Answer">The answer.</param>
/// <param name="Draw">Draws its figure in a size; null where it has none.</param>
public readonly record struct FormAnswer<TAnswer>(TAnswer Answer, Func<FigureSize, Figure>? Draw)
{
    /// <summary>Further figures of the same answer, each with its name; null: none.</summary>
    public IReadOnlyList<(string Name, Func<FigureSize, Figure> Draw)>? Further { get; init; }
}

/// <summary>How a job answers a page.</summary>
internal static class FormAnswer
{
    /// <summary>A job without a figure.</summary>
    public static Func<TRequest, FormAnswer<TAnswer>> Of<TRequest, TAnswer>(Func<TRequest, TAnswer> compute) =>
        request => new FormAnswer<TAnswer>(compute(request), null);

    /// <summary>A job with a figure of some kind.</summary>
    public static Func<TRequest, FormAnswer<TAnswer>> Of<TRequest, TAnswer, TChart>(Func<TRequest, Charted<TAnswer, TChart>> compute, ChartKind<TChart> kind)
        where TChart : class => request =>
    {
        var (answer, chart) = compute(request);
        return new FormAnswer<TAnswer>(answer, chart is null || kind.Refusal(chart, new FigureOptions { Size = ChartView.Wide }) is { } ? null : size => kind.Draw(chart, new FigureOptions { Size = size }));
    };
}
