using System.Buffers.Binary;
using SkiaSharp;

namespace Drypeak.Figures;

/// <summary>Writes a figure as PNG, 8 bit, sRGB, opaque, with its resolution. Equal figures give equal bytes.</summary>
public static class PngWriter
{
    /// <summary>Smallest scale.</summary>
    public const double SmallestScale = 0.5;

    /// <summary>Largest scale.</summary>
    public const double LargestScale = 4;

    private const double PixelsPerMeterAtScaleOne = 96 / 0.0254;

    /// <summary>The figure as a PNG file.</summary>
    /// <param name="figure">The figure.</param>
    /// <param name="scale">Pixels to a px of the figure, 0.5 to 4: 2 for a dense screen, about 3 for print at 300 dpi.</param>
    /// <exception cref="ArgumentOutOfRangeException">The scale is out of bounds.</exception>
    public static byte[] Write(Figure figure, double scale = 1)
    {
        if (scale is not (>= SmallestScale and <= LargestScale))
        {
            throw new ArgumentOutOfRangeException(nameof(scale), scale, $"The scale must be from {SmallestScale} to {LargestScale}.");
        }

        var (width, height) = ((int)Math.Round(figure.Size.Width * scale), (int)Math.Round(figure.Size.Height * scale));
        using var colors = SKColorSpace.CreateSrgb();
        using var surface = SKSurface.Create(new SKImageInfo(width, height, SKColorType.Rgba8888, SKAlphaType.Opaque, colors))
            ?? throw new InvalidOperationException($"There is no memory for a picture of {width} by {height} pixels.");
        using (var canvas = new SkiaCanvas(surface.Canvas, figure.Palette))
        {
            surface.Canvas.Scale((float)scale);
            figure.DrawOn(canvas);
        }

        // Of the filters and levels, Up at 3 is near the fastest and within a fifth of the smallest for line drawings.
        using var pixels = surface.PeekPixels() ?? throw new InvalidOperationException("The picture's pixels cannot be read.");
        using var encoded = pixels.Encode(new SKPngEncoderOptions(SKPngEncoderFilterFlags.Up, 3))
            ?? throw new InvalidOperationException("The picture cannot be encoded.");
        return WithResolution(encoded.AsSpan(), (uint)Math.Round(PixelsPerMeterAtScaleOne * scale));
    }

    /// <summary>Puts a pHYs chunk behind the header (ISO/IEC 15948, 11.3.5.3): the encoder writes none.</summary>
    private static byte[] WithResolution(ReadOnlySpan<byte> png, uint pixelsPerMeter)
    {
        const int signatureAndHeader = 8 + 25;
        Span<byte> chunk = stackalloc byte[4 + 4 + 9 + 4];
        BinaryPrimitives.WriteUInt32BigEndian(chunk, 9);
        "pHYs"u8.CopyTo(chunk[4..]);
        BinaryPrimitives.WriteUInt32BigEndian(chunk[8..], pixelsPerMeter);
        BinaryPrimitives.WriteUInt32BigEndian(chunk[12..], pixelsPerMeter);
        chunk[16] = 1; // the unit is the meter
        BinaryPrimitives.WriteUInt32BigEndian(chunk[17..], Checksum(chunk[4..17]));
        return [.. png[..signatureAndHeader], .. chunk, .. png[signatureAndHeader..]];
    }

    /// <summary>The CRC of a chunk's type and data (ISO/IEC 15948, 5.5 and annex D).</summary>
    private static uint Checksum(ReadOnlySpan<byte> bytes)
    {
        var checksum = uint.MaxValue;
        foreach (var value in bytes)
        {
            checksum ^= value;
            for (var bit = 0; bit < 8; bit++)
            {
                checksum = (checksum & 1) != 0 ? (checksum >> 1) ^ 0xEDB88320 : checksum >> 1;
            }
        }

        return ~checksum;
    }
}
