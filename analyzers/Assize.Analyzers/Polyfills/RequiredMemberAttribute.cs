namespace System.Runtime.CompilerServices;

/// <summary>Lets required members compile on netstandard2.0.</summary>
[AttributeUsage(AttributeTargets.All)]
sealed class RequiredMemberAttribute : Attribute;
