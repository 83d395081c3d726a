namespace Assize.Tests.Trials;

public class PhiloxTests
{
    // Known answers of Philox4x32-10 after J. K. Salmon, M. A. Moraes, R. O. Dror and D. E. Shaw, SC11 (2011): from memory, and
    // reproduced by a second implementation of the recurrence.
    [Theory]
    [InlineData(0UL, 0UL, 0UL, 0x6627e8d5u, 0xe169c58du, 0xbc57ac4cu, 0x9b00dbd8u)]
    [InlineData(ulong.MaxValue, ulong.MaxValue, ulong.MaxValue, 0x408f276du, 0x41c83b0eu, 0xa20bc7c6u, 0x6d5451fdu)]
    [InlineData(0x299f31d0a4093822UL, 0x0370734413198a2eUL, 0x85a308d3243f6a88UL, 0xd16cfe09u, 0x94fdccebu, 0x5001e420u, 0x24126ea1u)]
    public void Known_answers_are_given(ulong key, ulong high, ulong low, uint a, uint b, uint c, uint d) =>
        Assert.Equal((a, b, c, d), Philox.Block(key, high, low));

    // Blocks of eight at once against one at a time, over carries of both halves of both counters.
    [Theory]
    [InlineData(0UL, 0UL)]
    [InlineData(0xFFFFFFFCUL, 0xFFFFFFFDUL)]
    [InlineData(ulong.MaxValue - 4, ulong.MaxValue - 2)]
    public void Many_blocks_are_the_same_as_one_by_one(ulong trial, ulong block)
    {
        const ulong key = 0x299f31d0a4093822;
        ulong[] words = new ulong[38];
        Philox.FillBlocks(key, trial, block, words);
        for (ulong i = 0; i < 19; i++)
            Assert.Equal(Words(key, trial, unchecked(block + i)), words[(int)(2 * i)..(int)(2 * i + 2)]);

        foreach (int each in (int[])[1, 2, 4])
        {
            Philox.FillTrials(key, trial, each, words);
            for (int i = 0; i < 19; i++)
                Assert.Equal(Words(key, unchecked(trial + (ulong)(i / each)), (ulong)(i % each)), words[(2 * i)..(2 * i + 2)]);
        }
    }

    static ulong[] Words(ulong key, ulong high, ulong low)
    {
        var (a, b, c, d) = Philox.Block(key, high, low);
        return [(ulong)b << 32 | a, (ulong)d << 32 | c];
    }
}
