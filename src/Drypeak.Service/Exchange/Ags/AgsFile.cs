namespace Drypeak.Service.Exchange.Ags;

/// <summary>A DATA line of a group.</summary>
/// <param name="Line">From 1.</param>
/// <param name="Items">Its items under the group's headings, as many as these.</param>
internal sealed record AgsRow(int Line, IReadOnlyList<AgsItem> Items);

/// <summary>A group of a file.</summary>
internal sealed class AgsGroup(string name, int line)
{
    public string Name { get; } = name;

    /// <summary>Of its GROUP line.</summary>
    public int Line { get; } = line;

    /// <summary>Of its HEADING line; that of the group where there is none.</summary>
    public int HeadingLine { get; set; } = line;

    public int UnitLine { get; set; } = line;

    public int TypeLine { get; set; } = line;

    public IReadOnlyList<string> Headings { get; set; } = [];

    /// <summary>The unit of each heading; empty texts where the file has no UNIT line.</summary>
    public IReadOnlyList<string> Units { get; set; } = [];

    public IReadOnlyList<string> Types { get; set; } = [];

    public List<AgsRow> Rows { get; } = [];

    public AgsGroupDefinition? Definition => AgsDictionary.Find(Name);

    public int IndexOf(string heading)
    {
        for (var i = 0; i < Headings.Count; i++)
        {
            if (Headings[i] == heading)
            {
                return i;
            }
        }

        return -1;
    }

    /// <summary>The text of a row under a heading; empty where the group has no such heading.</summary>
    public string Text(AgsRow row, string heading) => IndexOf(heading) is >= 0 and var i ? row.Items[i].Text.Trim() : "";

    public string UnitOf(string heading) => IndexOf(heading) is >= 0 and var i && i < Units.Count ? Units[i].Trim() : "";

    public string TypeOf(string heading) => IndexOf(heading) is >= 0 and var i && i < Types.Count ? Types[i].Trim() : "";

    /// <summary>The texts of a row under its group's keys, as they stand in the file.</summary>
    public IReadOnlyDictionary<string, string> KeyOf(AgsRow row) =>
        (Definition?.Keys ?? []).Where(key => IndexOf(key) >= 0).ToDictionary(key => key, key => row.Items[IndexOf(key)].Text);
}

/// <summary>An AGS4 file: its groups, read line by line. A line that is not of the form is reported and left out.</summary>
internal sealed class AgsFile
{
    private static readonly string[] Order = ["GROUP", "HEADING", "UNIT", "TYPE", "DATA"];

    private readonly AgsReport _report;
    private readonly List<AgsGroup> _groups = [];
    private AgsGroup? _open;
    private int _stage;
    private bool _isPassedOver;

    private AgsFile(AgsText text, AgsReport report) => (Text, _report) = (text, report);

    public AgsText Text { get; }

    public IReadOnlyList<AgsGroup> Groups => _groups;

    public static AgsFile Read(ReadOnlyMemory<byte> bytes, AgsReport report)
    {
        var file = new AgsFile(AgsText.Read(bytes, report), report);
        foreach (var line in file.Text.Lines)
        {
            file.Take(line);
        }

        file.Close();
        if (file._groups.Count == 0 && report.Faults.Count == 0)
        {
            report.Refuse(1, "", "empty-file", "The file has no groups. An AGS4 file begins with a line such as \"GROUP\",\"PROJ\".");
        }

        return file;
    }

    public AgsGroup? Find(string group) => _groups.Find(each => each.Name == group);

    private void Take(AgsLine line)
    {
        var group = _open?.Name ?? "";
        if (line.Fault is { } fault)
        {
            _report.Broken(line.Number, group, fault.Code, fault.Message);
            return;
        }

        var stage = Array.IndexOf(Order, line.Descriptor);
        if (stage < 0)
        {
            _report.Broken(line.Number, group, "unknown-descriptor", $"The line begins with \"{Hosting.Received.Shorten(line.Descriptor)}\"; lines begin with {string.Join(", ", Order)}.");
        }
        else if (stage == 0)
        {
            Close();
            Open(line);
        }
        else if (_open is null)
        {
            if (!_isPassedOver)
            {
                _report.Broken(line.Number, "", "line-order", $"A {line.Descriptor} line stands before any group. Begin with a GROUP line.");
            }
        }
        else
        {
            TakeInto(_open, line, stage);
        }
    }

    private void Open(AgsLine line)
    {
        var name = line.Items.Count > 1 ? line.Items[1].Text.Trim() : "";
        _stage = 0;
        _isPassedOver = false;
        if (line.Items.Count != 2 || name.Length != 4 || !name.All(char.IsAsciiLetterUpper))
        {
            _report.Broken(line.Number, name.ToUpperInvariant(), "group-name", $"A GROUP line has one name of four capitals, as in \"GROUP\",\"LOCA\"; {line.Items.Count - 1} items were read, the first \"{Hosting.Received.Shorten(name)}\".");
            (_open, _isPassedOver) = (null, true);
            return;
        }

        if (Find(name) is { } first)
        {
            _report.Broken(line.Number, name, "group-repeated", $"The group stands in line {first.Line} already. Put all its rows into one.");
            (_open, _isPassedOver) = (null, true);
            return;
        }

        _open = new AgsGroup(name, line.Number);
        _groups.Add(_open);
    }

    private void TakeInto(AgsGroup group, AgsLine line, int stage)
    {
        if (stage < _stage || (stage == _stage && stage < 4) || (stage == 4 && group.Headings.Count == 0) || (stage > 1 && _stage == 0))
        {
            _report.Broken(line.Number, group.Name, "line-order", $"A {line.Descriptor} line cannot stand here: a group has GROUP, HEADING, UNIT and TYPE once, in this order, then DATA.");
            return;
        }

        for (var missing = _stage + 1; missing < stage; missing++)
        {
            _report.Broken(line.Number, group.Name, "line-missing", $"The {Order[missing]} line of the group is missing above this line. Add it.");
        }

        _stage = stage;
        var texts = line.Items.Skip(1).Select(item => item.Text).ToList();
        if (stage == 1)
        {
            (group.HeadingLine, group.Headings) = (line.Number, texts);
            CheckHeadings(group);
            return;
        }

        if (texts.Count != group.Headings.Count)
        {
            _report.Broken(line.Number, group.Name, "item-count", $"The line has {texts.Count} items after its first, the HEADING line {group.Headings.Count}. Give each heading its item, empty ones as \"\".");
            return;
        }

        if (stage == 2)
        {
            (group.UnitLine, group.Units) = (line.Number, texts);
        }
        else if (stage == 3)
        {
            (group.TypeLine, group.Types) = (line.Number, texts);
        }
        else if (texts.TrueForAll(text => text.Length == 0))
        {
            _report.Note(line.Number, "empty-row", Severity.Warning, $"{group.Name}: the row is empty. It is passed over; take it out.");
        }
        else
        {
            group.Rows.Add(new AgsRow(line.Number, [.. line.Items.Skip(1)]));
        }
    }

    private void CheckHeadings(AgsGroup group)
    {
        var seen = new HashSet<string>();
        foreach (var heading in group.Headings)
        {
            if (!seen.Add(heading))
            {
                _report.Broken(group.HeadingLine, group.Name, "heading-repeated", $"{heading} stands twice. Keep one.");
            }
            else if (heading.Split('_') is not [{ Length: 4 } prefix, { Length: > 0 and <= 4 } rest] || !(prefix + rest).All(letter => char.IsAsciiLetterUpper(letter) || char.IsAsciiDigit(letter)))
            {
                _report.Broken(group.HeadingLine, group.Name, "heading-name", $"\"{Hosting.Received.Shorten(heading)}\" is no heading's name: four capitals, an underscore, and up to four capitals or digits.");
            }
        }
    }

    private void Close()
    {
        if (_open is not { } group)
        {
            return;
        }

        for (var missing = _stage + 1; missing < Order.Length; missing++)
        {
            _report.Broken(group.Line, group.Name, missing == 4 ? "no-data" : "line-missing", missing == 4
                ? "The group has no DATA line. Give it one, or take the group out."
                : $"The {Order[missing]} line of the group is missing. Add it.");
        }

        _open = null;
    }
}
