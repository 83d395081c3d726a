namespace Assize.Analyzers;

/// <summary>What is asserted on: a reduction of many draws to one number.</summary>
enum Statistic
{
    /// <summary>Successes, as a count or a share.</summary>
    Proportion,

    /// <summary>The average of the draws.</summary>
    Mean,

    /// <summary>The total of the draws.</summary>
    Sum,

    /// <summary>The counts of every bucket, all in one band.</summary>
    Buckets,

    /// <summary>The variance of the draws.</summary>
    Variance,

    /// <summary>The standard deviation of the draws.</summary>
    Deviation,

    /// <summary>How many of the possible values came up.</summary>
    Coverage,

    /// <summary>Whether all draws differ.</summary>
    Distinct,

    /// <summary>Whether it happened at least once.</summary>
    Some,

    /// <summary>The greatest draw.</summary>
    Greatest,

    /// <summary>The least draw.</summary>
    Least,

    /// <summary>A draw of given rank, the median for one.</summary>
    Quantile,

    /// <summary>The difference of two averages or two counts.</summary>
    Difference,

    /// <summary>The greatest distance to a distribution function.</summary>
    Distance,

    /// <summary>The sum of squared deviations of counts over their expectations.</summary>
    ChiSquare,

    /// <summary>A p-value or an interval of another library.</summary>
    Level,

    /// <summary>A running share, asserted on after every trial.</summary>
    Prefix,

    /// <summary>One draw, or two that must differ.</summary>
    Single,
}
