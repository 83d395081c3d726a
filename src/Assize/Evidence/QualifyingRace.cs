using Assize.Bounds;

namespace Assize;

/// <summary>A race among the trials that qualify: their draws, in their order, are independent trials of the conditional
/// rate.</summary>
sealed class QualifyingRace(IRace<bool> race) : IRace<bool?>
{
    // More than a thousand passed over for each one counted is no test of the condition any more.
    const long MostPassedOver = 1000;

    long _qualified;
    long _passedOver;

    public Outcome? Outcome => race.Outcome;

    public void Add(bool? draw)
    {
        if (draw is { } qualified)
        {
            _qualified++;
            race.Add(qualified);
        }
        else if (++_passedOver > MostPassedOver * (_qualified + MostPassedOver))
        {
            throw new ClaimRefusedException($"Of {Wording.Trials(_qualified + _passedOver)} only {Wording.Number(_qualified)} "
                + "qualified. Let the trial make the condition come true, instead of waiting for it.");
        }
    }

    public void Add(ReadOnlySpan<bool?> draws)
    {
        foreach (var draw in draws)
        {
            if (race.Outcome is not null)
                return;

            Add(draw);
        }
    }

    public RaceReport Report() => race.Report() with
    {
        LastTrial = _qualified + _passedOver,
        Details = [("passed over", $"{Wording.Trials(_passedOver)} that did not qualify")],
        Counts = new Dictionary<string, double> { ["passedOver"] = _passedOver },
    };
}
