using System.Text;

namespace Drypeak.Operations.Tests;

/// <summary>A kind of input: how it is sent, and what it grows from.</summary>
/// <param name="Name">What it is.</param>
/// <param name="Method">The HTTP method.</param>
/// <param name="Address">Where it goes; for a GET the input is its query.</param>
/// <param name="MediaType">Of the body.</param>
/// <param name="Seeds">Whole inputs that are accepted.</param>
internal sealed record InputKind(string Name, string Method, string Address, string MediaType, IReadOnlyList<byte[]> Seeds);

/// <summary>Changes inputs at random, as a fuzzer does: cuts, repeats, splices, flips, and words that have hurt parsers before.</summary>
internal sealed class Mutator(int seed)
{
    private const int LargestInput = 20_000;

    private static readonly byte[][] Words = [.. new[]
    {
        "{", "}", "[", "]", ",", ":", "\"", "\\", "\\u0000", "\\ud800", "null", "true", "0", "-", "-0", "1e308", "1e-308", "1e999", "5e-324", "0.1", "99999999999999999999", "-1",
        "\n", "\r\n", "\r", "\t", " ", ";", "\"\"", "\"a\nb\"", "=1+1", "é", "\u2028", "\ufeff", "\0", "[g]", "[lb/ft3]", "1,85", "\"GROUP\"", "\"HEADING\"", "\"UNIT\"", "\"TYPE\"", "\"DATA\"",
        "\"specimens\":", "\"waterContent\":0,", "\"setAside\":\"x\",", "\"model\":\"cubic\"", "&", "=", "%", "%00", "%ff", "+", "d=", "width=", "width=99999", "scale=0.5", "theme=dark", "../", "//",
    }.Select(Encoding.UTF8.GetBytes), [0xff], [0xc0, 0x80], [0xed, 0xa0, 0x80]];

    private readonly Random _random = new(seed);

    /// <summary>One of several, by chance.</summary>
    public T OneOf<T>(IReadOnlyList<T> choices) => choices[_random.Next(choices.Count)];

    /// <summary>An input grown from a seed by one to six changes.</summary>
    public byte[] Mutate(InputKind kind)
    {
        var input = new List<byte>(OneOf(kind.Seeds));
        for (var changes = _random.Next(1, 7); changes > 0; changes--)
        {
            Change(input, kind);
        }

        return [.. input.Take(LargestInput)];
    }

    private void Change(List<byte> input, InputKind kind)
    {
        var at = _random.Next(input.Count + 1);
        var length = Math.Min(input.Count - at, _random.Next(1, 1 << _random.Next(1, 8)));
        switch (_random.Next(7))
        {
            case 0:
                input.RemoveRange(at, length);
                break;
            case 1:
                input.InsertRange(at, input.GetRange(at, length));
                break;
            case 2:
                input.InsertRange(at, OneOf(Words));
                break;
            case 3 when at < input.Count:
                input[at] ^= (byte)(1 << _random.Next(8));
                break;
            case 4 when at < input.Count:
                input[at] = (byte)_random.Next(256);
                break;
            case 5:
                var other = OneOf(kind.Seeds);
                var from = _random.Next(other.Length);
                input.InsertRange(at, other[from..Math.Min(other.Length, from + length)]);
                break;
            default:
                ChangeNumber(input, at);
                break;
        }
    }

    /// <summary>Puts another number in the place of the next one.</summary>
    private void ChangeNumber(List<byte> input, int from)
    {
        var begin = input.FindIndex(from, each => each is >= (byte)'0' and <= (byte)'9');
        if (begin < 0)
        {
            return;
        }

        var end = begin;
        while (end < input.Count && input[end] is (>= (byte)'0' and <= (byte)'9') or (byte)'.' or (byte)'e' or (byte)'E')
        {
            end++;
        }

        input.RemoveRange(begin, end - begin);
        input.InsertRange(begin, Encoding.ASCII.GetBytes(OneOf<string>(["0", "1e-9", "1e9", "99.999999999", "100", "1e300", "1e-300", "0.5", "-7", "12", "2147483648", "1e999"])));
    }
}
