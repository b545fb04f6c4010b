namespace Drypeak.Soil.Laboratory.Workings;

/// <summary>The few pieces of MathML Core that the formulas need. A piece that is not a tag is an identifier, a number or an operator by its first letter.</summary>
internal static class MathMl
{
    public static string Formula(params string[] pieces) =>
        $"<math xmlns=\"http://www.w3.org/1998/Math/MathML\"><mrow>{Joined(pieces)}</mrow></math>";

    public static string Row(params string[] pieces) => $"<mrow>{Joined(pieces)}</mrow>";

    public static string Sub(string symbol, string index) => $"<msub><mi>{symbol}</mi><mi mathvariant=\"normal\">{index}</mi></msub>";

    public static string Over(string numerator, string denominator) => $"<mfrac>{Piece(numerator)}{Piece(denominator)}</mfrac>";

    public static string Squared(string piece) => $"<msup>{Piece(piece)}<mn>2</mn></msup>";

    private static string Joined(string[] pieces) => string.Concat(pieces.Select(Piece));

    private static string Piece(string piece) => piece[0] switch
    {
        '<' => piece,
        >= '0' and <= '9' => $"<mn>{piece}</mn>",
        var letter when char.IsLetter(letter) => $"<mi>{piece}</mi>",
        _ => $"<mo>{piece}</mo>",
    };
}
