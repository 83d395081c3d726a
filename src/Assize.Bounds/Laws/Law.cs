namespace Assize.Bounds;

/// <summary>The distribution of one draw, known completely.</summary>
public abstract partial class Law
{
    // Magnitudes within which a third moment neither overflows nor vanishes.
    private protected const double Least = 1e-100;
    private protected const double Greatest = 1e100;

    private protected Law()
    {
    }

    /// <summary>The expected value of a draw.</summary>
    public abstract double Mean { get; }

    /// <summary>The variance of a draw, in [0, ∞).</summary>
    public abstract double Variance { get; }

    /// <summary>The expected cube of the distance of a draw from its mean, in [0, ∞).</summary>
    public abstract double ThirdAbsoluteCentralMoment { get; }

    /// <summary>The least value a draw can take, or negative infinity.</summary>
    public abstract double Minimum { get; }

    /// <summary>The greatest value a draw can take, or positive infinity.</summary>
    public abstract double Maximum { get; }

    /// <summary>The cumulant function.</summary>
    /// <param name="tilt">Any finite number, in reciprocal units of a draw.</param>
    /// <returns>ln E exp(tilt · draw); positive infinity where the expectation does not exist.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The tilt is infinite or NaN.</exception>
    public abstract double LogMoment(double tilt);

    /// <summary>The law whose density is this one's, reweighted by exp(tilt · draw).</summary>
    /// <param name="tilt">A number at which <see cref="LogMoment"/> is finite, in reciprocal units of a draw.</param>
    /// <returns>A law of the same support.</returns>
    /// <exception cref="ArgumentOutOfRangeException">There is no such law, or none within range; or the tilt is
    /// NaN.</exception>
    public abstract Law Tilted(double tilt);

    /// <summary>The cumulant function about the mean, accurate however small the tilt is.</summary>
    /// <param name="tilt">Any finite number, in reciprocal units of a draw.</param>
    /// <returns>ln E exp(tilt · (draw - Mean)), in [0, ∞].</returns>
    /// <exception cref="ArgumentOutOfRangeException">The tilt is infinite or NaN.</exception>
    public abstract double CentralLogMoment(double tilt);
}
