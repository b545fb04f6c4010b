namespace Drypeak.Service.Hosting;

/// <summary>Finds the name that was probably meant.</summary>
internal static class NearestName
{
    /// <summary>
    /// The known name that takes the fewest edits (insert, delete, replace, swap neighbors; letter case is free), or null
    /// where even that takes more than a third of the name's letters.
    /// </summary>
    public static string? Of(string name, IEnumerable<string> known)
    {
        var nearest = known
            .Select(candidate => (Name: candidate, Edits: Edits(name, candidate)))
            .Where(candidate => 3 * candidate.Edits <= candidate.Name.Length)
            .OrderBy(candidate => candidate.Edits)
            .FirstOrDefault();
        return nearest.Name;
    }

    /// <summary>The optimal string alignment distance; names of very different length are simply far.</summary>
    private static int Edits(string a, string b)
    {
        if (Math.Abs(a.Length - b.Length) > b.Length / 3)
        {
            return int.MaxValue / 3;
        }

        var distance = new int[a.Length + 1, b.Length + 1];
        for (var i = 0; i <= a.Length; i++)
        {
            for (var j = 0; j <= b.Length; j++)
            {
                distance[i, j] = i == 0 ? j : j == 0 ? i : Math.Min(
                    Math.Min(distance[i - 1, j], distance[i, j - 1]) + 1,
                    distance[i - 1, j - 1] + (Same(a[i - 1], b[j - 1]) ? 0 : 1));
                if (i > 1 && j > 1 && Same(a[i - 1], b[j - 2]) && Same(a[i - 2], b[j - 1]))
                {
                    distance[i, j] = Math.Min(distance[i, j], distance[i - 2, j - 2] + 1);
                }
            }
        }

        return distance[a.Length, b.Length];
    }

    private static bool Same(char a, char b) => char.ToUpperInvariant(a) == char.ToUpperInvariant(b);
}
