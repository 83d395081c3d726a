using Assize.Bounds;

namespace Assize.Benchmarks;

/// <summary>What the compiler waits for at each assertion that was read.</summary>
sealed class Assessments : Benchmark
{
    const double Limit = 0.3;

    public override string Title => $"a question about a hand-written assertion : {Yardstick.Name}";

    public override IEnumerable<Row> Measure()
    {
        foreach (long trials in (long[])[100, 10_000, 1_000_000, 1_000_000_000])
        {
            long low = trials * 45 / 100, high = trials * 55 / 100;
            yield return Ask($"false failure, {trials:N0} trials", () => ProportionAssessment.Assess(trials, low, high, 0.5).Upper);
            yield return Ask(
                $"defect caught, {trials:N0} trials",
                () => ProportionAssessment.SmallestDefectCaught(trials, low, high, 0.5, 0.999) ?? 0);
        }

        foreach (double half in (double[])[0.1, 0.01, 0.001, 0.0001])
        {
            var band = new ProportionBand(0.5 - half, 0.5 + half);
            yield return Ask($"trials needed, 0.5 ± {half}", () => ProportionAssessment.TrialsNeeded(band, 0.5, 1e-6) ?? 0);
        }

        yield return Ask("tolerance affordable, 1e6 trials", () => ProportionAssessment.ToleranceAffordable(1_000_000, 0.5, 1e-6));
    }

    static Row Ask(string name, Func<double> question) =>
        Row.Of(name, Paired.Compare(() => Sink.Take(question()), Yardstick.Millisecond), Limit);
}
