using System.Globalization;
using System.Text;

namespace Assize.Cli;

/// <summary>Text from sources and paths, made harmless for where it is shown.</summary>
static class Inert
{
    /// <summary>One line without control or direction marks: what a terminal would obey is shown as U+XXXX.</summary>
    public static string Line(string text)
    {
        var inert = new StringBuilder(text.Length);
        foreach (char letter in text)
        {
            if (letter is '\n' or '\r' or '\t')
                inert.Append(' ');
            else if (char.GetUnicodeCategory(letter) is UnicodeCategory.Control or UnicodeCategory.Format
                or UnicodeCategory.LineSeparator or UnicodeCategory.ParagraphSeparator)
                inert.Append(CultureInfo.InvariantCulture, $"U+{(int)letter:X4}");
            else
                inert.Append(letter);
        }

        return inert.ToString();
    }

    /// <summary>A Markdown code span, also within a table (CommonMark 0.31, 6.1; the bar is the tables' own).</summary>
    public static string Code(string text)
    {
        string line = Line(text);
        int longest = 0, run = 0;
        foreach (char letter in line)
        {
            run = letter == '`' ? run + 1 : 0;
            longest = Math.Max(longest, run);
        }

        string fence = new('`', longest + 1);
        string pad = longest > 0 ? " " : "";
        return (fence + pad + line + pad + fence).Replace("|", "\\|", StringComparison.Ordinal);
    }

    /// <summary>Markdown that shows the text and nothing else: no link, markup, mention or table border.</summary>
    public static string Markdown(string text)
    {
        var inert = new StringBuilder(text.Length);
        foreach (char letter in Line(text))
        {
            if (letter is '\\' or '`' or '*' or '_' or '{' or '}' or '[' or ']' or '<' or '>' or '#' or '|' or '~' or '&' or '!')
                inert.Append('\\');
            inert.Append(letter);
            // A reader of Markdown turns these into mentions and links even when they are escaped.
            if (letter is '@' or ':')
                inert.Append('\u200B');
        }

        return inert.Replace("www.", "www\u200B.").ToString();
    }

    /// <summary>A plain SARIF message: square brackets would make a link (SARIF 2.1.0, 3.11.6).</summary>
    public static string Sarif(string text) => text
        .Replace("\\", "\\\\", StringComparison.Ordinal)
        .Replace("[", "\\[", StringComparison.Ordinal)
        .Replace("]", "\\]", StringComparison.Ordinal);
}
