using System.Buffers;

namespace Assize.Cli;

/// <summary>What the bare text of a file gives away, before anything is parsed.</summary>
/// <param name="MayHoldTests">Whether an attribute of a test, or a claim, stands in it.</param>
/// <param name="IsShared">Whether it changes what other files mean: global usings.</param>
/// <param name="Declared">Names of the types and extension methods that it declares.</param>
sealed record TextGate(bool MayHoldTests, bool IsShared, IReadOnlyCollection<string> Declared)
{
    // An attribute of one's own is most often named after the one it derives from.
    static readonly SearchValues<string> Attributes = SearchValues.Create(
        ["Fact]", "Fact(", "Fact,", "Theory]", "Theory(", "Theory,", "[Test", "Test]", "Test,", "TestCase(", "TestMethod"],
        StringComparison.Ordinal);

    static readonly SearchValues<string> Keywords = SearchValues.Create(
        ["class ", "struct ", "record ", "interface ", "enum ", "delegate "], StringComparison.Ordinal);

    public static TextGate Of(ReadOnlySpan<char> text)
    {
        var declared = new HashSet<string>(StringComparer.Ordinal);
        Types(text, declared);
        Extensions(text, declared);
        return new TextGate(
            HasTests(text) || text.Contains("Claim.", StringComparison.Ordinal), text.Contains("global using", StringComparison.Ordinal), declared);
    }

    /// <summary>Whether an attribute that makes a test stands in a text.</summary>
    public static bool HasTests(ReadOnlySpan<char> text) => text.ContainsAny(Attributes);

    /// <summary>Hands over every identifier of a text; words in comments and strings count too.</summary>
    public static void Identifiers(ReadOnlySpan<char> text, Action<ReadOnlySpan<char>> each)
    {
        for (int at = 0; at < text.Length;)
        {
            if (!IsPart(text[at]))
            {
                at++;
                continue;
            }

            int length = Word(text[at..]);
            each(text.Slice(at, length));
            at += length;
        }
    }

    static void Types(ReadOnlySpan<char> text, HashSet<string> declared)
    {
        while (text.IndexOfAny(Keywords) is >= 0 and var at)
        {
            int space = at + text[at..].IndexOf(' ');
            text = text[space..].TrimStart();
            int length = Word(text);
            // `record struct Name`: the next round takes the name.
            if (length > 0 && text[..length] is not ("struct" or "class"))
                declared.Add(text[..length].ToString());
        }
    }

    // `Name(this Type …` and `Name<T>(this Type …`.
    static void Extensions(ReadOnlySpan<char> text, HashSet<string> declared)
    {
        const string Start = "(this ";
        for (int from = 0; text[from..].IndexOf(Start) is >= 0 and var found; from += found + Start.Length)
        {
            var before = text[..(from + found)].TrimEnd();
            if (before.EndsWith(">") && before.LastIndexOf('<') is > 0 and var open)
                before = before[..open];
            int start = before.Length;
            while (start > 0 && IsPart(before[start - 1]))
                start--;
            if (start < before.Length)
                declared.Add(before[start..].ToString());
        }
    }

    static int Word(ReadOnlySpan<char> text)
    {
        int length = 0;
        while (length < text.Length && IsPart(text[length]))
            length++;
        return length;
    }

    static bool IsPart(char letter) => char.IsLetterOrDigit(letter) || letter == '_';
}
