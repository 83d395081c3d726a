namespace Assize;

/// <summary>By this name, in any namespace, xunit v3 tells a failed test from one that could not be run.</summary>
interface IAssertionException;
