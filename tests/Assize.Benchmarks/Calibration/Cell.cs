using System.Globalization;
using Assize.Bounds;

namespace Assize.Benchmarks;

/// <summary>What became of many repetitions at one truth.</summary>
sealed record Cell(int Repetitions, int Red, int Green, double MeanTrials)
{
    /// <summary>The chance that an upper limit printed here is below the true rate.</summary>
    public const double LimitRisk = 1e-4;

    // Over a thousand cells, a promise that is just kept is called broken with probability 1e-4.
    const double BrokenRisk = 1e-7;

    public static string Head =>
        $"  {"claim, law",-42} {"truth at",-10} {"",9} {"red",9} {"green",9} {"limit",9}  {"promise",-12} "
        + $"{"trials",10} {"plan",10} {"Wald",9}";

    public static Cell Of(CalibratedLaw law, double truth, int repetitions)
    {
        int red = 0, green = 0;
        double trials = 0;
        for (int i = 0; i < repetitions; i++)
        {
            var verdict = law.Judge(truth);
            red += verdict.Outcome == Outcome.Refuted ? 1 : 0;
            green += verdict.Outcome == Outcome.Upheld ? 1 : 0;
            trials += verdict.Trials;
        }

        return new(repetitions, red, green, trials / repetitions);
    }

    public double UpperLimit(Outcome wrong) => BinomialLimits.Upper(Repetitions, Count(wrong), LimitRisk);

    public bool IsBroken(Outcome wrong) => BinomialLimits.Lower(Repetitions, Count(wrong), BrokenRisk) > CalibratedLaw.Promise;

    public string Text(CalibratedLaw law, string place, double truth, Outcome? wrong)
    {
        string limit = wrong is { } colour ? Percent(UpperLimit(colour)) : "";
        string least = law.LeastTrials(truth, wrong) is > 0 and { } wald ? Number(wald) : "";
        string row = string.Create(CultureInfo.InvariantCulture, $"  {law.Name,-42} {place,-10} {truth,9:0.#####}");
        string rates = $"{Percent((double)Red / Repetitions),9} {Percent((double)Green / Repetitions),9} {limit,9}";
        return $"{row} {rates}  {Word(wrong),-12} {Number(MeanTrials),10} {Number(law.FixedTrials),10} {least,9}";
    }

    string Word(Outcome? wrong) => wrong is not { } colour ? ""
        : IsBroken(colour) ? "BROKEN"
        : UpperLimit(colour) <= CalibratedLaw.Promise ? "kept"
        : "within error";

    static string Number(double number) => number.ToString("N1", CultureInfo.InvariantCulture);

    int Count(Outcome colour) => colour == Outcome.Refuted ? Red : Green;

    static string Percent(double share) => string.Create(CultureInfo.InvariantCulture, $"{100 * share:0.000} %");
}
