using Drypeak.Service.Hosting;

namespace Drypeak.Service.Exchange.Ags;

/// <summary>The rules that hold between lines and between groups: keys, parents, required items, types and units, lists of codes (rules 7 to 18).</summary>
internal sealed class AgsRules(AgsFile file, AgsReport report)
{
    private static readonly string[] Expected = ["PROJ", "TRAN", "UNIT", "TYPE"];
    private static readonly string[] OfOneRow = ["PROJ", "TRAN"];

    /// <summary>The file's edition, from TRAN_AGS; null where it does not say.</summary>
    public string? Edition => file.Find("TRAN") is { Rows: [var row, ..] } tran && tran.Text(row, "TRAN_AGS") is { Length: > 0 } edition ? edition : null;

    public void Check()
    {
        foreach (var group in Expected.Where(group => file.Find(group) is null))
        {
            report.Note(1, "group-missing", Severity.Warning, $"The file has no group {group}, which every AGS4 file has. It is read all the same; add the group before the file is sent on.");
        }

        CheckEdition();
        foreach (var group in file.Groups)
        {
            CheckKeys(group);
            CheckParents(group);
            CheckRequired(group);
            CheckTypes(group);
            CheckDefinitions(group);
        }

        CheckLists();
    }

    private void CheckEdition()
    {
        if (file.Find("TRAN") is not { } tran)
        {
            return;
        }

        if (Edition is { } edition && !AgsDictionary.Editions.Contains(edition))
        {
            report.Note(tran.Rows[0].Line, "edition-unknown", Severity.Warning,
                $"TRAN_AGS is \"{Received.Shorten(edition)}\"; the editions known here are {string.Join(", ", AgsDictionary.Editions)}. The file is read by the newest of them.");
        }

        foreach (var (type, heading) in new[] { ("RL", "TRAN_DLIM"), ("PA", "TRAN_RCON") })
        {
            var users = file.Groups.SelectMany(group => group.Headings.Where(each => group.TypeOf(each) == type).Select(each => (group, each)));
            var needs = type == "RL" ? users.Any() : users.Any(user => user.group.Rows.Exists(row => user.group.Text(row, user.each).Contains('+', StringComparison.Ordinal)));
            if (needs && (tran.Rows.Count == 0 || tran.Text(tran.Rows[0], heading).Length == 0))
            {
                report.Note(tran.Line, "delimiter-missing", Severity.Warning, $"The file uses what {heading} would say how to part; it says nothing. Fill it in.");
            }
        }
    }

    private void CheckKeys(AgsGroup group)
    {
        if (group.Definition is not { } definition)
        {
            return;
        }

        var keys = definition.Keys.ToList();
        foreach (var key in keys.Where(key => group.IndexOf(key) < 0))
        {
            report.Wrong(group.HeadingLine, group.Name, "key-missing", $"The key heading {key} is missing. Add it, with empty items where it says nothing.");
        }

        var present = keys.ConvertAll(group.IndexOf).FindAll(index => index >= 0);
        if (!present.SequenceEqual(present.Order()) || present.Any(index => index >= present.Count))
        {
            report.Note(group.HeadingLine, "heading-order", Severity.Note, $"{group.Name}: the key headings do not stand first, in the order {string.Join(", ", keys)}. They are read by their names.");
        }

        var first = new Dictionary<string, int>();
        foreach (var row in group.Rows)
        {
            var key = string.Join('\u001F', present.Select(index => row.Items[index].Text.Trim()));
            if (!first.TryAdd(key, row.Line))
            {
                report.Wrong(row.Line, group.Name, "key-repeated", $"The row has the same key as line {first[key]}: {string.Join(", ", keys.Where(each => group.IndexOf(each) >= 0).Select(each => $"{each} \"{Received.Shorten(group.Text(row, each))}\""))}. Give each its own.");
            }
        }
    }

    private void CheckParents(AgsGroup group)
    {
        // PROJ has one row, whose key its children do not repeat.
        if (group.Definition is not { Parent: { } name and not "PROJ" })
        {
            return;
        }

        var parent = file.Find(name);
        var keys = parent?.Definition?.Keys.Where(key => group.IndexOf(key) >= 0 && parent.IndexOf(key) >= 0).ToList() ?? [];
        var known = parent?.Rows.Select(row => string.Join('\u001F', keys.Select(key => parent.Text(row, key)))).ToHashSet() ?? [];
        foreach (var row in group.Rows.Where(row => !known.Contains(string.Join('\u001F', keys.Select(key => group.Text(row, key))))))
        {
            var message = $"There is no row in {name} with {string.Join(", ", keys.DefaultIfEmpty("its keys").Select(key => keys.Count == 0 ? key : $"{key} \"{Received.Shorten(group.Text(row, key))}\""))}. Add it, or correct the key.";
            if (name == "CMPG")
            {
                report.Wrong(row.Line, group.Name, "parent-missing", message);
            }
            else
            {
                report.Note(row.Line, "parent-missing", Severity.Warning, $"{group.Name}: {message}");
            }
        }
    }

    private void CheckRequired(AgsGroup group)
    {
        foreach (var heading in group.Definition?.Headings.Where(heading => heading.IsRequired) ?? [])
        {
            foreach (var row in group.Rows.Where(row => group.Text(row, heading.Name).Length == 0))
            {
                report.Wrong(row.Line, group.Name, "required-empty", $"{heading.Name} is required, and empty or missing. Fill it in.");
            }
        }

        if (OfOneRow.Contains(group.Name) && group.Rows.Count > 1)
        {
            report.Wrong(group.Rows[1].Line, group.Name, "one-row-only", $"The group has one row; {group.Rows.Count} were read. Keep one.");
        }
    }

    private void CheckTypes(AgsGroup group)
    {
        for (var i = 0; i < group.Types.Count; i++)
        {
            var (heading, type) = (group.Headings[i], group.Types[i].Trim());
            if (!AgsDictionary.IsType(type))
            {
                report.Wrong(group.TypeLine, group.Name, "type-unknown", $"\"{Received.Shorten(type)}\" under {heading} is no data type of the standard. Write one, such as X, 2DP or PA.");
                continue;
            }

            foreach (var row in group.Rows)
            {
                if (AgsValue.Misfit(row.Items[i].Text, type, i < group.Units.Count ? group.Units[i] : "") is { } why)
                {
                    report.Wrong(row.Line, group.Name, "type-mismatch", $"{heading} is \"{Received.Shorten(row.Items[i].Text)}\"; by its type {type} {why}. Correct the value, or the TYPE line.");
                }
            }
        }
    }

    private void CheckDefinitions(AgsGroup group)
    {
        var own = file.Find("DICT");
        bool IsDefined(string heading, string value) => own?.Rows.Exists(row => own.Text(row, "DICT_GRP") == group.Name && (heading.Length == 0 || own.Text(row, heading) == value)) is true;
        if (group.Definition is null)
        {
            if (!IsDefined("", ""))
            {
                report.Note(group.Line, "group-unknown", Severity.Note, $"{group.Name} is not one of the groups that are read here; its {group.Rows.Count} rows are carried through as they are.");
            }

            return;
        }

        foreach (var (i, heading) in group.Headings.Index())
        {
            if (group.Definition.Find(heading) is not { } definition)
            {
                if (heading.StartsWith(group.Name, StringComparison.Ordinal) && !IsDefined("DICT_HDNG", heading) && group.Name is "CMPG" or "CMPT" or "IDEN")
                {
                    report.Note(group.HeadingLine, "heading-unknown", Severity.Note, $"{group.Name}: {heading} is not in the dictionary that is used here, nor in the file's DICT. It is carried through as it is.");
                }

                continue;
            }

            if (i < group.Types.Count && group.Types[i].Trim() != definition.Type && AgsDictionary.IsType(group.Types[i].Trim()))
            {
                report.Note(group.TypeLine, "type-differs", Severity.Note, $"{group.Name}: {heading} has the type {group.Types[i].Trim()}, in the dictionary {definition.Type}. The file's own is used.");
            }
        }
    }

    private void CheckLists()
    {
        var (units, types, codes) = (Listed("UNIT", "UNIT_UNIT"), Listed("TYPE", "TYPE_TYPE"), file.Find("ABBR"));
        foreach (var group in file.Groups)
        {
            foreach (var unit in group.Units.Where(unit => unit.Length > 0 && units is not null && units.Add(unit)))
            {
                report.Note(group.UnitLine, "unit-not-listed", Severity.Note, $"{group.Name}: the unit \"{Received.Shorten(unit)}\" does not stand in the group UNIT. Add it there.");
            }

            foreach (var type in group.Types.Where(type => AgsDictionary.IsType(type) && types is not null && types.Add(type)))
            {
                report.Note(group.TypeLine, "type-not-listed", Severity.Note, $"{group.Name}: the type {type} does not stand in the group TYPE. Add it there.");
            }

            CheckCodes(group, codes);
        }
    }

    private void CheckCodes(AgsGroup group, AgsGroup? abbreviations)
    {
        if (group.Name is "ABBR" or "DICT")
        {
            return;
        }

        foreach (var (i, heading) in group.Headings.Index().Where(each => each.Index < group.Types.Count && group.Types[each.Index].Trim() == "PA"))
        {
            var listed = abbreviations?.Rows.Where(row => abbreviations.Text(row, "ABBR_HDNG") == heading).Select(row => abbreviations.Text(row, "ABBR_CODE")).ToHashSet(StringComparer.OrdinalIgnoreCase) ?? [];
            foreach (var row in group.Rows)
            {
                foreach (var code in row.Items[i].Text.Split('+', StringSplitOptions.RemoveEmptyEntries | StringSplitOptions.TrimEntries).Where(listed.Add))
                {
                    report.Note(row.Line, "code-not-listed", AgsDictionary.IsCode(heading, code) ? Severity.Note : Severity.Warning, $"{group.Name}: the code \"{Received.Shorten(code)}\" of {heading} does not stand in the group ABBR. Add it there, with what it means.");
                }
            }
        }
    }

    private HashSet<string>? Listed(string group, string heading) =>
        file.Find(group) is { } list ? [.. list.Rows.Select(row => list.Text(row, heading))] : null;
}
