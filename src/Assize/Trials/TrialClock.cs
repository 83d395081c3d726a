namespace Assize;

/// <summary>Whether trials must end though no verdict stands: by the author's time cap or token. From time to time it asks
/// for a word on how far they are.</summary>
sealed class TrialClock : IDisposable
{
    static readonly TimeSpan Silence = TimeSpan.FromSeconds(5);

    readonly Terms _terms;
    readonly Action? _tell;
    readonly Timer? _timer;
    readonly long _end;
    readonly bool _canEnd;
    volatile bool _isDue;

    /// <summary>A clock that starts now; what tells runs on the thread that asks whether it is over.</summary>
    public TrialClock(Terms terms, Action? tell = null, TimeSpan? silence = null)
    {
        (_terms, _tell) = (terms, tell);
        _end = terms.TimeCap is { } cap
            ? Environment.TickCount64 + (long)Math.Min(cap.TotalMilliseconds, long.MaxValue / 2)
            : long.MaxValue;
        _canEnd = terms.TimeCap is not null || terms.Stop.CanBeCanceled;
        if (tell is not null)
            _timer = new Timer(_ => _isDue = true, null, silence ?? Silence, silence ?? Silence);
    }

    /// <summary>Whether a block must end where it is: the clock has to be asked.</summary>
    public bool MustEnd => _isDue || (_canEnd && (_terms.Stop.IsCancellationRequested || IsLate));

    bool IsLate => _end != long.MaxValue && Environment.TickCount64 >= _end;

    /// <summary>Whether the time cap has passed.</summary>
    /// <exception cref="OperationCanceledException">The token is cancelled.</exception>
    public bool IsOver()
    {
        if (_isDue)
        {
            _isDue = false;
            _tell!();
        }

        _terms.Stop.ThrowIfCancellationRequested();
        return IsLate;
    }

    /// <summary>Whether a trial ended because it was told to, not because it failed.</summary>
    public bool IsStopping(Exception cause) =>
        cause is OperationCanceledException && _terms.Stop.IsCancellationRequested;

    public void Dispose() => _timer?.Dispose();
}
