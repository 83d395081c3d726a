namespace Bicycles.NUnit;

public class VisitorSketchTests
{
    const int Riders = 2_000;

    [Test]
    public void An_estimate_is_rarely_off_by_more_than_thirty_percent() =>
        Claim.RateAtLeast(0.95, defect: 0.05).InParallel().MustHold(rng => Math.Abs(Estimate(rng) - Riders) <= 0.3 * Riders);

    [Test]
    public void Estimates_fall_on_either_side_of_the_truth() =>
        Claim.Rate(0.5, tolerance: 0.1).MustHold(rng => Estimate(rng) > Riders);

    [Test]
    public void Estimates_are_right_on_average() =>
        Claim.Mean(Riders, tolerance: 100).DrawsDeviateAtMost(400).MustHold(Estimate);

    [Test]
    public void An_estimate_keeps_what_the_sketch_promises() =>
        Claim.Accuracy(error: 600, probability: 0.95, defect: 0.05).MustHold(rng => (Estimate(rng), Riders));

    static double Estimate(Random rng)
    {
        var sketch = new VisitorSketch(registers: 64, salt: (ulong)rng.NextInt64());
        for (ulong rider = 0; rider < Riders; rider++)
            sketch.See(rider);
        return sketch.Estimate();
    }
}
