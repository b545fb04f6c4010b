using System.Collections.Frozen;
using System.IO.Compression;
using System.Security.Cryptography;
using System.Text;
using Drypeak.Figures;
using Drypeak.Service.Hosting;

namespace Drypeak.Service.Pages;

/// <summary>
/// What the pages load: styles, script, mark and font, from the program itself. Each name holds a digest of the bytes, so that a browser
/// may keep them for ever and never has old ones.
/// </summary>
internal static class PageFiles
{
    private const string Folder = "/assets/";
    private const int DigestLetters = 12;

    private static readonly Asset Regular = Asset.Of("text-regular", ".ttf", "font/ttf", EmbeddedFont.Regular.File);
    private static readonly Asset SemiBold = Asset.Of("text-semibold", ".ttf", "font/ttf", EmbeddedFont.SemiBold.File);
    private static readonly Asset PageStyles = Asset.Of("pages", ".css", "text/css; charset=utf-8", Encoding.UTF8.GetBytes(WithFonts(Resource("pages.css"))));
    private static readonly Asset PageScript = Asset.Of("pages", ".js", "text/javascript; charset=utf-8", Encoding.UTF8.GetBytes(Resource("pages.js")));
    private static readonly Asset PageMark = Asset.Of("mark", ".svg", "image/svg+xml", Encoding.UTF8.GetBytes(Resource("mark.svg")));

    private static readonly FrozenDictionary<string, Asset> ByName =
        new[] { Regular, SemiBold, PageStyles, PageScript, PageMark }.ToFrozenDictionary(asset => asset.Name, StringComparer.Ordinal);

    /// <summary>Address of the styles.</summary>
    public static string Styles => Folder + PageStyles.Name;

    /// <summary>Address of the script. Nothing depends on it.</summary>
    public static string Script => Folder + PageScript.Name;

    /// <summary>Address of the mark in a browser's tab.</summary>
    public static string Mark => Folder + PageMark.Name;

    /// <summary>The font that a page's text begins with.</summary>
    public static string Font => Folder + Regular.Name;

    public static void Map(IEndpointRouteBuilder app) =>
        app.MapMethods(Folder + "{name}", [HttpMethods.Get, HttpMethods.Head], (HttpRequest request, string name) => Find(request, name)).ExcludeFromDescription();

    private static IResult Find(HttpRequest request, string name)
    {
        if (!ByName.TryGetValue(name, out var asset))
        {
            return Results.StatusCode(StatusCodes.Status404NotFound);
        }

        var compressed = request.Headers.AcceptEncoding.ToString().Contains("br", StringComparison.Ordinal);
        if (compressed)
        {
            request.HttpContext.Response.Headers.ContentEncoding = "br";
        }

        return new CachedBytes(compressed ? asset.Compressed.Value : asset.Bytes, asset.MediaType) { Vary = "Accept-Encoding" };
    }

    private static string WithFonts(string styles) =>
        styles.Replace("text-regular.ttf", Regular.Name, StringComparison.Ordinal).Replace("text-semibold.ttf", SemiBold.Name, StringComparison.Ordinal);

    private static string Resource(string name)
    {
        using var stream = typeof(PageFiles).Assembly.GetManifestResourceStream("Pages/" + name)
            ?? throw new InvalidOperationException($"The resource {name} is missing.");
        using var reader = new StreamReader(stream, Encoding.UTF8);
        return reader.ReadToEnd();
    }

    private sealed record Asset(string Name, string MediaType, ReadOnlyMemory<byte> Bytes, Lazy<byte[]> Compressed)
    {
        public static Asset Of(string stem, string suffix, string mediaType, ReadOnlyMemory<byte> bytes) => new(
            $"{stem}.{Convert.ToHexStringLower(SHA256.HashData(bytes.Span))[..DigestLetters]}{suffix}", mediaType, bytes, new Lazy<byte[]>(() => Compress(bytes)));

        private static byte[] Compress(ReadOnlyMemory<byte> bytes)
        {
            using var packed = new MemoryStream();
            using (var brotli = new BrotliStream(packed, CompressionLevel.Optimal))
            {
                brotli.Write(bytes.Span);
            }

            return packed.ToArray();
        }
    }
}
