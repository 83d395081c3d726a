using Assize.Bounds;

namespace Assize.Tests.Evidence;

/// <summary>Whole races of means at risk 0.05 and confidence 0.95 against both promises.</summary>
/// <remarks>
/// 2,000 repetitions of each row from literal seeds. A promise of 0.05 is held against the count that a true 0.05 exceeds
/// with probability 1e-11: over all rows this is red on right code with probability 1e-9 at most.
/// </remarks>
public class MeanRaceTests
{
    const int Repetitions = 2_000;
    const double FalseAlarm = 1e-11;

    static readonly Dictionary<string, Func<Random, double, double>> Laws = new()
    {
        ["yes or no"] = (rng, mean) => rng.NextDouble() < mean ? 1 : 0,
        ["uniform"] = (rng, mean) => mean + (rng.NextDouble() - 0.5) * 0.34641016,
        ["rarely 1"] = RarelyOne,
        ["rarely 0"] = (rng, mean) => 1 - RarelyOne(rng, 1 - mean),
        ["exponential"] = (rng, mean) => mean - 1 - Math.Log(1 - rng.NextDouble()),
        ["mirrored exponential"] = (rng, mean) => mean + 1 + Math.Log(1 - rng.NextDouble()),
        ["far atom"] = (rng, mean) => mean + (rng.NextDouble() < 1 / 901.0 ? 30 - 30 / 901.0 : -30 / 901.0),
        ["two points"] = (rng, mean) => mean + (rng.Next(2) == 0 ? 1 : -1),
    };

    // Truth: at the target, at the tolerance, at the defect, at twice the defect.
    [Theory]
    [InlineData("yes or no")]
    [InlineData("uniform")]
    [InlineData("rarely 1")]
    [InlineData("rarely 0")]
    public void Draws_in_a_range_keep_both_promises(string law) =>
        KeepBoth(Stakes(Edges.Around(new Domain(0, 1), 0.5, 0.05, 0.1), MeanFacts.None.Between(0, 1)), Laws[law], 0.5, 0.05);

    [Theory]
    [InlineData("exponential")]
    [InlineData("mirrored exponential")]
    [InlineData("far atom")]
    [InlineData("two points")]
    public void Draws_of_bounded_deviation_keep_both_promises(string law) =>
        KeepBoth(Stakes(Edges.Around(Domain.Any, 0, 0.2, 0.4), MeanFacts.None.DeviatingAtMost(1)), Laws[law], 0, 0.2);

    [Theory]
    [InlineData("two points")]
    public void Sub_gaussian_draws_keep_both_promises(string law) =>
        KeepBoth(Stakes(Edges.Around(Domain.Any, 0, 0.2, 0.4), MeanFacts.None.SubGaussian(1)), Laws[law], 0, 0.2);

    // Exponential of mean 1 has a mean square of 2; at 1.2 and at the defects below it is less than 4.
    [Fact]
    public void Draws_that_are_never_negative_keep_both_promises()
    {
        var stakes = Stakes(Edges.Around(new Domain(0, double.PositiveInfinity), 1, 0.1, 0.2), MeanFacts.None.NonNegative(4));

        KeepBoth(stakes, (rng, mean) => -mean * Math.Log(1 - rng.NextDouble()), 1, 0.1);
    }

    // Means of an independent simulation of the same specification (20,000 repetitions); two such runs agree within 5 % here.
    [Theory]
    [InlineData("yes or no", 0.5, 256)]
    [InlineData("yes or no", 0.6, 805)]
    [InlineData("uniform", 0.55, 47.5)]
    [InlineData("rarely 1", 0.575, 213)]
    [InlineData("rarely 0", 0.6, 178)]
    public void Races_in_a_range_are_as_long_as_specified(string law, double truth, double trials)
    {
        var stakes = Stakes(Edges.Around(new Domain(0, 1), 0.5, 0.05, 0.1), MeanFacts.None.Between(0, 1));

        Assert.InRange(Run(stakes, Laws[law], truth).MeanTrials, 0.93 * trials, 1.07 * trials);
    }

    [Theory]
    [InlineData("exponential", 0, 63.8)]
    [InlineData("exponential", 0.4, 200)]
    [InlineData("far atom", 0.3, 295)]
    public void Races_of_bounded_deviation_are_as_long_as_specified(string law, double truth, double trials)
    {
        var stakes = Stakes(Edges.Around(Domain.Any, 0, 0.2, 0.4), MeanFacts.None.DeviatingAtMost(1));

        Assert.InRange(Run(stakes, Laws[law], truth).MeanTrials, 0.93 * trials, 1.07 * trials);
        Assert.Equal(1152, stakes.Cap().Trials);
    }

    // The grey zone would take the range plan's million trials; the looks at the average end it.
    [Fact]
    public void A_narrow_law_between_tolerance_and_defect_is_decided_long_before_the_range_plan()
    {
        var stakes = MeanStakes.Of(MeanPlan.For(
            Edges.Around(new Domain(0, 1), 0.5, 0, 0.005), MeanFacts.None.Between(0, 1), 1e-9, 0.999));
        var race = new MeanRace(stakes);
        var rng = new Random(3);
        while (race.Outcome is null)
            race.Add(0.5025 + (rng.NextDouble() - 0.5) * 0.17);

        Assert.True(stakes.Plan.Trials > 900_000);
        Assert.InRange(race.Report().Trials, 1_000, 150_000);
    }

    static MeanStakes Stakes(Edges edges, MeanFacts facts) => MeanStakes.Of(MeanPlan.For(edges, facts, 0.05, 0.95));

    static void KeepBoth(MeanStakes stakes, Func<Random, double, double> law, double target, double tolerance)
    {
        long most = 100;
        while (Binomial.UpperTail(Repetitions, most + 1, 0.05) > FalseAlarm)
            most++;
        Assert.InRange(Run(stakes, law, target).Red, 0, most);
        Assert.InRange(Run(stakes, law, target + tolerance).Red, 0, most);
        Assert.InRange(Run(stakes, law, target - tolerance).Red, 0, most);
        Assert.InRange(Run(stakes, law, target + 2 * tolerance).Green, 0, most);
        Assert.InRange(Run(stakes, law, target - 2 * tolerance).Green, 0, most);
        Assert.Equal(Repetitions, Run(stakes, law, target + 4 * tolerance).Red, Repetitions / 100.0);
    }

    static (int Red, int Green, double MeanTrials) Run(MeanStakes stakes, Func<Random, double, double> law, double truth)
    {
        var rng = new Random(20261201);
        int red = 0, green = 0;
        double trials = 0;
        for (int i = 0; i < Repetitions; i++)
        {
            var race = new MeanRace(stakes);
            while (race.Outcome is null)
                race.Add(law(rng, truth));
            red += race.Outcome == Outcome.Refuted ? 1 : 0;
            green += race.Outcome == Outcome.Upheld ? 1 : 0;
            trials += race.Report().Trials;
        }

        return (red, green, trials / Repetitions);
    }

    // Standard deviation 0.2: the value 1 now and then, else a fixed one.
    static double RarelyOne(Random rng, double mean)
    {
        double odds = 0.04 / ((1 - mean) * (1 - mean));
        double rate = odds / (1 + odds);
        return rng.NextDouble() < rate ? 1 : 1 - (1 - mean) / (1 - rate);
    }
}
