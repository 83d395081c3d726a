namespace Assize.Benchmarks;

/// <summary>A fixed piece of work for limits that are written in milliseconds, so that a slow machine is no failure.</summary>
static class Yardstick
{
    const int Steps = 600_000;

    public const string Name = "600,000 dependent multiplications, about a millisecond";

    /// <summary>About one millisecond on a server core of 2024.</summary>
    public static void Millisecond()
    {
        ulong x = 1;
        for (int i = 0; i < Steps; i++)
            x = (x ^ (x >> 29)) * 6364136223846793005UL + 1442695040888963407UL;
        Sink.Take(x);
    }
}
