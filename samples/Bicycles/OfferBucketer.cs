namespace Bicycles;

/// <summary>Which of two offers a rider sees: always the same one for one rider, half of the riders each.</summary>
public sealed class OfferBucketer(string campaign)
{
    public bool SeesNewOffer(ulong rider)
    {
        ulong hash = 14695981039346656037;
        foreach (char letter in campaign)
            hash = (hash ^ letter) * 1099511628211;
        for (int shift = 0; shift < 64; shift += 8)
            hash = (hash ^ ((rider >> shift) & 0xFF)) * 1099511628211;
        return ((hash ^ (hash >> 33)) * 0xFF51AFD7ED558CCD) >> 63 == 0;
    }
}
