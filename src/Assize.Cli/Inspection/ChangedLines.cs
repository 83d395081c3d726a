using System.Diagnostics;
using System.Globalization;
using System.Text;
using System.Text.RegularExpressions;

namespace Assize.Cli;

/// <summary>Lines that differ from a revision, as git tells them; files it does not know yet are new in whole.</summary>
sealed partial class ChangedLines
{
    readonly Dictionary<string, List<(int First, int Last)>> _ranges = new(StringComparer.Ordinal);

    public static async Task<ChangedLines> SinceAsync(string revision, string root, CancellationToken token)
    {
        string top = (await GitAsync(root, token, "rev-parse", "--show-toplevel")).TrimEnd('\n');
        var changed = new ChangedLines();
        changed.Hunks(
            top,
            await GitAsync(top, token, "-c", "core.quotePath=false", "diff", "--unified=0", "--no-color", "--no-ext-diff", "--no-renames",
                "--src-prefix=a/", "--dst-prefix=b/", "--end-of-options", revision, "--"));
        foreach (string file in (await GitAsync(top, token, "ls-files", "--others", "--exclude-standard", "-z")).Split('\0', StringSplitOptions.RemoveEmptyEntries))
            changed._ranges[Path.Combine(top, file)] = [(1, int.MaxValue)];
        return changed;
    }

    /// <summary>Whether a line of the test around a place differs.</summary>
    public bool Touch(Place place) => _ranges.TryGetValue(place.File, out var ranges)
        && ranges.Exists(range => range.First <= place.MethodEnd && range.Last >= place.MethodStart);

    void Hunks(string top, string difference)
    {
        string? file = null;
        bool inHeader = true;
        foreach (string line in difference.Split('\n'))
        {
            if (line.StartsWith("diff --git ", StringComparison.Ordinal))
                inHeader = true;
            // An added line may begin with "++ ": only the header's is a name.
            else if (inHeader && line.StartsWith("+++ ", StringComparison.Ordinal))
                file = NameIn(line[4..]) is { } name ? Path.Combine(top, name) : null;
            else if (Hunk().Match(line) is { Success: true } hunk)
            {
                inHeader = false;
                if (file is not null)
                    Add(file, hunk);
            }
        }
    }

    void Add(string file, Match hunk)
    {
        int first = int.Parse(hunk.Groups[1].Value, CultureInfo.InvariantCulture);
        int count = hunk.Groups[2].Success ? int.Parse(hunk.Groups[2].Value, CultureInfo.InvariantCulture) : 1;
        // Lines taken away leave a seam: it belongs to the lines on both sides.
        var range = count == 0 ? (first, first + 1) : (first, first + count - 1);
        (_ranges.TryGetValue(file, out var ranges) ? ranges : _ranges[file] = []).Add(range);
    }

    // "b/path", with a tab behind it when the path has spaces, or quoted as in C when it has worse.
    static string? NameIn(string text)
    {
        string name = text.StartsWith('"') ? Unquoted(text) : text.TrimEnd('\t', '\r');
        return name.StartsWith("b/", StringComparison.Ordinal) ? name[2..] : null;
    }

    static string Unquoted(string text)
    {
        var bytes = new List<byte>();
        int end = text.LastIndexOf('"');
        for (int at = 1; at < end; at++)
        {
            if (text[at] != '\\')
            {
                bytes.AddRange(Encoding.UTF8.GetBytes(text[at].ToString()));
                continue;
            }

            at++;
            if (text[at] is >= '0' and <= '3')
            {
                bytes.Add(Convert.ToByte(text.Substring(at, 3), 8));
                at += 2;
            }
            else
            {
                bytes.Add((byte)(text[at] switch { 'n' => '\n', 't' => '\t', 'r' => '\r', 'a' => '\a', 'b' => '\b', 'v' => '\v', 'f' => '\f', var other => other }));
            }
        }

        return Encoding.UTF8.GetString([.. bytes]);
    }

    static async Task<string> GitAsync(string folder, CancellationToken token, params string[] arguments)
    {
        var start = new ProcessStartInfo("git", arguments)
        {
            WorkingDirectory = folder,
            RedirectStandardOutput = true,
            RedirectStandardError = true,
            StandardOutputEncoding = Encoding.UTF8,
        };
        Process? process;
        try
        {
            process = Process.Start(start);
        }
        catch (Exception exception) when (exception is not OperationCanceledException)
        {
            throw new CouldNotRunException("git was not found. It is needed to tell which lines changed; leave out --since, or install it.");
        }

        using (process)
        {
            var errors = process!.StandardError.ReadToEndAsync(token);
            string output = await process.StandardOutput.ReadToEndAsync(token);
            await process.WaitForExitAsync(token);
            return process.ExitCode == 0 ? output : throw new CouldNotRunException(
                $"git {arguments[0]} failed in '{Inert.Line(folder)}': {Inert.Line((await errors).Trim())}");
        }
    }

    [GeneratedRegex(@"^@@ -\d+(?:,\d+)? \+(\d+)(?:,(\d+))? @@")]
    private static partial Regex Hunk();
}
