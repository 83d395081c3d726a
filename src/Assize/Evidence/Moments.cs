namespace Assize;

/// <summary>Mean and sum of squared deviations of the draws so far, without cancellation (Welford's recurrence).</summary>
struct Moments
{
    public long Trials { get; private set; }

    public double Mean { get; private set; }

    public double Squares { get; private set; }

    public void Add(double draw)
    {
        Trials++;
        double before = draw - Mean;
        Mean += before / Trials;
        Squares += before * (draw - Mean);
    }
}
