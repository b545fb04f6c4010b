using System.Diagnostics.CodeAnalysis;

namespace Drypeak.Service.Hosting;

/// <summary>What reading a request gives: the value, or the problem that says why there is none.</summary>
/// <typeparam name="T">The contract type.</typeparam>
public sealed class Read<T>
    where T : class
{
    private Read(T? value, Problem? problem) => (Value, Problem) = (value, problem);

    /// <summary>Whether there is a value that keeps the contract and its rules.</summary>
    [MemberNotNullWhen(true, nameof(Value))]
    [MemberNotNullWhen(false, nameof(Problem))]
    public bool Succeeded => Value is not null;

    /// <summary>The value, or null where there is a problem.</summary>
    public T? Value { get; }

    /// <summary>The problem, or null where there is a value.</summary>
    public Problem? Problem { get; }

    public static implicit operator Read<T>(T value) => new(value, null);

    public static implicit operator Read<T>(Problem problem) => new(null, problem);
}
