namespace Assize.Bounds.Tests;

public class RatePlanTests
{
    // The table's alpha, beta, p0 and tol are exact decimals; plans take them as the author would write them.
    [Fact]
    public void Every_plan_of_the_exhaustive_search_is_reproduced()
    {
        var seen = new Dictionary<string, int> { ["two_sided"] = 0, ["two_sided_drop"] = 0, ["at_least"] = 0, ["at_most"] = 0 };
        foreach (var row in ReferenceTable.Rows("fixed_plan_binomial"))
        {
            if (EdgesOf(row) is not { } edges)
                continue;

            var plan = RatePlan.For(edges, row.Number("alpha"), (double)(1 - row.Decimal("beta")));

            Assert.True(
                (plan.FirstTrials, plan.Trials) == (row.Whole("n_first"), row.Whole("n_all")), $"{row}: {plan.FirstTrials}, {plan.Trials}");
            AssertLimits(row, plan.Limits, "lo_all", "hi_all");
            AssertLimits(row, plan.LimitsAt(plan.FirstTrials), "lo", "hi");
            AssertErrors(row, plan.LimitsAt(plan.FirstTrials));
            Assert.True(plan.Limits.MeetsBoth);
            if (plan.FirstTrials > 1)
                Assert.False(plan.LimitsAt(plan.FirstTrials - 1).MeetsBoth);
            if (plan.Trials > plan.FirstTrials)
                Assert.False(plan.LimitsAt(plan.Trials - 1).MeetsBoth);

            seen[row.Text("kind")]++;
        }

        // 7 of the 63 two-sided rows have a defect outside [0, 1].
        Assert.Equal((56, 7, 63, 63), (seen["two_sided"], seen["two_sided_drop"], seen["at_least"], seen["at_most"]));
    }

    static Edges? EdgesOf(ReferenceTable.Row row)
    {
        var (target, defect) = (row.Decimal("p0"), row.Decimal("tol"));
        return row.Text("kind") switch
        {
            // The table clips a one-sided alternative to the rim.
            "at_least" => Edges.AtLeast(Domain.Rate, (double)target, (double)Math.Min(defect, target)),
            "at_most" => Edges.AtMost(Domain.Rate, (double)target, (double)Math.Min(defect, 1 - target)),
            "two_sided" when target < defect || target + defect > 1 => null,
            _ => Edges.Around(Domain.Rate, (double)target, 0, (double)defect),
        };
    }

    static void AssertLimits(ReferenceTable.Row row, RateLimits limits, string low, string high)
    {
        if (row.Text("kind") != "at_most")
            Assert.True(limits.AcceptLow == row.Whole(low), $"{row}: {limits.AcceptLow}");
        if (row.Text("kind") != "at_least")
            Assert.True(limits.AcceptHigh == row.Whole(high), $"{row}: {limits.AcceptHigh}");
    }

    // The doubles nearest to the decimals are other rates: with millions of trials that shows in the ninth digit.
    static void AssertErrors(ReferenceTable.Row row, RateLimits limits)
    {
        double below = row.Has("p_below_lo") ? row.Number("p_below_lo") : 0;
        double above = row.Has("p_above_hi") ? row.Number("p_above_hi") : 0;
        double missed = Math.Max(
            row.Has("miss_minus") ? row.Number("miss_minus") : 0, row.Has("miss_plus") ? row.Number("miss_plus") : 0);
        AssertNear(row, below + above, limits.FalseFailure);
        AssertNear(row, missed, limits.MissedDefect);
    }

    static void AssertNear(ReferenceTable.Row row, double truth, Enclosure enclosure) => Assert.True(
        enclosure.Lower * (1 - 1e-8) <= truth && truth <= enclosure.Upper * (1 + 1e-8), $"{row}: {enclosure} does not hold {truth:R}");

    // Brute force in whole numbers: dyadic rates keep them short.
    [Theory]
    [InlineData(null, null, 16, 24, 0.05, 0.9)]
    [InlineData(null, null, 4, 12, 0.01, 0.95)]
    [InlineData(null, null, 56, 62, 0.05, 0.9)]
    [InlineData(16, 24, null, null, 0.05, 0.9)]
    [InlineData(2, 8, null, null, 0.02, 0.8)]
    [InlineData(50, 60, null, null, 0.05, 0.9)]
    [InlineData(22, 32, 32, 42, 0.05, 0.9)]
    [InlineData(20, 30, 34, 44, 0.1, 0.7)]
    [InlineData(16, 32, 40, 60, 0.3, 0.6)]
    [InlineData(24, 32, 32, 56, 0.2, 0.9)]
    [InlineData(null, 8, 8, 16, 0.05, 0.9)]
    [InlineData(44, 54, 58, null, 0.05, 0.9)]
    [InlineData(0, 16, 20, 36, 0.01, 0.99)]
    public void Small_plans_are_exactly_the_brute_force_ones(
        int? lowerDefect, int? lower, int? upper, int? upperDefect, double risk, double confidence)
    {
        var edges = Of(lowerDefect, lower, upper, upperDefect);
        var plan = RatePlan.For(edges, risk, confidence);
        int most = (int)(3 * plan.Trials);
        double miss = (double)(1 - (decimal)confidence);
        bool[] works = [.. Enumerable.Range(1, most).Select(trials => WorksExactly(edges, risk, miss, trials))];

        Assert.Equal(Array.IndexOf(works, true) + 1, plan.FirstTrials);
        Assert.Equal(Array.LastIndexOf(works, false) + 2, plan.Trials);
        Assert.All(
            Enumerable.Range(1, most), trials => Assert.Equal(works[trials - 1], plan.LimitsAt(trials).MeetsBoth));
    }

    // Edges of sixty-fourths; asymmetric ones are laid around a target that lies between them.
    static Edges Of(int? lowerDefect, int? lower, int? upper, int? upperDefect)
    {
        if (upper is null)
            return Edges.AtLeast(Domain.Rate, lower!.Value / 64.0, (lower.Value - lowerDefect!.Value) / 64.0);
        if (lower is null)
            return Edges.AtMost(Domain.Rate, upper.Value / 64.0, (upperDefect!.Value - upper.Value) / 64.0);

        return Edges.Between(
            Domain.Rate, (lower.Value + upper.Value) / 128.0,
            lowerDefect / 64.0, lower.Value / 64.0, upper.Value / 64.0, upperDefect / 64.0);
    }

    static bool WorksExactly(Edges edges, double risk, double miss, int trials)
    {
        double share = edges.LowerEdge is null || edges.UpperEdge is null ? risk : risk / 2;
        long low = 0;
        long high = trials;
        if (edges.LowerEdge is { } lower)
        {
            var exact = new ExactBinomial(trials, lower);
            while (exact.CompareAtMost(low, share) <= 0)
                low++;
        }

        if (edges.UpperEdge is { } upper)
        {
            var exact = new ExactBinomial(trials, upper);
            while (exact.CompareAtLeast(high, share) <= 0)
                high--;
        }

        return new[] { edges.LowerDefect, edges.UpperDefect }.OfType<double>()
            .All(defect => new ExactBinomial(trials, defect).CompareBetween(low, high, miss) <= 0);
    }

    [Fact]
    public void The_search_skips_nothing_that_a_full_scan_finds()
    {
        var random = new Random(61);
        int claims = 0, largest = 0;
        while (claims < 150)
        {
            if (RandomEdges(random) is not { } edges)
                continue;

            double risk = Math.Pow(10, -0.3 - 5 * random.NextDouble());
            double confidence = Math.Round(1 - Math.Pow(10, -0.2 - 3 * random.NextDouble()), 6);
            if (confidence <= risk)
                continue;

            var plan = RatePlan.For(edges, risk, confidence);
            if (plan.Trials > 4000)
                continue;

            var all = Enumerable.Range(1, (int)(1.6 * plan.Trials) + 20);
            bool[] works = [.. all.Select(trials => plan.LimitsAt(trials).MeetsBoth)];
            var (first, from) = (Array.IndexOf(works, true) + 1, Array.LastIndexOf(works, false) + 2);
            Assert.True(
                (first, from) == (plan.FirstTrials, plan.Trials),
                $"{edges} {risk:R} {confidence:R}: {first}, {from} against {plan.FirstTrials}, {plan.Trials}");
            largest = Math.Max(largest, (int)plan.Trials);
            claims++;
        }

        Assert.True(largest > 1000, $"largest plan {largest}");
    }

    static Edges? RandomEdges(Random random)
    {
        double target = Math.Round(Math.Pow(10, -3 * random.NextDouble()) * 0.95, 4);
        target = random.Next(2) == 0 ? target : 1 - target;
        double tolerance = random.Next(2) == 0 ? 0 : Math.Round(random.NextDouble() * 0.1, 3);
        double defect = Math.Round(tolerance + 0.02 + 0.4 * random.NextDouble(), 3);
        try
        {
            return random.Next(3) switch
            {
                0 => Edges.AtLeast(Domain.Rate, target, defect),
                1 => Edges.AtMost(Domain.Rate, target, defect),
                _ => Edges.Around(Domain.Rate, target, tolerance, defect),
            };
        }
        catch (ClaimRefusedException)
        {
            return null;
        }
    }

    // NIST/SEMATECH e-Handbook of Statistical Methods, 7.2.4.3 (from memory): 0.1 against 0.2 at 5 % and 10 %, 109
    // items, at most 16.
    [Fact]
    public void The_smallest_plan_of_a_handbook_example_is_found()
    {
        var plan = RatePlan.For(Edges.AtMost(Domain.Rate, 0.1, 0.1), risk: 0.05, confidence: 0.9);

        Assert.Equal((109, 16), (plan.FirstTrials, plan.LimitsAt(109).AcceptHigh));
        Assert.True(plan.LimitsAt(109).Accept(16));
        Assert.False(plan.LimitsAt(109).Accept(17));
    }

    [Theory]
    [InlineData(0.5, 1e-10, 2562)]
    [InlineData(0.01, 1e-10, 14113)]
    public void A_reserved_tenth_of_the_default_risk_sizes_as_the_exhaustive_search_did(
        double target, double risk, long first)
    {
        var edges = target == 0.5 ? Edges.Around(Domain.Rate, 0.5, 0, 0.1) : Edges.AtMost(Domain.Rate, target, 0.01);

        Assert.Equal(first, RatePlan.For(edges, risk, 0.9999).FirstTrials);
    }

    [Fact]
    public void Successes_and_failures_are_the_same_claim_turned_over()
    {
        int seen = 0;
        foreach (double target in new[] { 0.25, 0.03125, 0.0009765625, 0.5 })
        {
            foreach (double defect in new[] { target / 2, target / 4 })
            {
                var low = RatePlan.For(Edges.AtLeast(Domain.Rate, target, defect), 1e-6, 0.999);
                var high = RatePlan.For(Edges.AtMost(Domain.Rate, 1 - target, defect), 1e-6, 0.999);
                Assert.Equal((low.FirstTrials, low.Trials), (high.FirstTrials, high.Trials));
                Assert.Equal(low.Trials - low.Limits.AcceptLow, high.Limits.AcceptHigh);
                seen++;
            }
        }

        Assert.Equal(8, seen);
    }

    [Fact]
    public void Rare_and_near_certain_rates_are_planned()
    {
        var rare = RatePlan.For(Edges.AtMost(Domain.Rate, 1e-9, 1e-9), 1e-9, 0.999);
        var sure = RatePlan.For(Edges.AtLeast(Domain.Rate, 0.999999999, 1e-9), 1e-9, 0.999);

        // The double nearest to 0.999999999 is 1e-17 off: 1e-8 of the rate of failures.
        Assert.Equal(1, (double)sure.Trials / rare.Trials, 1e-6);
        Assert.True(rare.Limits.MeetsBoth);
        Assert.InRange(rare.Trials, 1e11, 2e11);
    }

    [Fact]
    public void A_smaller_risk_or_a_greater_confidence_never_takes_fewer_trials()
    {
        var edges = Edges.Around(Domain.Rate, 0.3, 0.02, 0.06);
        long previous = 0;
        foreach (double risk in new[] { 0.1, 1e-2, 1e-3, 1e-6, 1e-12, 1e-100, 1e-300 })
        {
            long trials = RatePlan.For(edges, risk, 0.99).Trials;
            Assert.True(trials > previous, $"{risk}");
            previous = trials;
        }
    }

    // With a great risk, two-sided, too many numbers are doubtful for all of them to be looked at.
    [Theory]
    [InlineData(2.9594655400874337e-08, 2.0205676231846425e-07, 0.5386627598494425, 0.999972011195705)]
    [InlineData(0.5, 1e-3, 0.2, 0.7)]
    [InlineData(2.590314183439863e-07, 5.085908680399367e-09, 0.367231758468732, 0.8897117243572245)]
    [InlineData(0.01, 1e-5, 1e-9, 0.999)]
    public void Huge_plans_hold_for_every_larger_number_looked_at(double target, double defect, double risk, double confidence)
    {
        var plan = RatePlan.For(Edges.Around(Domain.Rate, target, 0, defect), risk, confidence);
        var random = new Random(5);

        Assert.InRange(plan.FirstTrials, 1, plan.Trials);
        Assert.True(plan.LimitsAt(plan.FirstTrials).MeetsBoth);
        Assert.True(plan.Limits.MeetsBoth);
        for (int i = 0; i < 400; i++)
        {
            long more = plan.Trials + (long)(plan.Trials * Math.Pow(10, -8 * random.NextDouble()));
            Assert.True(plan.LimitsAt(more).MeetsBoth, $"{more}");
        }
    }

    [Fact]
    public void A_rate_of_zero_is_upheld_by_no_success_and_refuted_by_one()
    {
        var plan = RatePlan.For(Edges.AtMost(Domain.Rate, 0, 0.001), 1e-9, 0.999);

        Assert.Equal((6905, 6905), (plan.FirstTrials, plan.Trials));
        Assert.Equal((0, 0, 0), (plan.Limits.AcceptLow, plan.Limits.AcceptHigh, plan.Limits.FalseFailure.Upper));
        Assert.Equal(plan.Trials, ZeroFailures.TrialsNeeded(0.001, plan.Miss));
    }

    [Fact]
    public void Limits_below_the_plan_say_that_they_do_not_meet_it()
    {
        var plan = RatePlan.For(Edges.Around(Domain.Rate, 0.5, 0, 0.1), 1e-6, 0.999);
        var limits = plan.LimitsAt(100);

        Assert.False(limits.MeetsBoth);
        Assert.True(limits.FalseFailure.Upper <= 1e-6);
        Assert.True(limits.MissedDefect.Lower > 0.001);
        Assert.Throws<ArgumentOutOfRangeException>(() => plan.LimitsAt(0));
        Assert.Throws<ArgumentOutOfRangeException>(() => plan.LimitsAt(RatePlan.MaximumTrials + 1));
    }

    [Fact]
    public void The_miss_is_taken_in_decimal()
    {
        Assert.Equal(0.001, RatePlan.For(Edges.AtMost(Domain.Rate, 0.1, 0.1), 1e-9, 0.999).Miss);
        Assert.Equal(1e-12, RatePlan.For(Edges.AtMost(Domain.Rate, 0.1, 0.1), 1e-9, 0.999999999999).Miss);
    }

    [Theory]
    [InlineData(0, 0.999, "risk", "0")]
    [InlineData(1, 0.999, "risk", "1")]
    [InlineData(1e-301, 0.999, "risk", "1E-301")]
    [InlineData(-1, 0.999, "risk", "-1")]
    [InlineData(double.NaN, 0.999, "risk", "NaN")]
    [InlineData(1e-9, 0, "confidence", "0")]
    [InlineData(1e-9, 1, "confidence", "1")]
    [InlineData(1e-9, double.NaN, "confidence", "NaN")]
    [InlineData(0.5, 0.4, "greater than the risk", "0.4")]
    public void Nonsense_is_refused_by_name_and_value(double risk, double confidence, string name, string value)
    {
        var edges = Edges.Around(Domain.Rate, 0.5, 0, 0.1);
        string message = Assert.Throws<ClaimRefusedException>(() => RatePlan.For(edges, risk, confidence)).Message;

        Assert.Contains(name, message, StringComparison.Ordinal);
        Assert.Contains(value, message, StringComparison.Ordinal);
    }

    [Fact]
    public void Claims_that_no_machine_could_judge_are_refused()
    {
        var edges = Edges.Around(Domain.Rate, 0.5, 0, 1e-8);
        Assert.Contains(
            "1e15", Assert.Throws<ClaimRefusedException>(() => RatePlan.For(edges, 1e-9, 0.999)).Message, StringComparison.Ordinal);
        Assert.Throws<ClaimRefusedException>(() => RatePlan.For(Edges.Around(Domain.Any, 0, 0, 0.1), 1e-9, 0.999));
        Assert.Throws<ArgumentNullException>(() => RatePlan.For(null!, 1e-9, 0.999));
    }
}
