namespace Assize.Bounds.Tests;

public class IntegerSearchTests
{
    [Fact]
    public void The_first_number_is_found_from_every_guess()
    {
        int seen = 0;
        for (long first = 3; first <= 41; first++)
        {
            for (long guess = -5; guess <= 50; guess++)
            {
                Assert.Equal(first, IntegerSearch.First(3, 40, guess, n => n >= first));
                seen++;
            }
        }

        Assert.Equal(39 * 56, seen);
    }

    [Fact]
    public void A_near_guess_is_cheap_in_a_huge_range()
    {
        int asked = 0;
        long found = IntegerSearch.First(1, 1L << 52, 1_000_000_007, n =>
        {
            asked++;
            return n >= 1_000_000_000;
        });

        Assert.Equal(1_000_000_000, found);
        Assert.True(asked <= 8, $"{asked} questions");
    }

    [Fact]
    public void An_empty_range_is_past_at_once() =>
        Assert.Equal(6, IntegerSearch.First(7, 5, 6, _ => throw new InvalidOperationException()));
}
