using System.Runtime.CompilerServices;

namespace Assize.Tests;

/// <summary>One seed for all claims of these tests, so that none of them is random.</summary>
static class Setup
{
    public const string Seed = "5eed000000000001";

    [ModuleInitializer]
    internal static void Use() => Environment.SetEnvironmentVariable("ASSIZE_SEED", Seed);
}
