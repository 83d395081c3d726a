namespace Assize.Analyzers.Tests;

public class TooFewTrialsTests
{
    [Fact]
    public Task The_plan_itself_is_enough_and_one_less_is_not()
    {
        long needed = Claim.Rate(0.3, tolerance: 0.05).WithRisk(1e-6).WithConfidence(0.99).Plan().FixedTrials;
        const string Start = "Claim.Rate(0.3, tolerance: 0.05).WithConfidence(0.99).WithRisk(1e-6)";
        return Verify.Rule("ASZ1001", $"_ = {Start}.WithTrials({needed}); _ = {Start}.WithTrials([|{needed - 1}|]);");
    }

    [Theory]
    [InlineData("_ = Claim.Rate(0.5, 0.1).WithTrials([|7|]).WithRisk(0.01);")]
    [InlineData("_ = Claim.Rate(tolerance: 0.1, target: 0.5).Named(\"half\").WithTrials([|7L|]);")]
    [InlineData("int n = 3; n = n * 2; _ = Claim.RateAtLeast(0.9, 0.05).WithTrials([|n|]);")]
    [InlineData("_ = ClaimTerms.WithTrials(Claim.RateAtMost(0, defect: 1e-3), [|7|]);")]
    [InlineData("_ = Claim.Rate(0.5, 0.1).WithTrials([|Trees|]);")]
    public Task Is_seen_however_the_claim_is_written(string claim) => Verify.Rule("ASZ1001", claim);

    [Theory]
    [InlineData("_ = Claim.Rate(double.NaN, 0.1).WithTrials(7);")]
    [InlineData("_ = Claim.Rate(0.5, 1e-300).WithTrials(7);")]
    [InlineData("_ = Claim.Rate(0.5, 0.1).WithRisk(own.NextDouble()).WithTrials(7);")]
    [InlineData("_ = Claim.Rate(0.5, own.NextDouble()).WithTrials(7);")]
    [InlineData("double? defect = 0.2; _ = Claim.Rate(0.5, 0.1, defect).WithTrials(own.Next());")]
    [InlineData("_ = Claim.Rate(0.5, 0.1).WithTrials(long.MaxValue);")]
    public Task Is_silent_where_a_number_is_hostile_or_unknown(string claim) => Verify.Rule("ASZ1001", claim);
}
