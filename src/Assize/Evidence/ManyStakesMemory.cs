using Assize.Bounds;

namespace Assize;

/// <summary>The stakes of one claim: planned once for each risk and confidence asked for in a row.</summary>
sealed class ManyStakesMemory(IReadOnlyList<Edges> rates)
{
    (double Risk, double Confidence, ManyStakes Stakes)? _last;
    readonly Lock _lock = new();

    public ManyStakes For(double risk, double confidence)
    {
        lock (_lock)
        {
            if (_last is not { } last || last.Risk != risk || last.Confidence != confidence)
                _last = last = (risk, confidence, ManyStakes.Of(ManyRatesPlan.For(rates, risk, confidence)));
            return last.Stakes;
        }
    }
}
