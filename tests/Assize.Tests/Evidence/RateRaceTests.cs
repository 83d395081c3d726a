using System.Globalization;
using Assize.Bounds;

namespace Assize.Tests.Evidence;

/// <summary>
/// The race's errors and length, exactly, by dynamic programming over its own tests. The values come from a program
/// that shares no code with this one: likelihood ratios in another language, weights as documented at
/// <see cref="Bet"/>.
/// </summary>
public class RateRaceTests
{
    [Theory]
    [InlineData(.5, 0, .1, 1e-9, .999, .5, .5, 8.56e-10, 1, 482.16, 2_562)]
    [InlineData(.5, .2, .4, 1e-9, .999, .5, .5, 2e-19, 1, 21.52, 402)]
    [InlineData(.5, 0, .1, .05, .95, .5, .5, .03817, .96183, 225.57, 714)]
    [InlineData(.5, 0, .1, .05, .95, .5, .6, .95918, .04082, 197.99, 714)]
    [InlineData(.5, .05, .1, .05, .95, .8, .5, .00489, .99511, 240.21, 2_835)]
    [InlineData(.5, .05, .1, .05, .95, .8, .55, .02134, .97866, 699.05, 2_835)]
    [InlineData(.5, .05, .1, .05, .95, .8, .575, .45204, .54796, 1458.9, 2_835)]
    [InlineData(.5, .05, .1, .05, .95, .8, .6, .95708, .04292, 790.56, 2_835)]
    [InlineData(.5, .05, .1, .05, .95, .8, .7, .99997, .00003, 107.73, 2_835)]
    [InlineData(.1, .025, .05, .05, .95, .8, .1, .00425, .99575, 353.41, 5_487)]
    [InlineData(.1, .025, .05, .05, .95, .8, .125, .01848, .98152, 1390.8, 5_487)]
    [InlineData(.1, .025, .05, .05, .95, .8, .15, .95448, .04552, 1501.6, 5_487)]
    [InlineData(.1, .025, .05, .05, .95, .8, .05, .96397, .03603, 806.39, 5_487)]
    public void Two_sided_races_are_as_specified(
        double target, double tolerance, double defect, double risk, double confidence, double targetShare,
        double truth, double red, double green, double meanTrials, long cap) => IsAsSpecified(
            Edges.Around(Domain.Rate, target, tolerance, defect), risk, confidence, targetShare,
            truth, red, green, meanTrials, cap);

    [Theory]
    [InlineData(.01, .01, 1e-9, .999, .01, 6.18e-10, 1, 2249.8, 14_113)]
    [InlineData(.5, .4, 1e-9, .999, .5, 8.78e-10, 1, 15.18, 121)]
    [InlineData(.1, .1, .05, .95, .1, .03426, .96574, 80.37, 328)]
    [InlineData(.1, .1, .05, .95, .2, .95822, .04178, 76.79, 328)]
    public void Races_of_at_most_are_as_specified(
        double target, double defect, double risk, double confidence,
        double truth, double red, double green, double meanTrials, long cap) => IsAsSpecified(
            Edges.AtMost(Domain.Rate, target, defect), risk, confidence, .5, truth, red, green, meanTrials, cap);

    [Theory]
    [InlineData(.01, .005, 1e-9, .999, .01, 9.83e-10, 1, 3733.3, 30_299)]
    public void Races_of_at_least_are_as_specified(
        double target, double defect, double risk, double confidence,
        double truth, double red, double green, double meanTrials, long cap) => IsAsSpecified(
            Edges.AtLeast(Domain.Rate, target, defect), risk, confidence, .5, truth, red, green, meanTrials, cap);

    [Theory]
    [InlineData(.5, 0, .01, .5, 9.32e-10, 1, 48_625, 259_391)]
    [InlineData(.5, 0, .01, .505, .0831, .9169, 182_970, 259_391)]
    [InlineData(.5, 0, .01, .51, .99902, 9.81e-4, 110_869, 259_391)]
    [InlineData(.5, .005, .01, .5, 7.5e-11, 1, 50_868, 1_037_359)]
    [InlineData(.5, .005, .01, .505, 4.79e-10, 1, 148_141, 1_037_359)]
    [InlineData(.01, .0025, .005, .01, 4.9e-12, 1, 8_483, 222_855)]
    public void Long_races_are_as_specified(
        double target, double tolerance, double defect,
        double truth, double red, double green, double meanTrials, long cap) => IsAsSpecified(
            Edges.Around(Domain.Rate, target, tolerance, defect), 1e-9, .999, .5,
            truth, red, green, meanTrials, cap);

    static void IsAsSpecified(
        Edges edges, double risk, double confidence, double targetShare, double truth,
        double red, double green, double meanTrials, long cap)
    {
        var stakes = RateStakes.Of(RatePlan.For(edges, risk, confidence), targetShare);
        var race = ExactRace.Of(stakes, truth);

        Assert.Equal(cap, stakes.Trials);
        Assert.InRange(race.MeanTrials, meanTrials * (1 - 1e-3), meanTrials * (1 + 1e-3));
        Assert.Equal(red, race.Red, HalfOfLastDigit(red));
        Assert.Equal(green, race.Green, HalfOfLastDigit(green));
        Assert.Equal(1, race.Red + race.Green, 1e-9);
    }

    // Half a unit of the last digit printed, and a little for the rounding of this arithmetic.
    static double HalfOfLastDigit(double printed)
    {
        string[] parts = printed.ToString("E14", CultureInfo.InvariantCulture).Split('E');
        int digits = parts[0].TrimEnd('0').Split('.')[1].Length;
        int exponent = int.Parse(parts[1], CultureInfo.InvariantCulture);
        // 1 is printed for whatever rounds to it at five places.
        int lastPlace = printed == 1 ? -5 : exponent - digits;
        return 0.5001 * Math.Pow(10, lastPlace) + 1e-12 * Math.Min(1, printed);
    }
}
