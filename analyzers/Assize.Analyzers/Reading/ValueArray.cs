using System.Collections.Immutable;

namespace Assize.Analyzers;

/// <summary>An array compared by its elements: an ImmutableArray inside a record is compared by reference.</summary>
readonly struct ValueArray<T> : IEquatable<ValueArray<T>>
{
    readonly ImmutableArray<T> _items;

    public ValueArray(ImmutableArray<T> items) => _items = items;

    public ImmutableArray<T> Items => _items.IsDefault ? [] : _items;

    public bool Equals(ValueArray<T> other) => Items.SequenceEqual(other.Items);

    public override bool Equals(object? obj) => obj is ValueArray<T> other && Equals(other);

    public override int GetHashCode() =>
        Items.Aggregate(Items.Length, (hash, item) => (hash * 31) + (item?.GetHashCode() ?? 0));
}
