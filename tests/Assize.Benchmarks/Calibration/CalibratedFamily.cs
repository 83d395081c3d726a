namespace Assize.Benchmarks;

/// <summary>A family of claims whose promises are tried out. One file a family, found by reflection.</summary>
abstract class CalibratedFamily
{
    /// <summary>Claims with the laws their draws follow.</summary>
    public abstract IEnumerable<CalibratedLaw> Laws { get; }
}
