namespace Assize.Bounds.Tests;

public class ProportionAssessmentTests
{
    [Fact]
    public void False_failures_of_ordinary_assertions_are_found()
    {
        // A rate of .3 over 1,000 passes, accepted from 251 to 349; a face of a die over 1,000 throws, from 147 to 186.
        Assert.Equal(6.337e-4, ProportionAssessment.Assess(1000, 251, 349, 0.3).Upper, 1e-7);
        Assert.Equal(0.0895, ProportionAssessment.Assess(1000, 147, 186, 1 / 6.0).Lower, 5e-5);
        Assert.Equal("exact binomial", BinomialTail.Name);
    }

    // Exact probabilities of |S - n/2| ≥ d for a fair coin, recomputed in whole numbers.
    [Theory]
    [InlineData(100, 11)]
    [InlineData(1000, 50)]
    public void A_fair_coin_agrees_with_whole_numbers(int trials, int distance)
    {
        var (low, high) = (trials / 2 - distance + 1, trials / 2 + distance - 1);
        var enclosure = ProportionAssessment.Assess(trials, low, high, 0.5);
        var exact = new ExactBinomial(trials, 0.5);

        Assert.True(exact.CompareOutside(low, high, enclosure.Lower) >= 0);
        Assert.True(exact.CompareOutside(low, high, enclosure.Upper) <= 0);
    }

    [Fact]
    public void The_smallest_defect_is_caught_and_hardly_anything_smaller_is()
    {
        int seen = 0;
        foreach (var (trials, low, high, rate) in new[]
            {
                (1000L, 251L, 349L, 0.3), (1000, 0, 349, 0.3), (1000, 251, 1000, 0.3),
                (20, 5, 15, 0.5), (100, 0, 3, 0.001), (100_000, 49_000, 51_500, 0.5),
            })
        {
            foreach (double confidence in new[] { 0.5, 0.9, 0.999 })
            {
                double shift = ProportionAssessment.SmallestDefectCaught(trials, low, high, rate, confidence)!.Value;
                double miss = (double)(1 - (decimal)confidence);
                Assert.True(
                    BinomialTail.Between(trials, low, high, rate + shift).Lower <= miss,
                    $"{trials} {low} {high} {confidence}");
                Assert.True(
                    BinomialTail.Between(trials, low, high, rate + shift * 0.999999).Upper > miss,
                    $"{trials} {low} {high} {confidence}");
                double other = rate - shift * 0.999999;
                Assert.True(
                    other is < 0 or > 1 || BinomialTail.Between(trials, low, high, other).Upper > miss,
                    $"{trials} {low} {high}: nearer");
                seen++;
            }
        }

        Assert.Equal(18, seen);
    }

    [Fact]
    public void A_band_that_always_passes_catches_nothing_and_one_that_never_does_is_red_already()
    {
        Assert.Null(ProportionAssessment.SmallestDefectCaught(100, 0, 100, 0.3, 0.9));
        Assert.Equal(0, ProportionAssessment.SmallestDefectCaught(100, 50, 49, 0.3, 0.9));
        Assert.Equal(0, ProportionAssessment.SmallestDefectCaught(100, 90, 100, 0.3, 0.9));
    }

    // Exact sizes for |share - .5| ≥ .01 to have each probability from that size on, by exhaustive search over all
    // sizes.
    [Theory]
    [InlineData(0.49, 0.51, 0.5, 1e-2, 16_650)]
    [InlineData(0.49, 0.51, 0.5, 1e-4, 37_901)]
    [InlineData(0.49, 0.51, 0.5, 1e-6, 59_901)]
    [InlineData(0.49, 0.51, 0.5, 1e-9, 93_401)]
    [InlineData(0.005, 0.015, 0.01, 1e-2, 2_801)]
    [InlineData(0.005, 0.015, 0.01, 1e-4, 6_467)]
    [InlineData(0.005, 0.015, 0.01, 1e-6, 10_401)]
    [InlineData(0.005, 0.015, 0.01, 1e-9, 16_534)]
    public void Trials_needed_agree_with_an_exhaustive_search(double low, double high, double rate, double risk, long trials) =>
        Assert.Equal(trials, ProportionAssessment.TrialsNeeded(new ProportionBand(low, high), rate, risk));

    [Fact]
    public void Trials_needed_are_never_too_few_and_the_number_before_fails()
    {
        int seen = 0;
        foreach (var (low, high, rate) in new (double?, double?, double)[]
            { (0.2, 0.45, 0.3), (null, 0.5, 0.3), (0.1, null, 0.3), (0.85, 0.99, 0.95), (null, 0.1, 0.001), (0.4, 0.9, 0.5) })
        {
            foreach (double risk in new[] { 0.3, 0.01, 1e-4 })
            {
                long needed = ProportionAssessment.TrialsNeeded(new ProportionBand(low, high), rate, risk)!.Value;
                for (int trials = (int)needed; trials < 2 * needed + 200 && trials < 1200; trials++)
                    Assert.True(
                        Red(trials, low, high, rate).CompareTo(risk) <= 0,
                        $"{low} {high} {rate} {risk}: {trials} of {needed}");

                Assert.True(
                    needed == 1 || Red((int)needed - 1, low, high, rate) > risk,
                    $"{low} {high} {rate} {risk}: {needed}");
                seen++;
            }
        }

        Assert.Equal(18, seen);
    }

    // Red in decimal arithmetic: a share on a rim is red. The sum of the mass is taken term by term.
    static double Red(int trials, double? low, double? high, double rate)
    {
        double green = 0;
        double log = 0;
        for (int successes = 0; successes <= trials; successes++)
        {
            bool passes = !(successes <= (decimal?)low * trials) && !(successes >= (decimal?)high * trials);
            double mass = Math.Exp(log + successes * Math.Log(rate) + (trials - successes) * Math.Log(1 - rate));
            green += passes ? 0 : mass;
            log += Math.Log(trials - successes) - Math.Log(successes + 1);
        }

        return green;
    }

    [Fact]
    public void A_rate_on_or_outside_the_band_can_never_be_shown()
    {
        Assert.Null(ProportionAssessment.TrialsNeeded(new ProportionBand(0.3, 0.4), 0.3, 1e-6));
        Assert.Null(ProportionAssessment.TrialsNeeded(new ProportionBand(0.3, 0.4), 0.5, 1e-6));
        Assert.Null(ProportionAssessment.TrialsNeeded(new ProportionBand(0.3, 0.2), 0.25, 1e-6));
        Assert.Null(ProportionAssessment.TrialsNeeded(new ProportionBand(0.4999999999, 0.6), 0.5, 1e-6));
        Assert.Null(ProportionAssessment.TrialsNeeded(new ProportionBand(double.NaN, 0.6), 0.5, 1e-6));
        Assert.Equal(1, ProportionAssessment.TrialsNeeded(new ProportionBand(null, null), 0.5, 1e-6));
        Assert.Equal(1, ProportionAssessment.TrialsNeeded(new ProportionBand(null, 0.1), 0, 1e-6));
    }

    [Fact]
    public void The_tolerance_afforded_keeps_the_risk_and_one_step_less_does_not()
    {
        int seen = 0;
        foreach (int trials in new[] { 10, 100, 3000 })
        {
            foreach (double rate in new[] { 0.5, 0.3, 0.01 })
            {
                double tolerance = ProportionAssessment.ToleranceAffordable(trials, rate, 1e-4);
                Assert.True(Outside(trials, rate, tolerance) <= 1e-4, $"{trials} {rate} {tolerance}");
                Assert.True(Outside(trials, rate, tolerance - 1.0 / trials) > 0.2e-4, $"{trials} {rate} {tolerance}");
                seen++;
            }
        }

        Assert.Equal(9, seen);
    }

    static double Outside(int trials, double rate, double tolerance) => BinomialTail.Outside(
        trials, (long)Math.Ceiling((rate - tolerance) * trials), (long)Math.Floor((rate + tolerance) * trials), rate).Upper;

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => ProportionAssessment.Assess(0, 0, 0, 0.5));
        Assert.Throws<ArgumentOutOfRangeException>(() => ProportionAssessment.Assess(10, 3, 7, double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>(() => ProportionAssessment.Assess(10, 7, 3, 0.5));
        Assert.Throws<ArgumentOutOfRangeException>(() => ProportionAssessment.SmallestDefectCaught(10, 3, 7, 0.5, 1));
        Assert.Throws<ArgumentOutOfRangeException>(() => ProportionAssessment.SmallestDefectCaught(10, 3, 7, -1, 0.9));
        Assert.Throws<ArgumentOutOfRangeException>(() => ProportionAssessment.TrialsNeeded(new(0.1, 0.2), 0.15, 0));
        Assert.Throws<ArgumentNullException>(() => ProportionAssessment.TrialsNeeded(null!, 0.15, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => ProportionAssessment.ToleranceAffordable(0, 0.15, 0.1));
        Assert.Throws<ArgumentOutOfRangeException>(() => ProportionAssessment.ToleranceAffordable(10, 0.15, 1));
    }
}
