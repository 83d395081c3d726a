using System.Runtime.Intrinsics;
using Assize.Bounds;

namespace Assize;

/// <summary>The wealth of several bets that are played together, and whether their sum has surely reached a
/// level.</summary>
/// <remarks>
/// Each wealth is a product of factors whose mean, given the past, is 1 at most; so is the weighted sum's, and Ville's
/// inequality bounds the chance that it ever reaches 1/q by q. Products are kept within range by powers of two, which
/// round nothing; what falls below 1e-290 of the rest is dropped, which only lowers the wealth.
/// </remarks>
sealed class Pot
{
    // Above the rounding of a factor and of the product it joins, in units of 2^-53.
    const double Unit = 1.1102230246251565e-16;
    const double FactorUnits = 64;
    const double LogTwo = 0.693147180559945309417;
    const double Slack = 1e-12;
    const double Great = 1e100;

    readonly double[] _wealth;
    readonly double _level;
    readonly double _unitsPerTrial;
    long _scale;
    long _trials;
    double _limit;

    /// <summary>A pot before its first trial.</summary>
    /// <param name="weights">The wealth of each bet at the start; they sum to 1.</param>
    /// <param name="level">Natural logarithm of the level to be reached.</param>
    /// <param name="factorUnits">What rounding may do to a factor, in units of 2^-53.</param>
    public Pot(IEnumerable<double> weights, double level, double factorUnits = FactorUnits)
    {
        double[] bets = [.. weights];
        Count = bets.Length;
        _wealth = new double[Padded(Count)];
        bets.CopyTo(_wealth, 0);
        (_level, _unitsPerTrial) = (level, factorUnits * Unit);
        Settle();
    }

    /// <summary>Number of bets; 0 when there is nothing to bet against.</summary>
    public int Count { get; }

    /// <summary>The logarithm of the wealth: surely at least this.</summary>
    public double LogAtLeast
    {
        get
        {
            double sum = 0;
            foreach (double wealth in _wealth)
                sum += wealth;
            return Elementary.Log(sum) + _scale * LogTwo - Error(_trials);
        }
    }

    /// <summary>Room for so many factors, in whole vectors.</summary>
    public static int Padded(int count) => (count + Vector256<double>.Count - 1) / Vector256<double>.Count * Vector256<double>.Count;

    /// <summary>Takes one trial's factors, padded with anything finite.</summary>
    /// <param name="factors">As many as <see cref="Padded"/> says, none above 1e150.</param>
    /// <returns>Whether the wealth has surely reached the level.</returns>
    public bool Play(ReadOnlySpan<double> factors)
    {
        _trials++;
        double sum = Multiply(factors);
        if (sum > Great)
        {
            Settle();
            sum = Sum();
        }

        bool reached = sum >= _limit;
        if (_trials % Stretch.Length == 0)
            Settle();
        return reached;
    }

    double Multiply(ReadOnlySpan<double> factors)
    {
        var sum = Vector256<double>.Zero;
        var wealth = _wealth.AsSpan();
        for (int i = 0; i < wealth.Length; i += Vector256<double>.Count)
        {
            var product = Vector256.Create<double>(wealth[i..]) * Vector256.Create(factors[i..]);
            product.CopyTo(wealth[i..]);
            sum += product;
        }

        return (sum[0] + sum[1]) + (sum[2] + sum[3]);
    }

    double Sum()
    {
        double sum = 0;
        foreach (double wealth in _wealth)
            sum += wealth;
        return sum;
    }

    // The wealth is brought near 1 and the level with it, with room for the rounding of a whole stretch.
    void Settle()
    {
        double greatest = 0;
        foreach (double wealth in _wealth)
            greatest = Math.Max(greatest, wealth);
        if (greatest > 0)
        {
            int power = Math.ILogB(greatest);
            for (int i = 0; i < _wealth.Length; i++)
                _wealth[i] = Math.ScaleB(_wealth[i], -power) is var scaled && scaled > 1e-290 ? scaled : 0;
            _scale += power;
        }

        double log = _level + Error(_trials + Stretch.Length) - _scale * LogTwo;
        _limit = log < 700 ? Elementary.Exp(log) : double.PositiveInfinity;
    }

    double Error(long trials) => _unitsPerTrial * trials + Slack;
}
