using System.Buffers.Binary;
using System.Runtime.CompilerServices;

namespace Assize;

/// <summary>The generator a trial gets: its numbers depend on the stream and the trial alone, not on what ran before.</summary>
/// <remarks>Every virtual member is overridden, so that nothing comes from the framework's own generators.</remarks>
sealed class TrialRandom : Random
{
    // One array, so that no trial stores a reference: the first blocks of trials ahead, then later blocks of one trial.
    const int Later = 128;
    const int FewBlocks = 8;
    const int ManyBlocks = 16;
    const int MostEach = 4;

    readonly ulong[] _words = new ulong[Later + 2 * ManyBlocks];
    int _each = 1;
    int _wanting;
    ulong _key;
    ulong _firstAhead;
    ulong _aheads;
    ulong _trial;
    ulong _block;
    int _at;
    int _end;

    // The golden ratio in 64 bits: any other key gives another stream.
    const ulong OtherStream = 0x9E3779B97F4A7C15;

    TrialRandom? _twin;

    /// <summary>A second generator at the beginning of the same trial: with the same numbers, or apart on a stream of its
    /// own. The next call takes it back.</summary>
    public TrialRandom Twin(bool apart)
    {
        _twin ??= new TrialRandom();
        _twin.Start(apart ? _key ^ OtherStream : _key, (long)_trial);
        return _twin;
    }

    /// <summary>A generator at the beginning of a trial.</summary>
    public static TrialRandom At(ulong key, long trial)
    {
        var random = new TrialRandom();
        random.Start(key, trial);
        return random;
    }

    /// <summary>Sets the generator to the beginning of a trial.</summary>
    public void Start(ulong key, long trial)
    {
        ulong place = (ulong)trial - _firstAhead;
        if (place >= _aheads || key != _key)
            place = LookAhead(key, (ulong)trial);
        _trial = (ulong)trial;
        _at = 2 * _each * (int)place;
        _end = _at + 2 * _each;
    }

    public override int Next() => (int)NextBelow(int.MaxValue);

    public override int Next(int maxValue)
    {
        ArgumentOutOfRangeException.ThrowIfNegative(maxValue);
        return maxValue == 0 ? 0 : (int)NextBelow((ulong)maxValue);
    }

    public override int Next(int minValue, int maxValue)
    {
        ArgumentOutOfRangeException.ThrowIfGreaterThan(minValue, maxValue);
        ulong range = (ulong)((long)maxValue - minValue);
        return range == 0 ? minValue : (int)(minValue + (long)NextBelow(range));
    }

    public override long NextInt64() => (long)NextBelow(long.MaxValue);

    public override long NextInt64(long maxValue)
    {
        ArgumentOutOfRangeException.ThrowIfNegative(maxValue);
        return maxValue == 0 ? 0 : (long)NextBelow((ulong)maxValue);
    }

    public override long NextInt64(long minValue, long maxValue)
    {
        ArgumentOutOfRangeException.ThrowIfGreaterThan(minValue, maxValue);
        ulong range = unchecked((ulong)(maxValue - minValue));
        return range == 0 ? minValue : unchecked(minValue + (long)NextBelow(range));
    }

    /// <summary>A multiple of 2^-53 in [0, 1), each equally likely.</summary>
    public override double NextDouble() => (NextWord() >> 11) * (1.0 / (1UL << 53));

    /// <summary>A multiple of 2^-24 in [0, 1), each equally likely.</summary>
    public override float NextSingle() => (NextWord() >> 40) * (1.0f / (1U << 24));

    public override void NextBytes(byte[] buffer)
    {
        ArgumentNullException.ThrowIfNull(buffer);
        NextBytes(buffer.AsSpan());
    }

    public override void NextBytes(Span<byte> buffer)
    {
        for (; buffer.Length >= sizeof(ulong); buffer = buffer[sizeof(ulong)..])
            BinaryPrimitives.WriteUInt64LittleEndian(buffer, NextWord());
        if (buffer.IsEmpty)
            return;

        Span<byte> last = stackalloc byte[sizeof(ulong)];
        BinaryPrimitives.WriteUInt64LittleEndian(last, NextWord());
        last[..buffer.Length].CopyTo(buffer);
    }

    protected override double Sample() => NextDouble();

    // D. Lemire, ACM Trans. Model. Comput. Simul. 29 (2019) 3: unbiased, and a division only when the low half is small.
    ulong NextBelow(ulong range)
    {
        ulong high = Math.BigMul(NextWord(), range, out ulong low);
        if (low >= range)
            return high;

        for (ulong threshold = unchecked(0 - range) % range; low < threshold;)
            high = Math.BigMul(NextWord(), range, out low);
        return high;
    }

    ulong NextWord()
    {
        int at = _at;
        if (at == _end)
            return LaterWord();

        _at = at + 1;
        return _words[at];
    }

    // Trials come in order; what those before have drawn decides how many blocks of each are made ahead.
    [MethodImpl(MethodImplOptions.NoInlining)]
    ulong LookAhead(ulong key, ulong trial)
    {
        if (_wanting > (int)_aheads / 2 && _each < MostEach)
            _each *= 2;
        (_key, _firstAhead, _aheads, _wanting) = (key, trial, (ulong)(Later / (2 * _each)), 0);
        Philox.FillTrials(key, trial, _each, _words.AsSpan(0, Later));
        return 0;
    }

    // A trial that has used up a few blocks may well use many.
    [MethodImpl(MethodImplOptions.NoInlining)]
    ulong LaterWord()
    {
        bool isFirstTime = _end <= Later;
        int blocks = isFirstTime ? FewBlocks : ManyBlocks;
        if (isFirstTime)
            (_block, _wanting) = ((ulong)_each, _wanting + 1);
        Philox.FillBlocks(_key, _trial, _block, _words.AsSpan(Later, 2 * blocks));
        _block += (ulong)blocks;
        (_at, _end) = (Later + 1, Later + 2 * blocks);
        return _words[Later];
    }
}
