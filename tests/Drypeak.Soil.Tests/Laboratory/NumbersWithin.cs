using System.Collections;
using System.Reflection;

namespace Drypeak.Soil.Tests.Laboratory;

/// <summary>Every number in an object and in all that it holds, each with the path to it.</summary>
internal static class NumbersWithin
{
    public static IEnumerable<(string Path, double Value)> Of(object? held, string path = "") => held switch
    {
        null or string or Enum or bool or int => [],
        double number => [(path, number)],
        IEnumerable items => items.Cast<object?>().SelectMany((item, i) => Of(item, $"{path}[{i}]")),
        _ => held.GetType().GetProperties(BindingFlags.Public | BindingFlags.Instance)
            .Where(property => property.GetIndexParameters().Length == 0)
            .SelectMany(property => Of(property.GetValue(held), $"{path}.{property.Name}")),
    };
}
