namespace Assize.Bounds;

/// <summary>Sums and products with the part that rounding would lose.</summary>
static class Twofold
{
    // Splits a double into two halves of 26 bits: 2^27 + 1 (Veltkamp; Dekker, Numer. Math. 18 (1971) 224–242).
    const double Splitter = 134217729;

    public static (double Upper, double Lower) Product(double a, double b)
    {
        double product = a * b;
        double c = Splitter * a;
        double a1 = c - (c - a);
        double a2 = a - a1;
        c = Splitter * b;
        double b1 = c - (c - b);
        double b2 = b - b1;
        return (product, a2 * b2 - (product - a1 * b1 - a2 * b1 - a1 * b2));
    }
}
