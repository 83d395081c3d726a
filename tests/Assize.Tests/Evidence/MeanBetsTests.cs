namespace Assize.Tests.Evidence;

/// <summary>A bet is fair: whatever came before, its factor has mean 1 at most under its hypothesis, for the law in question
/// taken point by point.</summary>
public class MeanBetsTests
{
    const double Rounding = 1e-14;

    [Fact]
    public void Bets_on_a_range_are_fair_for_every_law_on_two_points_of_the_range()
    {
        int cases = 0;
        foreach (var (history, seed) in Histories())
        {
            foreach (var member in Members(0, 1, 0.3))
            {
                foreach (double low in (double[])[0, 0.1, 0.29])
                {
                    foreach (double high in (double[])[0.31, 0.6, 1])
                        cases += Fair(() => RangeBets.On([member], 0, 1, 0.25), history, member, low, high);
                }
            }
        }

        Assert.True(cases > 10_000, $"{cases} cases");
    }

    // Variance at most 1, the mean on the wrong side of the anchor or on it.
    [Fact]
    public void Bets_on_bounded_deviation_are_fair_for_every_law_on_two_points()
    {
        int cases = 0;
        foreach (var member in Members(-50, 50, 0.3))
        {
            foreach (double skew in (double[])[0.01, 0.02, 0.3, 1, 4, 50, 100])
            {
                foreach (double deviation in (double[])[0.05, 0.5, 1])
                {
                    foreach (double beyond in (double[])[0, 0.1, 1, 5, 30])
                    {
                        // Two points of this deviation and mean 0, with odds skew² : 1.
                        double high = deviation / skew, low = -deviation * skew;
                        double rate = skew * skew / (1 + skew * skew);
                        double shift = member.Anchor - member.Direction * beyond;
                        double mean = Mean(new DeviationBets([member], 1), rate, low + shift, high + shift);
                        Assert.True(mean <= 1 + 100 * Rounding, $"{member}, skew {skew}, deviation {deviation}, beyond {beyond}: {mean - 1}");
                        cases++;
                    }
                }
            }
        }

        Assert.True(cases > 400, $"{cases} cases");
    }

    [Fact]
    public void Bets_on_sub_gaussian_draws_are_fair_for_a_coin_and_cost_what_they_must()
    {
        foreach (var member in Members(-50, 50, 0.3))
        {
            var bets = new SubGaussianBets([member], 1);
            Assert.True(Mean(bets, 0.5, member.Anchor - 1, member.Anchor + 1) <= 1 + Rounding);
            Assert.True(Mean(bets, 0.5, member.Anchor - member.Direction - 1, member.Anchor - member.Direction + 1) <= 1);
        }
    }

    // Draws of 0 or more on two points, their mean square at most 1, the mean on the wrong side of the anchor or on it.
    [Fact]
    public void Bets_on_draws_that_are_never_negative_are_fair_for_every_law_on_two_points()
    {
        int cases = 0;
        foreach (var member in Members(0, 50, 0.3))
        {
            foreach (double low in (double[])[0, 0.05, 0.3, 0.6])
            {
                foreach (double high in (double[])[0.31, 0.7, 1, 3, 20])
                {
                    foreach (double rate in (double[])[0, 0.001, 0.01, 0.1, 0.3, 0.5, 0.9, 1])
                    {
                        double mean = low + rate * (high - low);
                        if (low * low + rate * (high * high - low * low) > 1 || (mean - member.Anchor) * member.Direction > 0)
                            continue;

                        Assert.True(Mean(new NonNegativeBets([member], 1), rate, low, high) <= 1 + Rounding, $"{member} {low} {high} {rate}");
                        cases++;
                    }
                }
            }
        }

        Assert.True(cases > 200, $"{cases} cases");
    }

    // The bets gain when the truth is where they say: a check that cannot fail would be no check.
    [Fact]
    public void Bets_win_where_they_are_right()
    {
        var member = new MeanMember(0.3, 1, 0.1, 1);

        Assert.True(Mean(RangeBets.On([member], 0, 1, 0.25), 0.4, 0, 1) > 1.01);
        Assert.True(Mean(new DeviationBets([member], 1), 0.5, -0.6, 1.4) > 1.005);
        Assert.True(Mean(new SubGaussianBets([member], 1), 0.5, -0.6, 1.4) > 1.005);
        Assert.True(Mean(new NonNegativeBets([member with { Direction = -1 }], 0.2), 0.5, 0, 0.4) > 1.005);
    }

    static int Fair(Func<MeanBets> fresh, double[] history, MeanMember member, double low, double high)
    {
        int cases = 0;
        for (double rate = 0; rate <= 1; rate += 0.125)
        {
            double mean = low + rate * (high - low);
            if (member.Direction > 0 ? mean > member.Anchor : mean < member.Anchor)
                continue;

            var bets = fresh();
            foreach (double draw in history)
                bets.Play(draw);
            Assert.True(Mean(bets, rate, low, high, history, fresh) <= 1 + Rounding, $"{member} {low} {high} {rate}");
            cases++;
        }

        return cases;
    }

    static double Mean(MeanBets bets, double rate, double low, double high) =>
        (1 - rate) * Factor(bets, low) + rate * Factor(bets, high);

    static double Mean(MeanBets bets, double rate, double low, double high, double[] history, Func<MeanBets> fresh)
    {
        double whenHigh = Factor(bets, high);
        var again = fresh();
        foreach (double draw in history)
            again.Play(draw);
        return rate * whenHigh + (1 - rate) * Factor(again, low);
    }

    // The two halves of a bet on a range count half each.
    static double Factor(MeanBets bets, double draw)
    {
        bets.Play(draw);
        return bets.Members.Select((member, i) => bets.Factors[i]).Average();
    }

    static IEnumerable<MeanMember> Members(double minimum, double maximum, double anchor) =>
        from direction in (int[])[1, -1]
        from gap in (double[])[0.001, 0.1, 0.6]
        where anchor + direction * gap >= minimum && anchor + direction * gap <= maximum
        select new MeanMember(anchor, direction, gap, 1);

    static IEnumerable<(double[] Draws, int Seed)> Histories()
    {
        yield return ([], 0);
        for (int seed = 1; seed <= 60; seed++)
        {
            var rng = new Random(seed);
            double width = rng.NextDouble();
            yield return ([.. Enumerable.Range(0, rng.Next(40)).Select(_ => rng.Next(3) == 0 ? rng.Next(2) : rng.NextDouble() * width)], seed);
        }
    }
}
