namespace Drypeak.Soil.Earthwork;

/// <summary>
/// A generator of random numbers that is written out here, so that a seed gives the same locations in every process, on every machine and in
/// every version: SplitMix64 (Steele, Lea and Flood 2014, doi:10.1145/2660193.2660195; constants from memory, held by test vectors).
/// Not for several threads, and not for secrets.
/// </summary>
/// <param name="seed">Any; the same seed gives the same numbers.</param>
public sealed class SplitMix64(ulong seed)
{
    private const double UnitsOf53Bits = 1.0 / (1UL << 53);

    private ulong _state = seed;

    /// <summary>The next 64 bits.</summary>
    public ulong NextBits()
    {
        _state += 0x9E3779B97F4A7C15;
        var mixed = (_state ^ (_state >> 30)) * 0xBF58476D1CE4E5B9;
        mixed = (mixed ^ (mixed >> 27)) * 0x94D049BB133111EB;
        return mixed ^ (mixed >> 31);
    }

    /// <summary>The next number, uniform from 0 to below 1, of the upper 53 bits.</summary>
    public double NextFraction() => (NextBits() >> 11) * UnitsOf53Bits;
}
