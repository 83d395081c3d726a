using System.Text.Json;

namespace Assize;

/// <summary>Reads ledgers back.</summary>
public static class LedgerReader
{
    /// <summary>Reads a ledger file, or every ledger file of a folder.</summary>
    /// <param name="path">A file, or a folder whose .jsonl files are read in the order of their names.</param>
    /// <returns>The entries, and how many lines were torn by a process that ended while it wrote.</returns>
    /// <exception cref="LedgerUnreadableException">The path does not exist, or a line is no entry or from a newer version.</exception>
    public static LedgerContent Read(string path)
    {
        ArgumentNullException.ThrowIfNull(path);
        string[] files = Directory.Exists(path) ? Directory.GetFiles(path, "*.jsonl")
            : File.Exists(path) ? [path]
            : throw new LedgerUnreadableException($"'{path}' is neither a ledger file nor a folder.");

        var entries = new List<LedgerEntry>();
        int torn = 0;
        foreach (string file in files.Order(StringComparer.Ordinal))
            torn += ReadFile(file, entries);
        return new LedgerContent(entries, torn);
    }

    // A line is whole when it ends in a line feed; only the last one may not be.
    static int ReadFile(string file, List<LedgerEntry> entries)
    {
        using var stream = new FileStream(file, FileMode.Open, FileAccess.Read, FileShare.ReadWrite);
        using var reader = new StreamReader(stream);
        int number = 0;
        while (reader.ReadLine() is { } line)
        {
            number++;
            if (reader.Peek() < 0 && !EndsInLineFeed(stream))
                return 1;
            if (line.Length > 0)
                entries.Add(Parse(line, file, number));
        }

        return 0;
    }

    static bool EndsInLineFeed(FileStream stream)
    {
        stream.Seek(-1, SeekOrigin.End);
        return stream.ReadByte() == '\n';
    }

    static LedgerEntry Parse(string line, string file, int number)
    {
        try
        {
            using (var document = JsonDocument.Parse(line))
                RequireSchema(document.RootElement, file, number);
            return JsonSerializer.Deserialize(line, LedgerJson.Default.LedgerEntry)!;
        }
        catch (JsonException cause)
        {
            throw new LedgerUnreadableException($"{file}, line {number}: this is no entry of a ledger ({cause.Message})", cause);
        }
    }

    static void RequireSchema(JsonElement entry, string file, int number)
    {
        if (entry.ValueKind != JsonValueKind.Object || !entry.TryGetProperty("schema", out var schema) || !schema.TryGetInt32(out int version))
            throw new LedgerUnreadableException($"{file}, line {number}: this is no entry of a ledger; it states no schema.");
        if (version > LedgerEntry.CurrentSchema)
            throw new LedgerUnreadableException(
                $"{file}, line {number}: schema {version} is newer than {LedgerEntry.CurrentSchema}, the newest this version reads. Update the tool.");
    }
}
