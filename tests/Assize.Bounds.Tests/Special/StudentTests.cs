using MathNet.Numerics.Distributions;

namespace Assize.Bounds.Tests;

public class StudentTests
{
    // The documented accuracy.
    const double Accuracy = 5e-13;

    [Fact]
    public void The_tail_agrees_with_eighty_digits() => Assert.Empty(ReferenceTable.Misses(
        "student_t_tail", Accuracy, 212, row =>
    {
        var (degrees, point) = (row.Number("df"), row.Number("t"));
        double truth = row.Number("ln_sf");
        return Math.Max(
            ReferenceTable.LogError(Student.LogUpperTail(degrees, point), truth),
            truth < -690 ? 0 : ReferenceTable.RelativeError(Student.UpperTail(degrees, point), row.Number("sf")));
    }));

    [Fact]
    public void The_quantile_agrees_with_eighty_digits() => Assert.Empty(ReferenceTable.Misses(
        "student_t_quantile", Accuracy, 99, row =>
        ReferenceTable.RelativeError(Student.UpperQuantile(row.Number("df"), row.Number("upper_p")), row.Number("t"))));

    // Cauchy's law is Student's of one degree: P(T > t) = arctan(1/t)/π; that of two is ½ - t/(2√(2 + t²)).
    [Fact]
    public void One_and_two_degrees_of_freedom_have_formulas()
    {
        for (double point = 1e-6; point < 1e12; point *= 1.9)
        {
            double cauchy = Math.Atan(1 / point) / Math.PI;
            double root = Math.Sqrt(2 + point * point);
            double second = 1 / (root * (root + point));
            Assert.True(ReferenceTable.RelativeError(Student.UpperTail(1, point), cauchy) <= Accuracy, $"{point}");
            Assert.True(ReferenceTable.RelativeError(Student.UpperTail(2, point), second) <= Accuracy, $"{point}");
        }
    }

    // MathNet.Numerics 5.0.0 is off by 4.6e-12 itself at (6102.24…, 0.0235…), against 40 digits of mpmath.
    [Fact]
    public void Random_points_agree_with_an_independent_library()
    {
        var random = new Random(72);
        for (int i = 0; i < 5000; i++)
        {
            double degrees = Math.Exp(random.NextDouble() * Math.Log(1e3));
            double point = Math.Exp(random.NextDouble() * 8 - 5);
            double reference = StudentT.CDF(0, 1, degrees, -point);
            if (reference > 1e-250)
                Assert.True(ReferenceTable.RelativeError(Student.UpperTail(degrees, point), reference) < 1e-11,
                    $"{degrees:R} {point:R}");
        }
    }

    [Fact]
    public void Many_degrees_of_freedom_are_nearly_normal()
    {
        foreach (double point in new[] { 0.5, 1, 3, 6 })
            Assert.Equal(1, Student.UpperTail(1e12, point) / NormalTail.Upper(point), 1e-9);
    }

    [Fact]
    public void The_law_is_symmetric()
    {
        Assert.Equal(0.5, Student.UpperTail(3, 0), 1e-15);
        Assert.Equal(0, Student.UpperQuantile(3, 0.5));
        foreach (double point in new[] { 0.3, 1, 5, 100 })
        {
            Assert.Equal(1, Student.UpperTail(3, point) + Student.UpperTail(3, -point), 1e-15);
            Assert.Equal(Math.Log(Student.UpperTail(3, -point)), Student.LogUpperTail(3, -point), 1e-15);
        }

        Assert.Equal(-Student.UpperQuantile(3, 0.25), Student.UpperQuantile(3, 0.75));
    }

    [Fact]
    public void Both_sides_of_one_and_of_the_median_meet()
    {
        foreach (double degrees in new[] { 1, 2.5, 40, 1e6 })
        {
            Assert.Equal(1, Student.UpperTail(degrees, 1) / Student.UpperTail(degrees, Math.BitDecrement(1)), Accuracy);
            Assert.InRange(Student.UpperQuantile(degrees, 0.5 - 1e-9), 1e-9, 1e-8);
        }
    }

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        foreach (double degrees in new[] { double.NaN, 0.99, 1.01e12, double.PositiveInfinity })
        {
            Assert.Throws<ArgumentOutOfRangeException>("degrees", () => Student.UpperTail(degrees, 1));
            Assert.Throws<ArgumentOutOfRangeException>("degrees", () => Student.LogUpperTail(degrees, -1));
            Assert.Throws<ArgumentOutOfRangeException>("degrees", () => Student.UpperQuantile(degrees, 0.1));
        }

        foreach (double point in new[] { double.NaN, 1.01e150, double.NegativeInfinity })
        {
            Assert.Throws<ArgumentOutOfRangeException>("point", () => Student.UpperTail(2, point));
            Assert.Throws<ArgumentOutOfRangeException>("point", () => Student.LogUpperTail(2, point));
        }

        foreach (double probability in new[] { double.NaN, 0, 1, -0.1 })
            Assert.Throws<ArgumentOutOfRangeException>("probability", () => Student.UpperQuantile(2, probability));
    }
}
