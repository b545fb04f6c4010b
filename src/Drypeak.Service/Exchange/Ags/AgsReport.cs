using Drypeak.Service.Exchange.Files;

namespace Drypeak.Service.Exchange.Ags;

/// <summary>
/// Collects what is wrong with a file. A broken rule refuses the file where the jobs need the group that breaks it, and is a
/// finding where they do not: such lines are carried through as they are.
/// </summary>
internal sealed class AgsReport
{
    private static readonly string[] ReadForTests = ["CMPG", "CMPT", "IDEN"];

    /// <summary>Groups that the tests hang on; their lines must be whole, though little of what they say is needed.</summary>
    private static readonly string[] AboveThem = ["PROJ", "TRAN", "LOCA", "SAMP"];

    private readonly OrderedDictionary<FileFault, bool> _faults = [];
    private readonly List<FileFinding> _findings = [];

    /// <summary>What refuses the file; empty where it can be computed.</summary>
    public IReadOnlyList<FileFault> Faults => _faults.Keys;

    /// <summary>In the order of the file.</summary>
    public IReadOnlyList<FileFinding> Findings => [.. _findings.OrderBy(finding => finding.Line)];

    public static bool IsReadForTests(string group) => ReadForTests.Contains(group);

    /// <summary>A line that is not of the standard's form: nothing of it can be read with certainty.</summary>
    public void Broken(int line, string group, string code, string message)
    {
        if (group.Length == 0 || IsReadForTests(group) || AboveThem.Contains(group))
        {
            Refuse(line, group, code, message);
        }
        else
        {
            Note(line, code, Severity.Warning, InGroup(group, message));
        }
    }

    /// <summary>A line in form whose content breaks a rule.</summary>
    public void Wrong(int line, string group, string code, string message)
    {
        if (IsReadForTests(group))
        {
            Refuse(line, group, code, message);
        }
        else
        {
            Note(line, code, Severity.Warning, InGroup(group, message));
        }
    }

    /// <summary>Refuses the file; the same fault found again, as a unit's is by each row, counts once.</summary>
    public void Refuse(int line, string group, string code, string message) =>
        _faults.TryAdd(new FileFault { Line = line, Group = group, Code = code, Message = message }, true);

    public void Note(int line, string code, Severity severity, string message) => _findings.Add(FileFinding.Of(code, severity, line, message));

    private static string InGroup(string group, string message) => $"{group}: {message}";
}
