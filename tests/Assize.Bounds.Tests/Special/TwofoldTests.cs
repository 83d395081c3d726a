using System.Numerics;

namespace Assize.Bounds.Tests;

public class TwofoldTests
{
    // A double below 2^53 times 2^53 is whole: the product of two is compared in whole numbers.
    [Fact]
    public void Both_parts_together_are_the_exact_product()
    {
        var random = new Random(12);
        for (int i = 0; i < 20_000; i++)
        {
            double count = random.NextInt64(1, 1L << 50);
            double rate = random.NextInt64(1, 1L << 53) / 9007199254740992.0;
            var (upper, lower) = Twofold.Product(count, rate);
            var exact = new BigInteger(count) * new BigInteger(rate * 9007199254740992);

            Assert.Equal(exact, new BigInteger(upper * 9007199254740992) + new BigInteger(lower * 9007199254740992));
            Assert.Equal(count * rate, upper);
        }
    }
}
