using System.Buffers.Binary;
using System.Globalization;
using System.Xml.Linq;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Charts;

/// <summary>What a chart shows, and in which size.</summary>
public sealed class ChartPictureTests(RunningService service)
{
    private static readonly XNamespace Namespace = "http://www.w3.org/2000/svg";

    [Fact]
    public async Task Each_specimens_mark_stands_for_the_answers_numbers_and_one_set_aside_is_hollow()
    {
        var body = Body.With("/specimens/1/setAside", "\"mold not full\"");
        var specimens = (await service.AnswerAsync(body)).At("/specimens").EnumerateArray().ToList();
        var marks = (await Draw(body)).Descendants().Where(element => element.Attribute("data-x") is not null).ToList();
        Assert.Equal(
            specimens.Select(specimen => (specimen.Number("/waterContent"), specimen.Number("/dryDensity"))).Order(),
            marks.Select(mark => (Number(mark, "data-x"), Number(mark, "data-y"))).Order());
        Assert.All(marks, mark => Assert.Equal(Number(mark, "data-x") == specimens[1].Number("/waterContent"), mark.Attribute("fill")!.Value == "none"));
    }

    [Theory]
    [InlineData("Mg/m3", "Mg/m³", "1.86")]
    [InlineData("kg/m3", "kg/m³", "1860")]
    [InlineData("lb/ft3", "lb/ft³", null)]
    [InlineData("kN/m3", "kN/m³", null)]
    public async Task Both_reported_numbers_and_the_units_of_the_axes_are_drawn(string unit, string symbol, string? maximum)
    {
        var body = Body.With("/units/density", $"\"{unit}\"");
        var reported = (await service.AnswerAsync(body)).At("/optimum/reported");
        var texts = (await Draw(body)).Descendants(Namespace + "text").Select(text => text.Value).ToList();
        Assert.Contains(reported.Text("/maximumDryDensity")!.Split(' ')[0], texts);
        Assert.Contains(reported.Text("/waterContent")!.Split(' ')[0], texts);
        Assert.Contains(texts, text => text.EndsWith($"({symbol})", StringComparison.Ordinal));
        Assert.Contains(texts, text => text.EndsWith("(%)", StringComparison.Ordinal));
        Assert.True(maximum is null || texts.Contains(maximum));
    }

    [Fact]
    public async Task The_picture_has_a_title_a_description_real_text_and_no_style_or_outside_reference()
    {
        var svg = await Draw(Body.With(("/reference", "\"<b>\\\"7\\\" & 'so' on]]>\""), ("/lines", """{"saturation":[90],"airVoids":[5]}""")));
        Assert.NotEqual("", svg.Root!.Element(Namespace + "title")!.Value);
        Assert.Contains("5 specimens", svg.Root.Element(Namespace + "desc")!.Value, StringComparison.Ordinal);
        Assert.Contains(svg.Descendants(Namespace + "text"), text => text.Value.Contains("<b>\"7\" & 'so' on]]>", StringComparison.Ordinal));
        Assert.DoesNotContain(svg.Descendants(), element => element.Name.LocalName is "style" or "script" or "image" or "use" or "foreignObject");
        Assert.DoesNotContain(svg.Descendants().Attributes(), attribute => attribute.Name.LocalName is "style" or "href" || attribute.Name.LocalName.StartsWith("on", StringComparison.Ordinal));
        Assert.All(svg.Descendants(Namespace + "text"), text => Assert.True(Number(text, "font-size") >= 9));
    }

    [Fact]
    public async Task Lines_and_an_adopted_and_a_corrected_peak_are_drawn()
    {
        var texts = (await Draw(Body.With(
            ("/lines", """{"saturation":[90],"airVoids":[5]}"""),
            ("/oversize", """{"percent":20,"specificGravity":2.65}"""),
            ("/curve", """{"adopted":{"waterContent":14.5,"maximumDryDensity":1.87,"reason":"by hand"}}""")))).Descendants(Namespace + "text").Select(text => text.Value).ToList();
        Assert.Contains("zero air voids", texts);
        Assert.Contains("saturation 90 %", texts);
        Assert.Contains("air voids 5 %", texts);
        Assert.Contains("14.5", texts);
        Assert.Contains("1.87", texts);
        Assert.Contains(texts, text => text.Contains("corrected", StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("", 960, 640)]
    [InlineData("&width=240", 240, 640)]
    [InlineData("&height=2400", 960, 2400)]
    [InlineData("&width=1200&height=300", 1200, 300)]
    public async Task A_picture_has_the_size_asked_for(string query, int width, int height)
    {
        var data = ChartLink.Data(await ChartLink.OfSoundTest(service));
        var svg = XDocument.Parse(System.Text.Encoding.UTF8.GetString(await service.BytesAsync($"{ChartLink.Svg}?d={data}{query}")));
        Assert.Equal((width, height), ((int)Number(svg.Root!, "width"), (int)Number(svg.Root!, "height")));
        Assert.Equal((width, height), SizeOfPng(await service.BytesAsync($"{ChartLink.Png}?d={data}{query}")));

        // A px is 1/96 inch and a point 1/72: a page of PDF has three quarters of the number.
        var pdf = System.Text.Encoding.Latin1.GetString(await service.BytesAsync($"{ChartLink.Pdf}?d={data}{query}"));
        Assert.Contains(string.Create(CultureInfo.InvariantCulture, $"/MediaBox [0 0 {width * 0.75} {height * 0.75}]"), pdf, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("0.5", 480, 320)]
    [InlineData("1", 960, 640)]
    [InlineData("2.5", 2400, 1600)]
    [InlineData("4", 3840, 2560)]
    public async Task A_PNG_may_be_scaled(string scale, int width, int height) =>
        Assert.Equal((width, height), SizeOfPng(await service.BytesAsync($"{await ChartLink.OfSoundTest(service, "png")}&scale={scale}")));

    [Theory]
    [InlineData("svg", "width=239", "/width out-of-range")]
    [InlineData("svg", "width=2401", "/width out-of-range")]
    [InlineData("svg", "height=239", "/height out-of-range")]
    [InlineData("pdf", "height=2401", "/height out-of-range")]
    [InlineData("png", "width=abc", "/width out-of-range")]
    [InlineData("png", "width=", "/width out-of-range")]
    [InlineData("png", "width=500.5", "/width out-of-range")]
    [InlineData("png", "width=-500", "/width out-of-range")]
    [InlineData("png", "width=99999999999999999999", "/width out-of-range")]
    [InlineData("png", "scale=0.49", "/scale out-of-range")]
    [InlineData("png", "scale=4.1", "/scale out-of-range")]
    [InlineData("png", "scale=NaN", "/scale out-of-range")]
    [InlineData("png", "width=2400&height=2400&scale=4", "/scale out-of-range")]
    [InlineData("png", "scale=2&scale=2", "/scale repeated-parameter")]
    [InlineData("svg", "width=500&width=500", "/width repeated-parameter")]
    [InlineData("svg", "scale=2", "/scale unknown-parameter")]
    [InlineData("pdf", "scale=2", "/scale unknown-parameter")]
    [InlineData("svg", "theme=sepia", "/theme unknown-choice")]
    [InlineData("pdf", "theme=Dark", "/theme unknown-choice")]
    [InlineData("png", "theme=", "/theme unknown-choice")]
    [InlineData("svg", "theme=dark&theme=dark", "/theme repeated-parameter")]
    [InlineData("png", "locale=de-DE", "/locale unknown-choice")]
    [InlineData("svg", "locale=it&lines=saturation,airVoids", "/locale unknown-choice,/lines unknown-choice")]
    [InlineData("svg", "lines=saturation,saturation", "/lines unknown-choice")]
    [InlineData("svg", "lines=", "/lines unknown-choice")]
    [InlineData("pdf", "title=%20", "/title out-of-range")]
    [InlineData("svg", "secondUnit=t/m3", "/secondUnit unknown-choice")]
    [InlineData("svg", "colour=red", "/colour unknown-parameter")]
    [InlineData("svg", "Width=500", "/Width unknown-parameter")]
    [InlineData("png", "width=1&height=1&scale=9&zoom=2", "/width out-of-range,/height out-of-range,/scale out-of-range,/zoom unknown-parameter")]
    public async Task A_parameter_that_is_unknown_repeated_or_out_of_range_is_refused_by_link_and_by_post(string format, string query, string expected)
    {
        using var linked = await service.GetAsync($"{await ChartLink.OfSoundTest(service, format)}&{query}");
        using var posted = await service.PostAsync(Body.Sound, MediaTypes[format], $"{RunningService.MoistureDensity}?{query}");
        foreach (var response in new[] { linked, posted })
        {
            var refusal = await Refusal.Of(response);
            Assert.Equal(400, refusal.Status);
            Assert.Equal(expected.Split(',').Order(), refusal.Faults.Order());
        }
    }

    /// <summary>By hand: 1.96 · 0.3 % and, of 1 % of the mold's volume, 1.96 · 1 % of each dry density.</summary>
    [Fact]
    public async Task Specimens_have_error_bars_where_the_request_gives_uncertainties_and_none_elsewhere()
    {
        Assert.DoesNotContain((await Draw(Body.Sound)).Descendants(), element => (string?)element.Attribute("class") == "error-bars");
        var answer = await service.AnswerAsync(Body.With("/uncertainty", """{"waterContent":0.3,"volume":9.44}"""));
        Assert.Single((await Draw(Body.With("/uncertainty", """{"waterContent":0.3,"volume":9.44}"""))).Descendants(), element => (string?)element.Attribute("class") == "error-bars");
        var chart = ChartLink.Unpack(ChartLink.Data(answer.Text("/links/svg")!));
        foreach (var specimen in chart["specimens"]!.AsArray())
        {
            var (w, density) = ((double)specimen!["waterContent"]! / 100, (double)specimen["dryDensity"]!);
            Assert.Equal(1.96 * 0.3, (double)specimen["waterContentPlusMinus"]!, 0.001);
            Assert.Equal(1.96 * density * Math.Sqrt(Math.Pow(0.01, 2) + Math.Pow(0.003 / (1 + w), 2)), (double)specimen["dryDensityPlusMinus"]!, 0.0005);
        }
    }

    [Fact]
    public async Task A_title_a_locale_and_kinds_of_lines_are_drawn_as_the_address_asks()
    {
        var link = (await service.AnswerAsync(Body.With("/lines", """{"saturation":[90],"airVoids":[5]}"""))).Text("/links/svg")!;
        var svg = XDocument.Parse(System.Text.Encoding.UTF8.GetString(await service.BytesAsync(link + "&locale=de&lines=saturation&title=Entnahme%207%20%26%20%3C8%3E")));
        var texts = svg.Descendants(Namespace + "text").Select(text => text.Value).ToList();
        Assert.Contains("Entnahme 7 & <8>", texts);
        Assert.Contains("Wassergehalt (%)", texts);
        Assert.Contains("1,86", texts);
        Assert.Contains("Sättigungsgrad 90 %", texts);
        Assert.DoesNotContain(svg.Descendants(), element => (string?)element.Attribute("class") is "zero-air-voids" or "air-voids");
    }

    [Fact]
    public async Task A_second_unit_has_an_axis_of_its_own()
    {
        var svg = XDocument.Parse(System.Text.Encoding.UTF8.GetString(await service.BytesAsync(await ChartLink.OfSoundTest(service) + "&secondUnit=lb%2Fft3")));
        Assert.Contains("lb/ft³", svg.Descendants(Namespace + "text").Select(text => text.Value));
    }

    [Fact]
    public async Task A_title_has_up_to_200_characters()
    {
        var link = await ChartLink.OfSoundTest(service);
        using var longest = await service.GetAsync($"{link}&title={new string('m', 200)}");
        Assert.Equal(200, (int)longest.StatusCode);
        using var longer = await service.GetAsync($"{link}&title={new string('m', 201)}");
        Assert.Equal(["/title out-of-range"], (await Refusal.Of(longer)).Faults);
    }

    [Theory]
    [InlineData("light", "#FCFBF8")]
    [InlineData("dark", "#161513")]
    [InlineData("print", "#FFFFFF")]
    public async Task A_theme_is_drawn_in_its_colors_by_link_and_by_post_in_the_same_bytes(string theme, string ground)
    {
        var linked = await service.BytesAsync($"{await ChartLink.OfSoundTest(service)}&theme={theme}");
        using var posted = await service.PostAsync(Body.Sound, "image/svg+xml", $"{RunningService.MoistureDensity}?theme={theme}");
        Assert.Equal(linked, await posted.Content.ReadAsByteArrayAsync(TestContext.Current.CancellationToken));
        var paper = XDocument.Parse(System.Text.Encoding.UTF8.GetString(linked)).Root!.Element(Namespace + "rect")!;
        Assert.Equal(ground, (string?)paper.Attribute("fill"));
    }

    [Fact]
    public async Task A_post_may_ask_for_a_size_too_but_only_of_a_picture()
    {
        using var picture = await service.PostAsync(Body.Sound, "image/png", $"{RunningService.MoistureDensity}?width=480&height=320&scale=2");
        Assert.Equal((960, 640), SizeOfPng(await picture.Content.ReadAsByteArrayAsync(TestContext.Current.CancellationToken)));
        using var json = await service.PostAsync(Body.Sound, "application/json", $"{RunningService.MoistureDensity}?width=480");
        Assert.Equal(["/width unknown-parameter"], (await Refusal.Of(json)).Faults);
    }

    private static readonly Dictionary<string, string> MediaTypes = new() { ["svg"] = "image/svg+xml", ["png"] = "image/png", ["pdf"] = "application/pdf" };

    private async Task<XDocument> Draw(string body)
    {
        using var response = await service.PostAsync(body, "image/svg+xml");
        return XDocument.Parse(await RunningService.TextOf(response));
    }

    private static double Number(XElement element, string attribute) => double.Parse(element.Attribute(attribute)!.Value, CultureInfo.InvariantCulture);

    /// <summary>The first chunk of a PNG is IHDR: width and height follow its length and name (ISO/IEC 15948, 11.2.2).</summary>
    private static (int Width, int Height) SizeOfPng(byte[] png) =>
        (BinaryPrimitives.ReadInt32BigEndian(png.AsSpan(16)), BinaryPrimitives.ReadInt32BigEndian(png.AsSpan(20)));
}
