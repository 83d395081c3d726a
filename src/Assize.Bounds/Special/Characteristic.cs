using System.Numerics;

namespace Assize.Bounds;

/// <summary>Logarithms of characteristic functions, from what is left of them when 1 is taken off.</summary>
static class Characteristic
{
    /// <summary>e^(i·angle) - 1 without cancellation.</summary>
    public static Complex Turn(double angle)
    {
        double half = Trigonometry.Sine(angle / 2);
        return new Complex(-2 * half * half, Trigonometry.Sine(angle));
    }

    /// <summary>ln(1 + value); where 1 + value is 0, a real part of negative infinity.</summary>
    public static Complex LogOnePlus(Complex value)
    {
        double real = 1 + value.Real;
        double square = value.Real * (2 + value.Real) + value.Imaginary * value.Imaginary;
        double logarithm = square < -0.5
            ? Elementary.Log(real * real + value.Imaginary * value.Imaginary)
            : Elementary.LogOnePlus(square);
        return new Complex(0.5 * logarithm, Trigonometry.Angle(value.Imaginary, real));
    }
}
