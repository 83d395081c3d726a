namespace Assize.Bounds.Tests;

public class AffineTests
{
    static readonly (double Value,
        double Weight)[] Die = [.. Enumerable.Range(1, 6).Select(side => ((double)side, 1.0))];

    [Theory]
    [InlineData(2, 3)]
    [InlineData(-1, 0)]
    [InlineData(-0.25, 10)]
    public void Images_have_the_moments_of_scaled_and_shifted_values(double scale, double shift)
    {
        var image = Law.WholeNumbers(1, 6).Image(scale, shift);
        (double Value, double Weight)[] masses = [.. Die.Select(mass => (scale * mass.Value + shift, mass.Weight))];

        LawContract.AgreesWithSums(image, masses, 1e-14, 0.01, 1, -2);
        Assert.Equal((masses.Min(mass => mass.Value), masses.Max(mass => mass.Value)), (image.Minimum, image.Maximum));
        LawContract.TiltsConsistently(image, 0.4, -1, 0);
    }

    [Theory]
    [InlineData(2, 3)]
    [InlineData(-3, 1)]
    public void Images_of_a_lattice_turn_on_theirs(double scale, double shift)
    {
        (double Value, double Weight)[] masses = [.. Die.Select(mass => (scale * mass.Value + shift, mass.Weight))];

        LawContract.TurnsOnItsLattice(
            Law.WholeNumbers(1, 6).Image(scale, shift), masses, scale + shift, Math.Abs(scale));
    }

    [Fact]
    public void Images_of_a_law_without_a_lattice_have_none() =>
        Assert.Null(((ILattice)Law.Uniform(0, 1).Image(2, 0)).Step);

    [Fact]
    public void Ends_change_places_where_the_scale_is_negative()
    {
        var image = Law.Exponential(1).Image(-2, 5);

        Assert.Equal((double.NegativeInfinity, 5), (image.Minimum, image.Maximum));
        Assert.Equal(double.PositiveInfinity, image.LogMoment(-0.5));
    }

    [Fact]
    public void Arguments_outside_the_domain_are_refused()
    {
        foreach (double scale in new[] { double.NaN, 0, 1e-101, 1.01e100, double.NegativeInfinity })
            Assert.Throws<ArgumentOutOfRangeException>("scale", () => Law.Uniform(0, 1).Image(scale, 0));
        foreach (double shift in new[] { double.NaN, 1.01e100, double.NegativeInfinity })
            Assert.Throws<ArgumentOutOfRangeException>("shift", () => Law.Uniform(0, 1).Image(1, shift));
        Assert.Throws<ArgumentOutOfRangeException>("scale", () => Law.Normal(0, 1e90).Image(1e50, 0));
        LawContract.RefusesTiltsWithoutALaw(Law.Exponential(1).Image(2, 0), 0.5, double.PositiveInfinity);
    }
}
