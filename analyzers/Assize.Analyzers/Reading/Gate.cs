using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp;

namespace Assize.Analyzers;

/// <summary>The cheap question before any other: a method without a loop holds no counter.</summary>
static class Gate
{
    // A walk over nodes without an iterator: nothing is allocated but the nodes the compiler has anyway.
    public static bool HasLoop(SyntaxNode node)
    {
        foreach (SyntaxNodeOrToken child in node.ChildNodesAndTokens())
        {
            if (child.AsNode() is not { } inner)
                continue;
            if (inner.Kind() is SyntaxKind.ForStatement or SyntaxKind.WhileStatement or SyntaxKind.ForEachStatement or SyntaxKind.DoStatement)
                return true;
            if (HasLoop(inner))
                return true;
        }

        return false;
    }
}
