using System.Text.Json;

namespace Drypeak.Service.Hosting;

/// <summary>Puts faults in the order in which a reader of the document meets their places.</summary>
internal static class DocumentOrder
{
    /// <summary>
    /// What stands in no place of the document (a missing member) comes after all that stands in the object it is missing from.
    /// Faults of one place keep the order they came in.
    /// </summary>
    public static IReadOnlyList<Fault> Sort(IReadOnlyList<Fault> faults, JsonElement document)
    {
        var order = new Numbering(faults);
        order.Visit(document, Places.Whole);
        return [.. faults.OrderBy(fault => order.Of(fault.Place))];
    }

    /// <summary>Numbers the wanted places of a document, each at its beginning and at its end.</summary>
    private sealed class Numbering
    {
        private readonly HashSet<string> wanted = [];
        private readonly Dictionary<string, (int Begin, int End)> numbers = [];
        private int next;

        public Numbering(IEnumerable<Fault> faults)
        {
            foreach (var fault in faults)
            {
                var place = fault.Place;
                while (place is not null && wanted.Add(place))
                {
                    place = Places.Parent(place);
                }
            }
        }

        public void Visit(JsonElement value, string place)
        {
            if (!wanted.Contains(place))
            {
                return;
            }

            var begin = next++;
            if (value.ValueKind == JsonValueKind.Object)
            {
                foreach (var member in value.EnumerateObject())
                {
                    Visit(member.Value, Places.Member(place, member.Name));
                }
            }
            else if (value.ValueKind == JsonValueKind.Array)
            {
                foreach (var (index, item) in value.EnumerateArray().Index())
                {
                    Visit(item, Places.Item(place, index));
                }
            }

            numbers.TryAdd(place, (begin, next++));
        }

        public int Of(string place)
        {
            if (numbers.TryGetValue(place, out var number))
            {
                return number.Begin;
            }

            var ancestor = Places.Parent(place);
            while (ancestor is not null && !numbers.ContainsKey(ancestor))
            {
                ancestor = Places.Parent(ancestor);
            }

            return ancestor is null ? int.MaxValue : numbers[ancestor].End;
        }
    }
}
