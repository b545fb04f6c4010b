using System.Xml.Linq;
using Microsoft.AspNetCore.DataProtection.Repositories;

namespace Drypeak.Service.Hosting;

/// <summary>
/// Keeps the framework's protection keys in memory. Nothing here uses them, but the pages' packages bring them along, and
/// they would be written to the home folder at the start.
/// </summary>
internal sealed class MemoryKeys : IXmlRepository
{
    private readonly List<XElement> elements = [];

    public IReadOnlyCollection<XElement> GetAllElements()
    {
        lock (elements)
        {
            return [.. elements.Select(element => new XElement(element))];
        }
    }

    public void StoreElement(XElement element, string friendlyName)
    {
        lock (elements)
        {
            elements.Add(new XElement(element));
        }
    }
}
