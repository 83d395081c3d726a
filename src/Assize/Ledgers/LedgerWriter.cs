using System.Globalization;
using System.Text.Json;

namespace Assize;

/// <summary>Writes one ledger file: created new, one line an entry, each line with one write, so that a crash tears at most the last.</summary>
sealed class LedgerWriter
{
    // Appending to a shared file is not atomic, and containers share process ids and machine names: one file a process, with a random suffix.
    readonly FileStream _file;

    LedgerWriter(string folder, FileStream file) => (Folder, _file) = (folder, file);

    public string Folder { get; }

    public static LedgerWriter In(string folder)
    {
        try
        {
            Directory.CreateDirectory(folder);
            string name = string.Create(CultureInfo.InvariantCulture,
                $"{DateTime.UtcNow:yyyyMMdd'T'HHmmssfff}-{Environment.MachineName}-{Environment.ProcessId}-{Guid.NewGuid():n}.jsonl");
            return new LedgerWriter(folder, new FileStream(
                Path.Combine(folder, name), FileMode.CreateNew, FileAccess.Write, FileShare.Read, bufferSize: 0));
        }
        catch (Exception cause) when (cause is IOException or UnauthorizedAccessException or NotSupportedException)
        {
            throw new IOException(
                $"{Ledger.Variable} names '{folder}', and no ledger can be written there: {cause.Message} Name another folder, or unset it.", cause);
        }
    }

    public void Write(LedgerEntry entry)
    {
        byte[] json = JsonSerializer.SerializeToUtf8Bytes(entry, LedgerJson.Default.LedgerEntry);
        byte[] line = new byte[json.Length + 1];
        json.CopyTo(line, 0);
        line[^1] = (byte)'\n';
        _file.Write(line);
    }
}
