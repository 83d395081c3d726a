namespace Bicycles.NUnit;

public class RetryJitterTests
{
    readonly RetryJitter jitter = new(first: TimeSpan.FromSeconds(1), longest: TimeSpan.FromMinutes(1));

    [TestCase(0)]
    [TestCase(3)]
    [TestCase(30)]
    public void Half_of_the_waits_end_in_the_first_half_of_the_window(int attempt) =>
        Claim.Rate(0.5, tolerance: 0.01).MustHold(rng => jitter.Wait(attempt, rng) < jitter.Window(attempt) / 2);

    [Test]
    public void Both_ends_of_the_window_are_used_alike() => Assert.Multiple(() =>
    {
        Claim.Rate(0.1, tolerance: 0.005).MustHold(rng => jitter.Wait(2, rng) < 0.1 * jitter.Window(2));
        Claim.Rate(0.1, tolerance: 0.005).MustHold(rng => jitter.Wait(2, rng) > 0.9 * jitter.Window(2));
    });

    [Test]
    public void No_wait_outlasts_its_window() =>
        Claim.RateAtMost(0, defect: 1e-4).MustHold(rng => jitter.Wait(5, rng) > jitter.Window(5));

    [Test]
    public void A_wait_takes_half_of_its_window_on_average() =>
        Claim.Mean(4, tolerance: 0.05).DrawsBetween(0, 8).MustHold(rng => jitter.Wait(3, rng).TotalSeconds);

    [Test]
    public void Nine_waits_in_ten_end_before_nine_tenths_of_the_window() =>
        Claim.Quantile(0.9, value: 7.2, tolerance: 0.01).MustHold(rng => jitter.Wait(3, rng).TotalSeconds);

    [Test]
    public void Waits_spread_over_the_whole_window() =>
        Claim.StandardDeviation(2.31, tolerance: 0.1).DrawsBetween(0, 8).MustHold(rng => jitter.Wait(3, rng).TotalSeconds);

    [Test]
    public void Waits_fill_the_window_evenly() =>
        Claim.Follows(x => Math.Clamp(x / 8, 0, 1), tolerance: 0.02).MustHold(rng => jitter.Wait(3, rng).TotalSeconds);
}
