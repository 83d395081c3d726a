using MathNet.Numerics.Distributions;

namespace Assize.Bounds.Tests.Assessment;

/// <summary>Variances, differences, standard errors and nominal levels.</summary>
public class SpreadAssessmentsTests
{
    [Theory]
    [InlineData(30, 0.5, 1.6, true, false)]
    [InlineData(30, 0.5, 1.6, false, false)]
    [InlineData(200, 0.9, 1.1, true, true)]
    [InlineData(5000, 0.97, 1.03, false, true)]
    public void The_variance_of_normal_draws_is_chi_square(long trials, double low, double high, bool lessOne, bool root)
    {
        // Deviation 1; the same band in units of the sum of squares, by MathNet's own distribution.
        double Squares(double rim) => (root ? rim * rim : rim) * (lessOne ? trials - 1 : trials);
        double red = ChiSquared.CDF(trials - 1, Squares(low)) + 1 - ChiSquared.CDF(trials - 1, Squares(high));
        var assessment = new VarianceAssessment(Law.Normal(7, 1), trials, new Band(low, high), lessOne, root);

        Assert.Equal(1, assessment.FalseFailure.Upper / red, 1e-7);
        Assert.True(assessment.FalseFailure.Lower <= assessment.FalseFailure.Upper);
    }

    // The variance of yes/no draws is a function of their count: exact binomials in whole numbers.
    [Theory]
    [InlineData(40, 0.5, 0.18, 0.26)]
    [InlineData(200, 0.25, 0.12, 0.24)]
    [InlineData(400, 0.5, 0.24, 0.26)]
    public void The_variance_of_draws_in_a_range_is_bounded_from_above(int trials, double rate, double low, double high)
    {
        var assessment = new VarianceAssessment(Law.Bernoulli(rate), trials, new Band(low, high), dividedByTrialsLessOne: false, root: false);
        double[] counts = Enumerated.Sum([1 - rate, rate], trials);
        double red = Enumerated.Where(counts, count => count / (double)trials * (1 - count / (double)trials) is var variance && (variance < low || variance > high));

        Assert.True(assessment.FalseFailure.Upper >= red, $"{assessment.FalseFailure.Upper} < {red}");
        Assert.Equal(0, assessment.FalseFailure.Lower);
    }

    [Fact]
    public void The_difference_of_two_dice_is_enclosed()
    {
        double[] die = [.. Enumerable.Repeat(1 / 6.0, 6)];
        int cases = 0;
        foreach (int first in (int[])[5, 20])
        {
            foreach (int second in (int[])[5, 30])
            {
                double[] one = Enumerated.Sum(die, first), other = Enumerated.Sum(die, second);
                for (double half = 0.05; half < 2.5; half += 0.1037)
                {
                    double red = 0;
                    for (int i = 0; i < one.Length; i++)
                        red += one[i] * Enumerated.Where(other, j => Math.Abs((i + first) / (double)first - (j + second) / (double)second) > half);
                    var assessment = new DifferenceAssessment(Law.WholeNumbers(1, 6), first, Law.WholeNumbers(1, 6), second, new Band(-half, half));
                    Enumerated.Contains(assessment.FalseFailure, red, $"{first} against {second} dice within {half}");
                    cases++;
                }
            }
        }

        Assert.True(cases > 90, $"{cases} cases");
    }

    [Fact]
    public void The_difference_of_normal_means_is_normal()
    {
        var assessment = new DifferenceAssessment(Law.Normal(1, 2), 100, Law.Normal(1, 1), 25, new Band(-0.5, 0.5));
        double error = Math.Sqrt(4 / 100.0 + 1 / 25.0);

        Assert.Equal(1, assessment.FalseFailure.Upper / (2 * MathNet.Numerics.Distributions.Normal.CDF(0, error, -0.5)), 1e-9);
        Assert.True(MathNet.Numerics.Distributions.Normal.CDF(assessment.SmallestDefectCaught(0.99)!.Value, error, 0.5) <= 0.01 * (1 + 1e-6));
        double half = assessment.ToleranceAffordable(1e-6)!.Value;
        Assert.Equal(1, 2 * MathNet.Numerics.Distributions.Normal.CDF(0, error, -half) / 1e-6, 1e-5);
    }

    [Theory]
    [InlineData(10, 2.0)]
    [InlineData(50, 3.0)]
    [InlineData(1000, 3.29)]
    public void Standard_errors_that_are_estimated_are_Student(long trials, double errors)
    {
        var assessment = new StandardErrorsAssessment(Law.Normal(0, 3), trials, errors, estimated: true);

        Assert.Equal(1, assessment.FalseFailure.Upper / (2 * StudentT.CDF(0, 1, trials - 1, -errors)), 1e-8);
        Assert.Null(assessment.TrialsNeeded(1e-6));
        Assert.Throws<ArgumentException>(() => new StandardErrorsAssessment(Law.Exponential(1), trials, errors, estimated: true));
    }

    [Fact]
    public void Standard_errors_that_are_known_are_those_of_the_mean()
    {
        var assessment = new StandardErrorsAssessment(Law.Normal(5, 2), 400, 3, estimated: false);

        Assert.Equal(1, assessment.FalseFailure.Upper / (2 * MathNet.Numerics.Distributions.Normal.CDF(0, 1, -3)), 1e-8);
        Assert.Equal(0.3, assessment.ToleranceAffordable(2 * MathNet.Numerics.Distributions.Normal.CDF(0, 1, -3))!.Value, 1e-6);
    }

    [Fact]
    public void A_nominal_level_is_taken_at_its_word_and_says_so()
    {
        var assessment = new NominalAssessment(0.01, 20);

        Assert.True(assessment.IsApproximate);
        Assert.Equal((0.01, 0.2), (assessment.FalseFailure.Lower, assessment.FalseFailure.Upper) is var (low, high) ? (Math.Round(low, 12), high) : default);
        Assert.Equal(1, new NominalAssessment(0.5, 10).FalseFailure.Upper);
        Assert.Throws<ArgumentOutOfRangeException>(() => new NominalAssessment(double.NaN, 1));
    }
}
