using System.Diagnostics;

namespace Assize.Benchmarks;

/// <summary>Times two workloads in turn, so that whatever else the machine does falls on both.</summary>
static class Paired
{
    const int Pairs = 25;
    const int LeastWarmUps = 40;
    static readonly TimeSpan WarmUp = TimeSpan.FromMilliseconds(700);
    static readonly TimeSpan LeastTimed = TimeSpan.FromMilliseconds(4);
    static readonly TimeSpan MostWarmUp = TimeSpan.FromSeconds(4);

    /// <summary>Warms both up until tiered compilation has settled, then times pairs; the order within a pair alternates.</summary>
    public static Comparison Compare(Action subject, Action reference, int pairs = Pairs)
    {
        int subjectCalls = Warm(subject), referenceCalls = Warm(reference);
        var subjects = new double[pairs];
        var references = new double[pairs];
        for (int i = 0; i < pairs; i++)
        {
            if (i % 2 == 0)
                subjects[i] = Time(subject, subjectCalls);
            references[i] = Time(reference, referenceCalls);
            if (i % 2 == 1)
                subjects[i] = Time(subject, subjectCalls);
        }

        var ratios = subjects.Zip(references, (a, b) => a / b).Order().ToArray();
        return new Comparison(subjects.Min(), references.Min(), ratios[pairs / 2]);
    }

    /// <summary>How many calls make one timing long enough for the clock.</summary>
    static int Warm(Action work)
    {
        var clock = Stopwatch.StartNew();
        for (int i = 0; (i < LeastWarmUps || clock.Elapsed < WarmUp) && clock.Elapsed < MostWarmUp; i++)
            work();
        double once = Math.Max(Time(work, 1), 1e-9);
        return (int)Math.Clamp(LeastTimed.TotalSeconds / once, 1, 1e6);
    }

    static double Time(Action work, int calls)
    {
        long start = Stopwatch.GetTimestamp();
        for (int i = 0; i < calls; i++)
            work();
        return Stopwatch.GetElapsedTime(start).TotalSeconds / calls;
    }
}
