using System.Globalization;
using FluentValidation;
using FluentValidation.Results;

namespace Drypeak.Service.Contracts;

/// <summary>
/// The rules that contracts are made of. Each message gives the limit and what was received, and each rule has a stable code.
/// A member that is absent passes: what must be there is a matter of form.
/// </summary>
internal static class RuleWords
{
    /// <summary>Beyond this no measured number of any unit lies; it keeps the arithmetic far from overflow.</summary>
    public const double Greatest = 1e9;

    /// <summary>Below this a quantity that must be over 0 is no measurement.</summary>
    public const double Least = 1e-9;

    public static IRuleBuilderOptions<T, double?> Positive<T>(this IRuleBuilder<T, double?> rule) =>
        rule.Must(value => value is null or >= Least).WithErrorCode("not-positive").WithMessage((_, value) => NotPositive(value))
            .Must(NotTooLarge).WithErrorCode("out-of-range").WithMessage((_, value) => TooLarge(value));

    /// <summary>The same for an item of a list.</summary>
    public static IRuleBuilderOptions<T, double> Positive<T>(this IRuleBuilder<T, double> rule) =>
        rule.Must(value => value >= Least).WithErrorCode("not-positive").WithMessage((_, value) => NotPositive(value))
            .Must(value => NotTooLarge(value)).WithErrorCode("out-of-range").WithMessage((_, value) => TooLarge(value));

    public static IRuleBuilderOptions<T, double?> NotNegative<T>(this IRuleBuilder<T, double?> rule) =>
        rule.Must(value => value is null or >= 0).WithErrorCode("negative").WithMessage((_, value) => Negative(value))
            .Must(NotTooLarge).WithErrorCode("out-of-range").WithMessage((_, value) => TooLarge(value));

    /// <summary>The same for an item of a list.</summary>
    public static IRuleBuilderOptions<T, double> NotNegative<T>(this IRuleBuilder<T, double> rule) =>
        rule.Must(value => value >= 0).WithErrorCode("negative").WithMessage((_, value) => Negative(value))
            .Must(value => NotTooLarge(value)).WithErrorCode("out-of-range").WithMessage((_, value) => TooLarge(value));

    private static bool NotTooLarge(double? value) => !(value > Greatest);

    private static string NotPositive(double? value) => value > 0
        ? $"It must be at least {Text(Least)}; {Text(value)} was received. Check the value and its unit."
        : $"It must be greater than 0; {Text(value)} was received.";

    private static string Negative(double? value) => $"It must not be negative; {Text(value)} was received.";

    private static string TooLarge(double? value) => $"It must not be over {Text(Greatest)}; {Text(value)} was received. Check the value and its unit.";

    public static IRuleBuilderOptions<T, double?> Within<T>(this IRuleBuilder<T, double?> rule, double least, double greatest, string unit = "") =>
        rule.Must(value => value is null || (value >= least && value <= greatest))
            .WithErrorCode("out-of-range")
            .WithMessage((_, value) => $"It must lie between {Text(least)} and {Text(greatest)}{unit}; {Text(value)} was received.");

    public static IRuleBuilderOptions<T, double?> PercentBelow100<T>(this IRuleBuilder<T, double?> rule) =>
        rule.Must(value => value is null or (>= 0 and < 100))
            .WithErrorCode("out-of-range")
            .WithMessage((_, value) => $"It must lie from 0 to below 100 %; {Text(value)} was received.");

    public static IRuleBuilderOptions<T, string?> OneOf<T>(this IRuleBuilder<T, string?> rule, IEnumerable<string> names, string code)
    {
        var known = names.ToHashSet(StringComparer.Ordinal);
        return rule.Must(value => value is null || known.Contains(value))
            .WithErrorCode(code)
            .WithMessage((_, value) => $"It must be one of {string.Join(", ", known)}; \"{Shortened(value)}\" was received.");
    }

    public static IRuleBuilderOptions<T, string?> AtMost<T>(this IRuleBuilder<T, string?> rule, int characters) =>
        rule.Must(value => value is null || value.Length <= characters)
            .WithErrorCode("too-long")
            .WithMessage((_, value) => $"It may have up to {characters} characters; it has {value!.Length}. Shorten it.");

    public static IRuleBuilderOptions<T, string?> NotBlank<T>(this IRuleBuilder<T, string?> rule, string what, string advice = "Write it, or leave the member out.") =>
        rule.Must(value => value is null || !string.IsNullOrWhiteSpace(value))
            .WithErrorCode("blank")
            .WithMessage($"{what} must not be blank. {advice}");

    public static IRuleBuilderOptions<T, IReadOnlyList<TItem>?> Counted<T, TItem>(this IRuleBuilder<T, IReadOnlyList<TItem>?> rule, int greatest) =>
        rule.Must(list => list is null or { Count: > 0 })
            .WithErrorCode("empty-list")
            .WithMessage("The list must not be empty. Give one item or more.")
            .Must(list => list is null || list.Count <= greatest)
            .WithErrorCode("too-many")
            .WithMessage((_, list) => $"The list may have up to {greatest} items; it has {list!.Count}.");

    /// <summary>A member that the form must bring. It stands as a rule too, so that a null in its place is looked into.</summary>
    public static IRuleBuilderOptions<T, TValue> Needed<T, TValue>(this IRuleBuilder<T, TValue> rule) =>
        rule.NotNull().WithErrorCode("missing-member").WithMessage("It is missing. Give it.");

    /// <summary>Reports a broken rule from a custom check at a path such as <c>Specimens[2].Label</c>.</summary>
    public static void Fail<T>(this ValidationContext<T> context, string path, string code, string message) =>
        context.AddFailure(new ValidationFailure(path, message) { ErrorCode = code });

    /// <summary>The broken rules of each request in a list, each at its place in the list.</summary>
    public static IEnumerable<Fault> Within<TRequest>(this IReadOnlyList<TRequest> requests, string place, Func<TRequest, IReadOnlyList<Fault>> check) =>
        requests.SelectMany((request, i) => request is null
            ? [new Fault($"{place}/{i}", "missing-member", "It is missing. Give a whole request.")]
            : check(request).Select(fault => fault with { Place = $"{place}/{i}{fault.Place}" }));

    public static string Text(double? value) => value?.ToString("R", CultureInfo.InvariantCulture) ?? "nothing";

    private static string Shortened(string? text) => text is { Length: > 40 } ? text[..40] + "…" : text ?? "";
}
