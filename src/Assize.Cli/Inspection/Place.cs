namespace Assize.Cli;

/// <summary>Where something stands in the sources.</summary>
/// <param name="File">Full path.</param>
/// <param name="Line">First line, from 1.</param>
/// <param name="Column">First column in UTF-16 units, from 1.</param>
/// <param name="EndLine">Last line, from 1.</param>
/// <param name="EndColumn">Column behind the last unit, from 1.</param>
/// <param name="Method">The test around it.</param>
/// <param name="MethodStart">First line of that test, from 1.</param>
/// <param name="MethodEnd">Its last line, from 1.</param>
sealed record Place(
    string File, int Line, int Column, int EndLine, int EndColumn, string Method, int MethodStart, int MethodEnd);
