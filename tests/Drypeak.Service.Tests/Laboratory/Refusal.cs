using System.Text.Json;
using Xunit;

namespace Drypeak.Service.Tests.Laboratory;

/// <summary>A problem as RFC 9457 has it, with what every problem of the service must have already checked.</summary>
public sealed record Refusal(int Status, string Type, string Title, string Detail, IReadOnlyList<Fault> Errors)
{
    /// <summary>Each fault as <c>/place code</c>.</summary>
    public string[] Faults => [.. Errors.Select(fault => $"{fault.Place} {fault.Code}")];

    public string Message => Assert.Single(Errors).Message;

    public static async Task<Refusal> Of(HttpResponseMessage response)
    {
        var text = await RunningService.TextOf(response);
        Assert.InRange((int)response.StatusCode, 400, 499);
        Assert.Equal("application/problem+json", response.Content.Headers.ContentType?.ToString());
        var problem = JsonElement.Parse(text);
        var refusal = new Refusal(
            problem.GetProperty("status").GetInt32(),
            problem.GetProperty("type").GetString()!,
            problem.GetProperty("title").GetString()!,
            problem.GetProperty("detail").GetString()!,
            [
                .. problem.GetProperty("errors").EnumerateArray().Select(error => new Fault(
                    error.GetProperty("pointer").GetString()!, error.GetProperty("code").GetString()!, error.GetProperty("message").GetString()!)),
            ]);
        Assert.Equal((int)response.StatusCode, refusal.Status);
        Assert.True(Uri.TryCreate(refusal.Type, UriKind.Absolute, out _), refusal.Type);
        Assert.NotEqual("", refusal.Title);
        Assert.NotEqual("", refusal.Detail);
        Assert.All(refusal.Errors, fault =>
        {
            Assert.True(fault.Place is "" || fault.Place[0] == '/', fault.Place);
            Assert.Matches("^[a-z0-9]+(-[a-z0-9]+)*$", fault.Code);
            Assert.Matches(@"^\S.*[.?]$", fault.Message);
        });
        return refusal;
    }
}
