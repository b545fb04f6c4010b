using Drypeak.Figures;
using Drypeak.Service.Laboratory;
using Drypeak.Service.Pages.Forms;

namespace Drypeak.Service.Pages.Laboratory;

/// <summary>A form with what came of it: an answer, or all that is wrong.</summary>
/// <param name="Form">As it was typed.</param>
/// <param name="Reading">What was understood; null for a form that was only opened.</param>
/// <param name="Faults">All that is wrong; empty where there is an answer.</param>
/// <param name="Answer">The answer, or null.</param>
/// <param name="Chart">Its chart, or null.</param>
/// <param name="Status">HTTP status: 200, 400 where a text could not be read, 422 where values cannot be computed.</param>
public sealed record Submission(TestForm Form, TestReading? Reading, IReadOnlyList<FormFault> Faults, MoistureDensityAnswer? Answer, CompactionChart? Chart, int Status) : IFilledForm
{
    /// <summary>Whether the grid was asked to be longer.</summary>
    public bool GridAsked => Form[TestFields.GridRows].Length > 0;

    /// <summary>Whether a field under "More" is wrong: it must then be in view.</summary>
    public bool MoreAsked => Faults.Any(fault => TestFields.UnderMore.Contains(fault.Field));

    /// <inheritdoc/>
    public string TextOf(FormField field) => Form[field];

    /// <summary>What is wrong at a control: several sentences where it is the table.</summary>
    public IReadOnlyList<string> FaultsAt(string control) => [.. Faults.Where(fault => fault.Control == control).Select(fault => fault.AtField)];

    /// <summary>A form that is shown and not computed.</summary>
    public static Submission Opened(TestForm form) => new(form, null, [], null, null, StatusCodes.Status200OK);

    /// <summary>A form that is shown with something that is wrong with its address.</summary>
    public static Submission Refused(string message) =>
        new(TestForm.Empty, null, [new FormFault(TestFields.Table.Name, TestFields.Table, TestFields.Table.Label, message)], null, null, StatusCodes.Status400BadRequest);

    /// <summary>Reads, checks and computes a form.</summary>
    internal static Submission Of(TestForm form, MoistureDensityJob job)
    {
        var reading = TestReading.Of(form);
        List<Fault> formFaults = [.. reading.Unreadable, .. reading.Missing];
        var broken = job.Check(reading.Request).Where(fault => !formFaults.Exists(known => FollowsFrom(fault, known, reading)));
        List<FormFault> faults = [.. formFaults.Concat(broken).Select(fault => TestFaults.Of(fault, reading)).Distinct().Order(TestFaults.AsOnThePage)];
        if (faults.Count > 0)
        {
            return new Submission(form, reading, faults, null, null,
                reading.Unreadable.Count > 0 ? StatusCodes.Status400BadRequest : StatusCodes.Status422UnprocessableEntity);
        }

        var (answer, chart) = job.Compute(reading.Request);
        return new Submission(form, reading, [], answer, chart, StatusCodes.Status200OK);
    }

    /// <summary>
    /// Whether a rule is broken only since a text could not be read: its member is then missing, and so is what would have been made
    /// of it. A specimen lacks its density where the mold is unknown.
    /// </summary>
    private static bool FollowsFrom(Fault broken, Fault known, TestReading reading)
    {
        if (broken.Place == known.Place || known.Place.StartsWith(broken.Place + "/", StringComparison.Ordinal) || broken.Place.StartsWith(known.Place + "/", StringComparison.Ordinal))
        {
            return true;
        }

        return broken.Code == "not-enough-data" && known.Place.StartsWith("/mold/", StringComparison.Ordinal) && reading.HasWaterContent(broken.Place);
    }
}
