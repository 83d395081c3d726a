using Assize.Bounds;

namespace Assize.Tests.Claims;

public class OrdersClaimTests
{
    static int[] Shuffled(Random rng, int count)
    {
        int[] order = [.. Enumerable.Range(0, count)];
        rng.Shuffle(order);
        return order;
    }

    // Swapping every place with any place: 27 equally likely ways for 6 orders cannot be even (a well-known mistake).
    static int[] SwappedWithAny(Random rng, int count)
    {
        int[] order = [.. Enumerable.Range(0, count)];
        for (int place = 0; place < count; place++)
        {
            int other = rng.Next(count);
            (order[place], order[other]) = (order[other], order[place]);
        }

        return order;
    }

    [Theory]
    [InlineData(2, 0.01)]
    [InlineData(3, 0.005)]
    [InlineData(4, 0.004)]
    public void A_fair_shuffle_is_upheld(int count, double tolerance) =>
        Assert.Equal(Outcome.Upheld, Claim.EqualOrders(count, tolerance).Judge(rng => Shuffled(rng, count)).Outcome);

    [Fact]
    public void A_shuffle_that_swaps_any_two_is_refuted_and_its_orders_named()
    {
        // 4/27 and 5/27 of the draws, where 1/6 is claimed.
        string text = Claim.EqualOrders(3, tolerance: 0.005).Judge(rng => SwappedWithAny(rng, 3)).ToString();

        Assert.StartsWith("Claim refuted: each of the 6 orders of 3 things has a share of 0.1666666667, give or take 0.005 (caught from 0.01 away).", text, StringComparison.Ordinal);
        Assert.Matches(@"off          \[[012] [012] [012]\]: 0\.1[48]\d* \(", text);
    }

    [Fact]
    public void Both_promises_are_kept()
    {
        var claim = Claim.EqualOrders(3, tolerance: 0.05);
        int[] Favoured(Random rng, double mass) => rng.NextDouble() < mass ? [2, 0, 1] : Shuffled(rng, 3);

        Calibrated.Keeps(claim, loose => loose.Judge(rng => Favoured(rng, 0.06)), isRight: true);
        Calibrated.Keeps(claim, loose => loose.Judge(rng => Favoured(rng, 0.12)), isRight: false);
    }

    [Theory]
    [InlineData(0, 1)]
    [InlineData(0, 1, 1)]
    [InlineData(0, 1, 3)]
    [InlineData(0, 1, -1)]
    [InlineData(0, 1, 2, 3)]
    public void What_is_no_order_refutes_at_once(params int[] draw)
    {
        int trial = 0;
        var verdict = Claim.EqualOrders(3, tolerance: 0.01).Judge(rng => ++trial == 4 ? draw : [1, 0, 2]);

        Assert.Equal((Outcome.Refuted, 4L), (verdict.Outcome, verdict.Trials));
        Assert.Contains($"trial 4 drew [{string.Join(' ', draw)}], which is no order of 0 to 2", verdict.ToString(), StringComparison.Ordinal);
    }

    [Fact]
    public void Every_order_has_a_number_of_its_own()
    {
        for (int rank = 0; rank < 40_320; rank++)
        {
            int[] order = OrderRank.Unranked(rank, 8);
            Assert.Equal(rank, OrderRank.Of(order, 8));
            Assert.Equal(255, order.Aggregate(0, (seen, thing) => seen | 1 << thing));
        }
    }

    [Theory]
    [InlineData(1, 0.1, "EqualOrders is about 2 to 8 things; it is 1.")]
    [InlineData(9, 0.1, "EqualOrders is about 2 to 8 things; it is 9.")]
    [InlineData(3, -1, "The tolerance must be a distance of 0 or more; it is -1.")]
    public void Bad_numbers_are_refused(int count, double tolerance, string reason) => Assert.Contains(
        reason, Assert.Throws<ClaimRefusedException>(() => Claim.EqualOrders(count, tolerance)).Message, StringComparison.Ordinal);

    [Fact]
    public void A_tolerance_of_0_takes_a_defect()
    {
        Assert.Throws<ClaimRefusedException>(() => Claim.EqualOrders(3, 0).Plan());
        Assert.Equal(Outcome.Upheld, Claim.EqualOrders(3, 0).WithDefect(0.03).Judge(rng => Shuffled(rng, 3)).Outcome);
    }
}
