namespace Assize.Bounds.Tests;

public class TrigonometryTests
{
    // The documented accuracy, and the system's own half unit in the last place.
    const double Accuracy = 4e-16;

    [Fact]
    public void It_agrees_with_the_system()
    {
        var random = new Random(76);
        for (int i = 0; i < 100_000; i++)
        {
            double angle = (random.NextDouble() - 0.5) * Math.Exp(random.NextDouble() * 40 - 24);
            Assert.Equal(Math.Sin(angle), Trigonometry.Sine(angle), Accuracy * Math.Min(1, Math.Abs(angle)));
            Assert.Equal(Math.Cos(angle), Trigonometry.Cosine(angle), Accuracy);
            double x = random.NextDouble() - 0.5, y = (random.NextDouble() - 0.5) * Math.Exp(-30 * random.NextDouble());
            double expected = Math.Atan2(y, x);
            Assert.Equal(expected, Trigonometry.Angle(y, x), 2 * Accuracy * Math.Abs(expected));
        }
    }

    [Fact]
    public void Quarters_of_the_circle_meet()
    {
        for (int quarters = -9; quarters <= 9; quarters++)
        {
            foreach (double offset in new[] { -Math.PI / 4, -1e-9, 0, 1e-9, Math.PI / 4 })
            {
                double angle = quarters * (Math.PI / 2) + offset;
                Assert.Equal(Math.Sin(angle), Trigonometry.Sine(angle), Accuracy);
                Assert.Equal(Math.Cos(angle), Trigonometry.Cosine(angle), Accuracy);
            }
        }
    }

    [Fact]
    public void Axes_and_the_origin_are_exact()
    {
        Assert.Equal((0, 1), (Trigonometry.Sine(0), Trigonometry.Cosine(0)));
        Assert.Equal((0, 0), (Trigonometry.Angle(0, 0), Trigonometry.Angle(0, 3)));
        Assert.Equal((Math.PI / 2, -Math.PI / 2), (Trigonometry.Angle(2, 0), Trigonometry.Angle(-2, 0)));
        Assert.Equal(Math.PI, Trigonometry.Angle(0, -1));
    }

    [Fact]
    public void Angles_outside_the_domain_are_refused()
    {
        foreach (double angle in new[] { double.NaN, 1.01e7, double.NegativeInfinity })
        {
            Assert.Throws<ArgumentOutOfRangeException>("angle", () => Trigonometry.Sine(angle));
            Assert.Throws<ArgumentOutOfRangeException>("angle", () => Trigonometry.Cosine(angle));
        }
    }
}
