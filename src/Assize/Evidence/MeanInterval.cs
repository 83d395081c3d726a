namespace Assize;

/// <summary>An interval for a mean that is valid whenever the trials stop.</summary>
abstract class MeanInterval
{
    /// <summary>Takes the next draw.</summary>
    public abstract void Add(double draw);

    /// <summary>An interval that contains the mean at every trial, except with the probability given.</summary>
    public abstract (double Lower, double Upper) At(double miss);
}
