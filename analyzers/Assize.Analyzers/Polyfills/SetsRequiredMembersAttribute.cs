namespace System.Diagnostics.CodeAnalysis;

/// <summary>Lets records with required members be copied on netstandard2.0.</summary>
[AttributeUsage(AttributeTargets.All)]
sealed class SetsRequiredMembersAttribute : Attribute;
