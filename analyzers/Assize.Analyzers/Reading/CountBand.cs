namespace Assize.Analyzers;

/// <summary>The counts an assertion lets pass, and where its author meant the centre to be.</summary>
/// <param name="Count">The sum that is asserted on.</param>
/// <param name="Low">The least count that passes, by the assertion's own arithmetic.</param>
/// <param name="High">The greatest count that passes.</param>
/// <param name="Shares">The band as shares of the trials, in real arithmetic, for other numbers of trials.</param>
/// <param name="Centre">The author's target as a rate; null when the band has one side or ends at 0 or 1.</param>
/// <param name="Tolerance">Half the width meant, as a rate; 0 without a centre.</param>
sealed record CountBand(Term.Sum Count, long Low, long High, Interval Shares, double? Centre, double Tolerance);
