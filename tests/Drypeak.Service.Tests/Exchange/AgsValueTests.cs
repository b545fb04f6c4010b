using Drypeak.Service.Exchange.Ags;
using Xunit;

namespace Drypeak.Service.Tests.Exchange;

public sealed class AgsValueTests
{
    [Theory]
    [InlineData("1.84", "2DP", true)]
    [InlineData("-1.84", "2DP", true)]
    [InlineData("1.8", "2DP", false)]
    [InlineData("1.840", "2DP", false)]
    [InlineData(".84", "2DP", false)]
    [InlineData("1,84", "2DP", false)]
    [InlineData("12", "0DP", true)]
    [InlineData("12.", "0DP", false)]
    [InlineData("12.0", "0DP", false)]
    [InlineData("14", "2SF", true)]
    [InlineData("9.8", "2SF", true)]
    [InlineData("0.098", "2SF", true)]
    [InlineData("100", "2SF", true)]
    [InlineData("14.0", "2SF", false)]
    [InlineData("9", "2SF", false)]
    [InlineData("1.25E-05", "2SCI", true)]
    [InlineData("1.2E-05", "2SCI", false)]
    [InlineData("0.0000125", "2SCI", false)]
    [InlineData("Y", "YN", true)]
    [InlineData("yes", "YN", false)]
    [InlineData("51:28:52.498", "DMS", true)]
    [InlineData("51.48", "DMS", false)]
    [InlineData("anything", "X", true)]
    [InlineData("", "2DP", true)]
    public void A_value_fits_its_type_or_not(string value, string type, bool fits) => Assert.Equal(fits, AgsValue.Misfit(value, type, "") is null);

    [Theory]
    [InlineData("2026-05-12", "yyyy-mm-dd", true)]
    [InlineData("2026-5-12", "yyyy-mm-dd", false)]
    [InlineData("2026-05-12T08:30", "yyyy-mm-ddThh:mm", true)]
    [InlineData("12/05/2026", "dd/mm/yyyy", true)]
    [InlineData("anything", "week", true)]
    public void A_date_has_the_pattern_of_its_unit(string value, string unit, bool fits) => Assert.Equal(fits, AgsValue.Misfit(value, "DT", unit) is null);

    [Theory]
    [InlineData(1.8549, "2DP", "1.85")]
    [InlineData(1.845, "2DP", "1.84")]
    [InlineData(1.855, "2DP", "1.86")]
    [InlineData(13.95, "2SF", "14")]
    [InlineData(9.96, "2SF", "10")]
    [InlineData(13.95, "3SF", "14.0")]
    [InlineData(13.95, "0DP", "14")]
    [InlineData(0.000125, "2SCI", "1.25E-04")]
    [InlineData(13.95, "X", "14.0")]
    public void A_number_is_written_by_its_type_halves_to_the_even_digit(double value, string type, string text)
    {
        Assert.Equal(text, AgsValue.Written(value, type, "1DP"));
        if (AgsValue.HasCount(type))
        {
            Assert.Null(AgsValue.Misfit(text, type, ""));
        }
    }

    /// <summary>
    /// Headings, status, types and units as the standard's data dictionary has them (AGS4 data dictionary, editions 4.0.4 to 4.2,
    /// Association of Geotechnical and Geoenvironmental Specialists, as read for the project's notes on open standards).
    /// </summary>
    [Theory]
    [InlineData("CMPG", "CMPG_MAXD", "2DP", "Mg/m3", false)]
    [InlineData("CMPG", "CMPG_MCOP", "2SF", "%", false)]
    [InlineData("CMPG", "CMPG_PDEN", "XN", "Mg/m3", false)]
    [InlineData("CMPG", "CMPG_375", "0DP", "%", false)]
    [InlineData("CMPG", "CMPG_TESN", "X", "", true)]
    [InlineData("CMPT", "CMPT_MC", "X", "%", false)]
    [InlineData("CMPT", "CMPT_DDEN", "3DP", "Mg/m3", false)]
    [InlineData("CMPT", "CMPT_TESN", "X", "", true)]
    [InlineData("IDEN", "IDEN_IDEN", "2DP", "Mg/m3", false)]
    [InlineData("IDEN", "IDEN_DPTH", "2DP", "m", true)]
    [InlineData("LPDN", "LPDN_PDEN", "XN", "Mg/m3", false)]
    [InlineData("RELD", "RELD_DMAX", "2DP", "Mg/m3", false)]
    [InlineData("LNMC", "LNMC_MC", "X", "%", false)]
    [InlineData("SAMP", "SAMP_TOP", "2DP", "m", true)]
    [InlineData("LOCA", "LOCA_ID", "ID", "", true)]
    public void The_dictionary_has_the_published_headings(string group, string heading, string type, string unit, bool isKey)
    {
        var found = AgsDictionary.Find(group)!.Find(heading)!;
        Assert.Equal((type, unit, isKey), (found.Type, found.Unit, found.IsKey));
    }

    [Fact]
    public void The_dictionary_is_whole_in_itself() => Assert.All(AgsDictionary.All, group =>
    {
        Assert.Matches("^[A-Z]{4}$", group.Name);
        Assert.Equal(group.Headings.Count, group.Headings.Select(heading => heading.Name).Distinct().Count());
        Assert.NotEmpty(group.Keys);
        Assert.All(group.Headings, heading => Assert.True(AgsDictionary.IsType(heading.Type) && AgsDictionary.Editions.Contains(heading.Since), heading.Name));
        Assert.True(group.Parent is null || group.Parent == "PROJ" || AgsDictionary.Find(group.Parent)!.Keys.All(key => group.Keys.Contains(key)), group.Name);
    });
}
