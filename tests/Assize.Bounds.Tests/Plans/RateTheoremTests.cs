namespace Assize.Bounds.Tests;

public class RateTheoremTests
{
    static readonly (string Claim, Edges Edges, double Risk, double Confidence)[] Claims =
    [
        ("half", Edges.Around(Domain.Rate, 0.5, 0, 0.1), 1e-6, 0.999),
        ("common", Edges.Around(Domain.Rate, 0.5, 0, 0.1), 0.05, 0.9),
        ("rare", Edges.AtMost(Domain.Rate, 0.01, 0.02), 0.1, 0.9),
        ("tolerant", Edges.Around(Domain.Rate, 0.3, 0.05, 0.15), 0.05, 0.9),
        ("dropped", Edges.Around(Domain.Rate, 0.05, 0, 0.2), 0.1, 0.9),
    ];

    [Fact]
    public void Every_theorem_of_rates_is_listed_once_with_the_fewest_trials_first()
    {
        var theorems = RatePlan.For(Edges.Around(Domain.Rate, 0.5, 0, 0.1), 1e-6, 0.999).Theorems;

        Assert.Equal(
            ["exact binomial", "tilted Berry–Esseen", "Hoeffding", "Berry–Esseen"],
            theorems.Select(theorem => theorem.Name));
        Assert.All(theorems, theorem => Assert.NotEmpty(theorem.Assumes));
    }

    [Fact]
    public void The_theorem_that_decided_is_the_one_with_the_fewest_trials()
    {
        foreach (var (_, edges, risk, confidence) in Claims)
        {
            var plan = RatePlan.For(edges, risk, confidence);
            Assert.Equal((plan.Theorem, plan.Trials), (plan.Theorems[0].Name, plan.Theorems[0].Trials));
        }
    }

    // Whatever a theorem claims must be true of the exact plan: from its number on everything works.
    [Fact]
    public void No_theorem_asks_for_fewer_trials_than_are_needed()
    {
        int seen = 0;
        foreach (var (claim, edges, risk, confidence) in Claims)
        {
            var plan = RatePlan.For(edges, risk, confidence);
            foreach (var theorem in plan.Theorems.Where(theorem => theorem.Trials is < 1_000_000_000_000))
            {
                Assert.True(theorem.Trials >= plan.Trials, $"{claim} {theorem}");
                Assert.True(plan.LimitsAt(theorem.Trials!.Value).MeetsBoth, $"{claim} {theorem}");
                seen++;
            }
        }

        Assert.Equal(20, seen);
    }

    // The same search in 80 digits: columns n_chernoff_kl 2,044 and n_berry_esseen 879,844,000,001 of its table for
    // .5, .1, 1e-6, 1e-3.
    [Fact]
    public void Chernoff_and_plain_Berry_Esseen_sizes_agree_with_an_independent_computation()
    {
        var theorems = RatePlan.For(Edges.Around(Domain.Rate, 0.5, 0, 0.1), 1e-6, 0.999).Theorems;

        Assert.Equal(2_044, theorems.Single(theorem => theorem.Name == "Hoeffding").Trials);
        Assert.Equal(
            1, theorems.Single(theorem => theorem.Name == "Berry–Esseen").Trials!.Value / 879_844_000_001.0, 1e-6);
    }

    [Fact]
    public void A_theorem_that_would_need_too_many_trials_or_cannot_answer_says_null()
    {
        var tiny = RatePlan.For(Edges.Around(Domain.Rate, 0.5, 0, 0.1), 1e-12, 0.999).Theorems;
        var zero = RatePlan.For(Edges.AtMost(Domain.Rate, 0, 0.01), 1e-9, 0.999).Theorems;

        Assert.Null(tiny.Single(theorem => theorem.Name == "Berry–Esseen").Trials);
        Assert.Null(zero.Single(theorem => theorem.Name == "Berry–Esseen").Trials);
        Assert.Null(zero.Single(theorem => theorem.Name == "tilted Berry–Esseen").Trials);
        Assert.Equal(688, zero.Single(theorem => theorem.Name == "Hoeffding").Trials);
    }
}
