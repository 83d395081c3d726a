namespace Assize.Bounds;

/// <summary>What an existing assertion on a statistic of independent trials does on right code and on wrong
/// code.</summary>
public abstract class Assessment
{
    private protected Assessment()
    {
    }

    /// <summary>The theorem that decided.</summary>
    public abstract string Theorem { get; }

    /// <summary>How often the assertion is red although the code is right: an enclosure; its lower end is 0 where nothing
    /// is proven.</summary>
    public abstract Enclosure FalseFailure { get; }

    /// <summary>Whether the answers rest on an approximation, so that the enclosure is not proven.</summary>
    public virtual bool IsApproximate => false;

    /// <summary>The smallest error of the target that the assertion catches.</summary>
    /// <param name="confidence">How surely an error must turn the assertion red, in (0, 1).</param>
    /// <returns>The signed distance from the target, in its unit, from which on the assertion is red with that
    /// probability, rounded away from 0; 0 when it is red so often on right code; null when there is none, or none is
    /// known.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The confidence lies outside its domain, or is NaN.</exception>
    public virtual double? SmallestDefectCaught(double confidence)
    {
        Check.Inside(confidence, 0, 1, nameof(confidence));
        return null;
    }

    /// <summary>How many trials the same band needs.</summary>
    /// <param name="risk">The false failure allowed, in [1e-300, 1].</param>
    /// <returns>A number from which on every number of trials is red with no more than that probability; null when there
    /// is none, or none is known.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The risk lies outside its domain, or is NaN.</exception>
    public virtual long? TrialsNeeded(double risk)
    {
        Check.Between(risk, 1e-300, 1, nameof(risk));
        return null;
    }

    /// <summary>The narrowest band about the target that the trials afford.</summary>
    /// <param name="risk">The false failure allowed, in [1e-300, 1).</param>
    /// <returns>The distance from the target to the rims, rounded up; null when it is not known.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The risk lies outside its domain, or is NaN.</exception>
    public virtual double? ToleranceAffordable(double risk)
    {
        Check.Between(risk, 1e-300, 1 - 1e-15, nameof(risk));
        return null;
    }

    /// <summary>The probability of either of two events that exclude each other.</summary>
    private protected static Enclosure Sum(Enclosure one, Enclosure other) =>
        new(Math.Min(1, one.Lower + other.Lower) * (1 - 1e-15), Math.Min(1, (one.Upper + other.Upper) * (1 + 1e-15)));

    /// <summary>The least distance from which on a probability that falls with it is small enough; null when it is not
    /// even at the farthest.</summary>
    private protected static double? Least(double farthest, Func<double, bool> holds)
    {
        if (holds(0))
            return 0;
        if (!holds(farthest))
            return null;

        double low = 0, high = farthest;
        while (high - low > 1e-10 * high)
        {
            double middle = low + (high - low) / 2;
            if (holds(middle))
                high = middle;
            else
                low = middle;
        }

        return high;
    }

    /// <summary>The nearer of a distance upwards and one downwards, signed.</summary>
    private protected static double? Nearer(double? up, double? down) =>
        up is null ? -down : down is null || up <= down ? up : -down;
}
