namespace Assize.Analyzers;

/// <summary>What <see cref="Term.Apply"/> does to its one or two terms.</summary>
enum Operator
{
    Add,
    Subtract,
    Multiply,
    Divide,
    Remainder,
    Less,
    LessOrEqual,
    Greater,
    GreaterOrEqual,
    Equal,
    NotEqual,
    And,
    Or,
    Not,
    Negate,
    Absolute,
    Root,
    Round,
    Convert,
}
