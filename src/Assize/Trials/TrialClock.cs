namespace Assize;

/// <summary>Whether trials must end though no verdict stands: by the author's time cap or token.</summary>
sealed class TrialClock(Terms terms)
{
    readonly long _end = terms.TimeCap is { } cap
        ? Environment.TickCount64 + (long)Math.Min(cap.TotalMilliseconds, long.MaxValue / 2)
        : long.MaxValue;

    readonly bool _canEnd = terms.TimeCap is not null || terms.Stop.CanBeCanceled;

    /// <summary>Whether no further trial may begin.</summary>
    public bool MustEnd => _canEnd && (terms.Stop.IsCancellationRequested || Environment.TickCount64 >= _end);

    /// <summary>Whether the time cap has passed.</summary>
    /// <exception cref="OperationCanceledException">The token is cancelled.</exception>
    public bool IsOver()
    {
        terms.Stop.ThrowIfCancellationRequested();
        return _end != long.MaxValue && Environment.TickCount64 >= _end;
    }

    /// <summary>Whether a trial ended because it was told to, not because it failed.</summary>
    public bool IsStopping(Exception cause) =>
        cause is OperationCanceledException && terms.Stop.IsCancellationRequested;
}
