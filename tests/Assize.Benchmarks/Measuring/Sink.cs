using System.Runtime.CompilerServices;

namespace Assize.Benchmarks;

/// <summary>Takes results, so that no compiler leaves out the work behind them. GC.KeepAlive does not: a boxed number is never made.</summary>
static class Sink
{
    [MethodImpl(MethodImplOptions.NoInlining)]
    public static void Take(double number) => _ = number;
}
