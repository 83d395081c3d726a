using Microsoft.CodeAnalysis;
using Microsoft.CodeAnalysis.CSharp.Syntax;
using Microsoft.CodeAnalysis.Operations;

namespace Assize.Analyzers;

/// <summary>Follows everything a draw is made of back to where its generator was seeded.</summary>
sealed class SeedReader
{
    const int MostSteps = 200;

    readonly Writes _writes;
    readonly RandomTypes _types;
    int _steps;

    public SeedReader(Writes writes, RandomTypes types) => (_writes, _types) = (writes, types);

    public Seeding Read(IOperation draw)
    {
        _steps = 0;
        return Worst(draw.DescendantsAndSelf().OfType<IInvocationOperation>().Select(OfCall));
    }

    Seeding OfCall(IInvocationOperation call)
    {
        if (_types.IsCryptographic(call.TargetMethod.ContainingType))
            return Seeding.Cryptographic;
        if (SourceScan.Of(call.TargetMethod) is { SeedsGenerator: true })
            return Seeding.Pinned;
        return Worst([
            call.Instance is { } receiver ? Origin(receiver) : Seeding.Inside,
            .. call.Arguments.Select(OfArgument),
        ]);
    }

    Seeding OfArgument(IArgumentOperation argument)
    {
        if (argument.ArgumentKind == ArgumentKind.DefaultValue)
            return Seeding.Inside;
        if (argument.Parameter?.Name.IndexOf("seed", StringComparison.OrdinalIgnoreCase) >= 0)
            return OfSeed(argument.Value);
        IOperation value = argument.Value.Unwrapped();
        if (value is IArrayCreationOperation or IDelegateCreationOperation or IAnonymousFunctionOperation)
            return OfParts(value);
        return value.Type is { IsReferenceType: true } type
            && (_types.IsGenerator(type) || !RandomTypes.IsFramework(type))
            ? Origin(value)
            : Seeding.Inside;
    }

    // Weights and the like hold no generator; a delegate may.
    Seeding OfParts(IOperation whole) => whole.Descendants()
        .Where(part => _types.IsGenerator(part.Type))
        .Select(Origin)
        .DefaultIfEmpty(Seeding.Inside)
        .Max();

    static Seeding OfSeed(IOperation seed)
    {
        string text = seed.Syntax.ToString();
        return text.Contains("TickCount") || text.Contains("Now") || text.Contains("NewGuid")
            || text.Contains("GetTimestamp")
            ? Seeding.TimeBased
            : Seeding.Pinned;
    }

    Seeding Origin(IOperation value)
    {
        if (++_steps > MostSteps)
            return Seeding.Unclear;
        return value.Unwrapped() switch
        {
            { ConstantValue.HasValue: true } => Seeding.Inside,
            IObjectCreationOperation created => OfCreation(created),
            IInvocationOperation call => OfFactory(call),
            IPropertyReferenceOperation property when _types.IsShared(property.Property) => Seeding.Shared,
            ILocalReferenceOperation local => OfLocal(local.Local),
            IFieldReferenceOperation field => OfField(field),
            IInstanceReferenceOperation self => self.Type is { } type && SourceScan.Of(type).SeedsGenerator
                ? Seeding.Pinned : Seeding.Inside,
            _ => Seeding.Unclear,
        };
    }

    Seeding OfCreation(IObjectCreationOperation created)
    {
        if (_types.IsRandom(created.Type))
            return created.Arguments.IsEmpty ? Seeding.Fresh : OfSeed(created.Arguments[0].Value);
        if (created.Type is { } type && SourceScan.Of(type).SeedsGenerator)
            return Seeding.Pinned;
        return Worst(
            [.. created.Arguments.Select(OfArgument), created.Initializer is null ? Seeding.Inside
            : OfInitializer(created.Initializer)]);
    }

    Seeding OfInitializer(IObjectOrCollectionInitializerOperation initializer) =>
        Worst(initializer.Initializers.Select(part =>
        part is ISimpleAssignmentOperation { Target: IMemberReferenceOperation member, Value: var value }
            ? member.Member.Name.IndexOf("seed", StringComparison.OrdinalIgnoreCase) >= 0 ? OfSeed(value)
                : _types.IsGenerator(value.Unwrapped().Type) ? Origin(value) : Seeding.Inside
            : Seeding.Inside));

    // A generic factory that makes an interface out of nothing is most often a stub.
    Seeding OfFactory(IInvocationOperation call) =>
        call is { TargetMethod.IsGenericMethod: true, Type.IsAbstract: true } ? Seeding.Unclear : OfCall(call);

    Seeding OfLocal(ILocalSymbol local)
    {
        var writes = _writes.To(local);
        return writes.Count == 0 || writes.Any(write => write.Kind != WriteKind.Set)
            ? Seeding.Unclear
            : Worst(writes.Select(write => Origin(write.Value!)));
    }

    Seeding OfField(IFieldReferenceOperation reference)
    {
        if (reference.SemanticModel is not { } model
            || reference.Field.ContainingType.DeclaringSyntaxReferences.Length != 1
            || FieldReader.Declaration(reference.Field, model.SyntaxTree) is not { } declaration)
            return Seeding.Unclear;
        var values = FieldReader.Assignments(reference.Field, declaration).Select(assignment => assignment.Right)
            .ToList();
        if (declaration.Initializer is { Value: var initial })
            values.Add(initial);
        return values.Count == 0 ? Seeding.Unclear : Worst(values.Select(value => OfSyntax(value, model)));
    }

    Seeding OfSyntax(ExpressionSyntax value, SemanticModel model) =>
        model.GetOperation(value) is { } operation ? Origin(operation) : Seeding.Unclear;

    static Seeding Worst(IEnumerable<Seeding> origins) => origins.DefaultIfEmpty(Seeding.Unclear).Max();
}
