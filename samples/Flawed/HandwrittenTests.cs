namespace Bicycles.Flawed;

/// <summary>Tests as they are often written: loop count and tolerance by feel.</summary>
public class HandwrittenTests
{
    readonly DockPicker picker = new(("north", 50), ("south", 30), ("east", 20));

    /// <summary>Far too tight: red in one of 25 runs on healthy code.</summary>
    [Fact]
    public void North_is_picked_half_of_the_time()
    {
        var random = new Random();
        const int trials = 400;
        int north = 0;
        for (int i = 0; i < trials; i++)
        {
            if (picker.Pick(random) == "north")
                north++;
        }

        Assert.InRange(north / (double)trials, 0.45, 0.55);
    }

    /// <summary>Looks careful, and is red in one of 5,660 runs on healthy code.</summary>
    [Fact]
    public void East_is_picked_a_fifth_of_the_time()
    {
        var random = new Random();
        int east = 0;
        for (int i = 0; i < 10_000; i++)
            east += picker.Pick(random) == "east" ? 1 : 0;

        Assert.True(Math.Abs(east / 10_000.0 - 0.2) < 0.015);
    }

    /// <summary>Sound: nothing is said about it.</summary>
    [Fact]
    public void South_is_picked_three_times_in_ten()
    {
        var random = new Random();
        const int trials = 50_000;
        int south = 0;
        for (int i = 0; i < trials; i++)
        {
            if (picker.Pick(random) == "south")
                south++;
        }

        Assert.InRange(south / (double)trials, 0.28, 0.32);
    }
}
