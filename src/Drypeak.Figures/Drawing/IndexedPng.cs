using System.Buffers.Binary;
using System.IO.Compression;

namespace Drypeak.Figures.Drawing;

/// <summary>
/// The PNG format, as far as a picture with a table of colors needs it: ISO/IEC 15948 (from memory), chunks IHDR, sRGB, pHYs, PLTE, IDAT, IEND.
/// </summary>
internal static class IndexedPng
{
    private const double MetersPerInch = 0.0254;

    private static readonly uint[] Remainders = [.. Enumerable.Range(0, 256).Select(Remainder)];

    /// <summary>A PNG file.</summary>
    /// <param name="pixels">Row by row; red in the lowest byte, then green, then blue.</param>
    /// <param name="width">Pixels in a row.</param>
    /// <param name="colors">The table of colors.</param>
    /// <param name="pixelsPerInch">Physical resolution.</param>
    public static byte[] Write(ReadOnlySpan<uint> pixels, int width, ColorTable colors, double pixelsPerInch)
    {
        using var png = new MemoryStream();
        png.Write([0x89, (byte)'P', (byte)'N', (byte)'G', (byte)'\r', (byte)'\n', 0x1A, (byte)'\n']);
        Chunk(png, "IHDR"u8, [.. BigEndian(width), .. BigEndian(pixels.Length / width), 8, 3, 0, 0, 0]); // 8 bits, indexed; the one compression and filter method, not interlaced
        Chunk(png, "sRGB"u8, [0]); // perceptual
        var perMeter = BigEndian((int)Math.Round(pixelsPerInch / MetersPerInch));
        Chunk(png, "pHYs"u8, [.. perMeter, .. perMeter, 1]); // the unit is the meter
        Chunk(png, "PLTE"u8, [.. colors.Entries.SelectMany(color => new[] { color.Red, color.Green, color.Blue })]);
        Chunk(png, "IDAT"u8, Compressed(pixels, width, colors));
        Chunk(png, "IEND"u8, []);
        return png.ToArray();
    }

    /// <summary>Each row behind a filter byte of 0: indices have no gradients for which a filter would help.</summary>
    private static ReadOnlySpan<byte> Compressed(ReadOnlySpan<uint> pixels, int width, ColorTable colors)
    {
        var compressed = new MemoryStream();
        using (var zlib = new ZLibStream(compressed, CompressionLevel.Optimal, leaveOpen: true))
        {
            var row = new byte[1 + width];
            var (last, index) = (pixels[0], colors.NearestTo(pixels[0]));
            for (var start = 0; start < pixels.Length; start += width)
            {
                for (var x = 0; x < width; x++)
                {
                    var pixel = pixels[start + x];
                    if (pixel != last)
                    {
                        (last, index) = (pixel, colors.NearestTo(pixel));
                    }

                    row[1 + x] = index;
                }

                zlib.Write(row);
            }
        }

        return compressed.GetBuffer().AsSpan(0, (int)compressed.Length);
    }

    private static void Chunk(MemoryStream png, ReadOnlySpan<byte> type, ReadOnlySpan<byte> data)
    {
        png.Write(BigEndian(data.Length));
        png.Write(type);
        png.Write(data);
        png.Write(BigEndian((int)~Checked(Checked(uint.MaxValue, type), data)));
    }

    private static uint Checked(uint checksum, ReadOnlySpan<byte> bytes)
    {
        foreach (var value in bytes)
        {
            checksum = Remainders[(byte)(checksum ^ value)] ^ (checksum >> 8);
        }

        return checksum;
    }

    /// <summary>One byte's share of the CRC of 32 bits that PNG's chunks carry (polynomial 0xEDB88320, reflected).</summary>
    private static uint Remainder(int value)
    {
        var remainder = (uint)value;
        for (var bit = 0; bit < 8; bit++)
        {
            remainder = (remainder & 1) != 0 ? (remainder >> 1) ^ 0xEDB88320 : remainder >> 1;
        }

        return remainder;
    }

    private static byte[] BigEndian(int value)
    {
        var bytes = new byte[4];
        BinaryPrimitives.WriteInt32BigEndian(bytes, value);
        return bytes;
    }
}
