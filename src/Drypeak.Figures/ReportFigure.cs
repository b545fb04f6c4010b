using Drypeak.Figures.Layout.Reports;

namespace Drypeak.Figures;

/// <summary>
/// A report as pages. Reading <see cref="Draw"/> is reading the page: the result first, then what it rests on, the picture in the room that
/// is left, what a reviewer says, and lines to sign on.
/// </summary>
public static class ReportFigure
{
    /// <summary>Least and greatest height of the picture, px.</summary>
    private const double LeastPicture = 250, GreatestPicture = 430;

    /// <summary>Lays the report out. Equal reports give equal pages.</summary>
    /// <param name="report">What it says.</param>
    /// <param name="paper">The size of its pages.</param>
    /// <param name="theme">How it is dressed.</param>
    /// <returns>One page or more.</returns>
    public static IReadOnlyList<Figure> Draw(Report report, Paper paper, Theme theme)
    {
        var pages = new ReportPages(report, paper, theme);
        List<IReportBlock> before =
        [
            .. HeadBlocks.Of(report, pages.Width),
            .. FactBlocks.Of("Identification", report.Identification, pages.Width),
            .. FactBlocks.Of("Method", report.Method, pages.Width),
            .. TableBlocks.Of(report.Table, pages.Width),
        ];
        List<IReportBlock> after =
        [
            .. FactBlocks.Of("Further results", report.Results, pages.Width),
            .. FindingBlocks.Of(report.Findings, pages.Width),
            .. NoteBlocks.Of("To bear in mind", report.Cautions, pages.Width),
            new SignatureBlock(),
            new AddressBlock(report.Address),
        ];

        var taken = before.Concat(after).Sum(block => block.Height(pages.Width));
        pages.Write(before);
        if (report.Picture is { } picture)
        {
            var height = Math.Clamp(pages.HeightOfPage - taken - PictureBlock.Gap, LeastPicture, GreatestPicture);
            pages.Write([new PictureBlock(picture, height, theme)]);
        }

        pages.Write(after);
        if (report.Working.Count > 0)
        {
            pages.Turn();
            pages.Write(WorkingBlocks.Of(report.Working));
        }

        return pages.Finished();
    }
}
