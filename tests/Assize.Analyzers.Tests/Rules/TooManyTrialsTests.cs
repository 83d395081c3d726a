namespace Assize.Analyzers.Tests;

public class TooManyTrialsTests
{
    [Fact]
    public Task The_limit_itself_is_allowed()
    {
        long needed = Claim.Rate(0.5, tolerance: 0.1).Plan().FixedTrials;
        const string Start = "_ = [|Claim.Rate(0.5, tolerance: 0.1)|];";
        static Dictionary<string, string> Limit(long trials) => new()
        {
            ["assize.trial_limit"] = trials.ToString(System.Globalization.CultureInfo.InvariantCulture),
        };
        return Task.WhenAll(
            Verify.Rule("ASZ1006", Start, Limit(needed - 1)),
            Verify.Rule("ASZ1006", Start.Replace("[|", "", StringComparison.Ordinal).Replace("|]", "", StringComparison.Ordinal), Limit(needed)));
    }
}
