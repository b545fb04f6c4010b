using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout;

/// <summary>Marks sorted into the cells of a grid, so that a label among ten thousand is held against its neighbors only.</summary>
internal sealed class MarksByCell
{
    private const double Cell = 48;

    private readonly Dictionary<(int Column, int Row), List<(Place Center, double Radius)>> _cells = [];
    private double _largest;

    public void Add(Place center, double radius)
    {
        var cell = (At(center.X), At(center.Y));
        if (!_cells.TryGetValue(cell, out var marks))
        {
            marks = [];
            _cells.Add(cell, marks);
        }

        marks.Add((center, radius));
        _largest = Math.Max(_largest, radius);
    }

    /// <summary>Whether any mark comes into the box.</summary>
    public bool Meet(OrientedBox box)
    {
        var near = box.Bounds.Grown(_largest);
        for (var column = At(near.Left); column <= At(near.Right); column++)
        {
            for (var row = At(near.Top); row <= At(near.Bottom); row++)
            {
                if (_cells.TryGetValue((column, row), out var marks) && marks.Exists(mark => box.MeetsDisc(mark.Center, mark.Radius)))
                {
                    return true;
                }
            }
        }

        return false;
    }

    private static int At(double coordinate) => (int)Math.Floor(coordinate / Cell);
}
