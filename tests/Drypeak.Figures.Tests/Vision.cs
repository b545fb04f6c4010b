using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Tests;

/// <summary>Eyes, and paper out of a copier, that see fewer colors.</summary>
internal enum Vision
{
    Full,
    WithoutRedCones,
    WithoutGreenCones,
    WithoutBlueCones,
    Grey,
}

/// <summary>What is left of a difference of colors.</summary>
internal static class VisionExtensions
{
    /// <summary>
    /// Linear red, green and blue as they are seen, row by row: Machado, Oliveira and Fernandes, A physiologically-based model for simulation
    /// of color vision deficiency, IEEE Trans. Visualization and Computer Graphics 15 (2009) 1291–1298, severity 1.0 (from memory).
    /// Grey: the luminance of ITU-R BT.709.
    /// </summary>
    private static double[] Matrix(Vision vision) => vision switch
    {
        Vision.Full => [1, 0, 0, 0, 1, 0, 0, 0, 1],
        Vision.WithoutRedCones => [0.152286, 1.052583, -0.204868, 0.114503, 0.786281, 0.099216, -0.003882, -0.048116, 1.051998],
        Vision.WithoutGreenCones => [0.367322, 0.860646, -0.227968, 0.280085, 0.672501, 0.047413, -0.011820, 0.042940, 0.968881],
        Vision.WithoutBlueCones => [1.255528, -0.076749, -0.178779, -0.078411, 0.930809, 0.147602, 0.004733, 0.691367, 0.303900],
        Vision.Grey => [0.2126, 0.7152, 0.0722, 0.2126, 0.7152, 0.0722, 0.2126, 0.7152, 0.0722],
        _ => throw new ArgumentOutOfRangeException(nameof(vision)),
    };

    /// <summary>ΔE*ab of two colors as they are seen: 2.3 is just noticed side by side, 20 is told apart at a distance.</summary>
    public static double Difference(this Vision vision, Color one, Color other)
    {
        var (a, b) = (Lab(Seen(vision, one)), Lab(Seen(vision, other)));
        return Math.Sqrt(a.Zip(b, (x, y) => (x - y) * (x - y)).Sum());
    }

    private static double[] Seen(Vision vision, Color color)
    {
        var m = Matrix(vision);
        double[] rgb = [Linear(color.Red), Linear(color.Green), Linear(color.Blue)];
        return [.. Enumerable.Range(0, 3).Select(row => Math.Clamp((m[3 * row] * rgb[0]) + (m[(3 * row) + 1] * rgb[1]) + (m[(3 * row) + 2] * rgb[2]), 0, 1))];
    }

    /// <summary>CIE 1976 L*a*b* under D65 (IEC 61966-2-1 and CIE 015).</summary>
    private static double[] Lab(double[] linear)
    {
        var (r, g, b) = (linear[0], linear[1], linear[2]);
        var x = F(((0.4124 * r) + (0.3576 * g) + (0.1805 * b)) / 0.9505);
        var y = F((0.2126 * r) + (0.7152 * g) + (0.0722 * b));
        var z = F(((0.0193 * r) + (0.1192 * g) + (0.9505 * b)) / 1.089);
        return [(116 * y) - 16, 500 * (x - y), 200 * (y - z)];

        static double F(double t) => t > 216.0 / 24389 ? Math.Cbrt(t) : ((24389.0 / 27 * t) + 16) / 116;
    }

    private static double Linear(byte channel)
    {
        var value = channel / 255.0;
        return value <= 0.04045 ? value / 12.92 : Math.Pow((value + 0.055) / 1.055, 2.4);
    }
}
