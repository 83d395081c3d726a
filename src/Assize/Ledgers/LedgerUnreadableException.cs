namespace Assize;

/// <summary>A ledger cannot be read: the message names file, line and cure.</summary>
public sealed class LedgerUnreadableException : IOException
{
    internal LedgerUnreadableException(string message) : base(message)
    {
    }

    internal LedgerUnreadableException(string message, Exception inner) : base(message, inner)
    {
    }
}
