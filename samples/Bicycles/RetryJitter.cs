namespace Bicycles;

/// <summary>How long a dock waits before it calls the depot again: uniform in a window that doubles with each attempt.</summary>
public sealed class RetryJitter(TimeSpan first, TimeSpan longest)
{
    public TimeSpan Window(int attempt)
    {
        double ticks = first.Ticks * Math.Pow(2, attempt);
        return ticks < longest.Ticks ? TimeSpan.FromTicks((long)ticks) : longest;
    }

    public TimeSpan Wait(int attempt, Random random) => Window(attempt) * random.NextDouble();
}
