
namespace Assize.Bounds.Tests.Assessment;

public class MeanAssessmentTests
{
    static readonly double[] Die = [.. Enumerable.Repeat(1 / 6.0, 6)];

    // Every rim from 2.5 to 4.5 in twentieths, rims on attainable averages among them, passing or not.
    [Fact]
    public void The_mean_of_a_die_is_assessed_exactly()
    {
        int cases = 0;
        foreach (int trials in (int[])[2, 7, 20, 60])
        {
            double[] sums = Enumerated.Sum(Die, trials);
            for (int a = 50; a <= 70; a++)
            {
                for (int b = 70; b <= 90; b++)
                {
                    foreach (bool passes in (bool[])[true, false])
                    {
                        double low = a / 20.0, high = b / 20.0;
                        var assessment = new MeanAssessment(Law.WholeNumbers(1, 6), trials, new Band(low, high, passes, passes));
                        // In whole numbers: 20·sum against trials·a.
                        double red = Enumerated.Where(sums, i => 20 * (i + trials) is var total
                            && (total < trials * a || total > trials * b || (!passes && (total == trials * a || total == trials * b))));
                        Enumerated.Contains(assessment.FalseFailure, red, $"{trials} dice in {low}..{high} {passes}");
                        Assert.True(assessment.FalseFailure.Upper - assessment.FalseFailure.Lower <= 1e-9 * red + 1e-15);
                        cases++;
                    }
                }
            }
        }

        Assert.True(cases > 3_000, $"{cases} cases");
    }

    // The gamma and normal distributions of MathNet.Numerics share no code with this one.
    [Theory]
    [InlineData(50, 0.3)]
    [InlineData(1000, 0.05)]
    [InlineData(100_000, 0.01)]
    public void Exponential_and_normal_means_are_assessed_exactly(long trials, double half)
    {
        var gamma = new MathNet.Numerics.Distributions.Gamma(trials, trials);
        double red = gamma.CumulativeDistribution(1 - half) + 1 - gamma.CumulativeDistribution(1 + half);
        var exponential = new MeanAssessment(Law.Exponential(1), trials, new Band(1 - half, 1 + half));
        Assert.Equal(1, exponential.FalseFailure.Upper / red, 1e-7);

        var normal = new MeanAssessment(Law.Normal(3, 2), trials, new Band(3 - half, 3 + half));
        double tails = 2 * MathNet.Numerics.Distributions.Normal.CDF(0, 1, -half / 2 * Math.Sqrt(trials));
        Assert.Equal(1, normal.FalseFailure.Upper / tails, 1e-7);
    }

    // The sum of three uniform draws has the cubic distribution x³/6 up to 1.
    [Theory]
    [InlineData(0.2)]
    [InlineData(0.5)]
    [InlineData(0.9)]
    public void Uniform_means_are_enclosed(double total)
    {
        var assessment = new SumAssessment(Law.Uniform(0, 1), 3, new Band(total, null));

        Enumerated.Contains(assessment.FalseFailure, total * total * total / 6, $"three uniform draws below {total}");
        Assert.Equal("tilted Berry–Esseen", assessment.Theorem);
    }

    // On two points the average is a count: exact binomials in whole numbers, for every law that the facts allow.
    [Fact]
    public void Facts_bound_every_law_on_two_points_from_above()
    {
        int cases = 0;
        foreach (int trials in (int[])[20, 100, 400])
        {
            foreach (double half in (double[])[0.05, 0.1, 0.2])
            {
                foreach (double rate in (double[])[0.125, 0.25, 0.5, 0.75])
                {
                    foreach (double? deviation in (double?[])[null, 0.25])
                    {
                        // Mean 0.5 with this rate of the high value, as wide as the range or the deviation allow.
                        double spread = Math.Min(deviation ?? 1, 0.5 * Math.Min(Math.Sqrt(rate / (1 - rate)), Math.Sqrt((1 - rate) / rate)));
                        double low = 0.5 - spread * Math.Sqrt(rate / (1 - rate)), high = 0.5 + spread * Math.Sqrt((1 - rate) / rate);
                        var assessment = new MeanAssessment(0, 1, deviation, 0.5, trials, new Band(0.5 - half, 0.5 + half));
                        bool Green(long count) => Math.Abs(low + (high - low) * count / trials - 0.5) <= half;
                        long first = 0, last = trials;
                        while (!Green(first))
                            first++;
                        while (!Green(last))
                            last--;
                        Assert.True(new ExactBinomial(trials, rate).CompareOutside(first, last, assessment.FalseFailure.Upper) <= 0, $"{trials} {half} {rate} {deviation}");
                        Assert.Equal(0, assessment.FalseFailure.Lower);
                        cases++;
                    }
                }
            }
        }

        Assert.Equal(72, cases);
        Assert.True(new MeanAssessment(0, 1, 0.1, 0.5, 400, new Band(0.45, 0.55)).FalseFailure.Upper
            < new MeanAssessment(0, 1, null, 0.5, 400, new Band(0.45, 0.55)).FalseFailure.Upper / 100);
    }

    [Fact]
    public void Trials_needed_are_enough_from_there_on_and_not_far_too_many()
    {
        var assessment = new MeanAssessment(Law.WholeNumbers(1, 6), 100, new Band(3.4, 3.6));
        long needed = assessment.TrialsNeeded(1e-3)!.Value;

        for (long trials = needed; trials < needed + 40; trials++)
            Assert.True(new MeanAssessment(Law.WholeNumbers(1, 6), trials, new Band(3.4, 3.6)).FalseFailure.Upper <= 1e-3);
        Assert.True(new MeanAssessment(Law.WholeNumbers(1, 6), (long)(0.9 * needed), new Band(3.4, 3.6)).FalseFailure.Lower > 1e-3);
        Assert.Null(new MeanAssessment(Law.WholeNumbers(1, 6), 100, new Band(3.5, 3.6)).TrialsNeeded(1e-3));
        Assert.InRange(new MeanAssessment(0, 1, null, 0.5, 100, new Band(0.49, 0.51)).TrialsNeeded(1e-6)!.Value, 64_000, 72_545);
    }

    [Fact]
    public void The_defect_caught_is_caught_and_a_smaller_one_is_not()
    {
        var law = Law.WholeNumbers(1, 6);
        double caught = new MeanAssessment(law, 60, new Band(2.5, 4.1)).SmallestDefectCaught(0.99)!.Value;
        double[] sums = Enumerated.Sum(Die, 60);
        double Green(double shift) => Enumerated.Where(sums, i => (i + 60) / 60.0 + shift is >= 2.5 and <= 4.1);

        Assert.True(caught > 0);
        Assert.True(Green(caught + 1e-9) <= 0.01);
        Assert.True(Green(caught - 0.02) > 0.01);
    }

    [Fact]
    public void The_tolerance_affordable_is_kept()
    {
        double half = new MeanAssessment(Law.Exponential(2), 500, new Band(1.9, 2.1)).ToleranceAffordable(1e-4)!.Value;

        Assert.InRange(new MeanAssessment(Law.Exponential(2), 500, new Band(2 - half, 2 + half)).FalseFailure.Upper, 0.99e-4, 1e-4 * (1 + 1e-6));
    }

    [Fact]
    public void What_means_nothing_is_refused()
    {
        Assert.ThrowsAny<ArgumentException>(() => new MeanAssessment(Law.WholeNumbers(1, 6), 0, new Band(3, 4)));
        Assert.ThrowsAny<ArgumentException>(() => new MeanAssessment(0, 1, null, 2, 10, new Band(0, 1)));
        Assert.ThrowsAny<ArgumentException>(() => new MeanAssessment(1, 0, null, 0.5, 10, new Band(0, 1)));
        Assert.Throws<ArgumentOutOfRangeException>(() => new MeanAssessment(0, 1, null, 0.5, 10, new Band(0, 1)).TrialsNeeded(double.NaN));
    }
}
