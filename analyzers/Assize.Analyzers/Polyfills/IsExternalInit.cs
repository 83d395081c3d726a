namespace System.Runtime.CompilerServices;

/// <summary>Lets records compile on netstandard2.0, which lacks this marker.</summary>
static class IsExternalInit;
