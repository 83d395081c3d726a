using System.Numerics;

namespace Assize.Bounds.Tests;

public class CharacteristicTests
{
    [Fact]
    public void A_turn_is_the_exponential_less_one()
    {
        var random = new Random(77);
        for (int i = 0; i < 10_000; i++)
        {
            double angle = (random.NextDouble() - 0.5) * 20;
            Assert.True((Characteristic.Turn(angle) - (Complex.Exp(new Complex(0, angle)) - 1)).Magnitude < 1e-15,
                $"{angle:R}");
        }
    }

    [Fact]
    public void A_small_turn_keeps_its_digits()
    {
        var turn = Characteristic.Turn(1e-9);
        Assert.Equal((-0.5, 1), (turn.Real / 1e-18, turn.Imaginary / 1e-9));
    }

    [Fact]
    public void The_logarithm_is_the_one_of_the_system()
    {
        var random = new Random(78);
        for (int i = 0; i < 10_000; i++)
        {
            var value = new Complex(random.NextDouble() * 2 - 1, random.NextDouble() * 2 - 1);
            Assert.True((Characteristic.LogOnePlus(value) - Complex.Log(1 + value)).Magnitude < 2e-14, $"{value}");
        }
    }

    [Fact]
    public void The_logarithm_of_nothing_is_negative_infinity() =>
        Assert.Equal(double.NegativeInfinity, Characteristic.LogOnePlus(-1).Real);

    [Fact]
    public void A_small_value_is_nearly_its_own_logarithm() =>
        Assert.Equal(new Complex(1e-20, -3e-15), Characteristic.LogOnePlus(new Complex(1e-20 - 4.5e-30, -3e-15)));
}
