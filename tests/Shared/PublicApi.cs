using System.Reflection;
using System.Runtime.CompilerServices;

namespace Assize.Testing;

/// <summary>The public surface of an assembly, one member a line, sorted: a change shows in the difference.</summary>
static class PublicApi
{
    const BindingFlags Members =
        BindingFlags.Public | BindingFlags.NonPublic | BindingFlags.Instance | BindingFlags.Static | BindingFlags.DeclaredOnly;

    static readonly Dictionary<Type, string> Keywords = new()
    {
        [typeof(void)] = "void", [typeof(bool)] = "bool", [typeof(int)] = "int", [typeof(long)] = "long", [typeof(ulong)] = "ulong",
        [typeof(double)] = "double", [typeof(string)] = "string", [typeof(object)] = "object",
    };

    public static string Of(Assembly assembly) => string.Concat(
        from type in assembly.GetExportedTypes()
        from line in Lines(type)
        orderby line.Type, line.Text
        select $"{line.Text}\n");

    static IEnumerable<(string Type, string Text)> Lines(Type type)
    {
        string name = Name(type);
        yield return (name, $"{name} : {Kind(type)}{Bases(type)}");
        foreach (var member in type.GetMembers(Members).Where(IsVisible))
            yield return (name, $"{name}.{Text(member)}");
    }

    static bool IsVisible(MemberInfo member) => !member.Name.Contains('<', StringComparison.Ordinal) && member switch
    {
        FieldInfo field => (field.IsPublic || field.IsFamily || field.IsFamilyOrAssembly) && !field.IsSpecialName,
        // What the compiler adds to every record says nothing.
        MethodInfo method when method.IsDefined(typeof(CompilerGeneratedAttribute)) => false,
        MethodBase method => (method.IsPublic || method.IsFamily || method.IsFamilyOrAssembly) && !IsAccessor(method),
        PropertyInfo property => property.GetAccessors(nonPublic: true).Any(IsVisible),
        EventInfo item => item.AddMethod is { IsPublic: true },
        _ => false,
    };

    static bool IsVisible(MethodInfo accessor) => accessor.IsPublic || accessor.IsFamily || accessor.IsFamilyOrAssembly;

    static bool IsAccessor(MethodBase method) => method.IsSpecialName && !method.IsConstructor
        && !method.Name.StartsWith("op_", StringComparison.Ordinal);

    static string Text(MemberInfo member) => member switch
    {
        FieldInfo field => $"{field.Name} : {Constant(field)}{Name(field.FieldType)}",
        PropertyInfo property => $"{property.Name} : {Name(property.PropertyType)} {{ {string.Join(" ", Accessors(property))} }}",
        MethodInfo method =>
            $"{method.Name}{Generic(method)}({Parameters(method)}) : {(method.IsStatic ? "static " : "")}{Name(method.ReturnType)}",
        ConstructorInfo constructor => $"new({Parameters(constructor)})",
        _ => $"{member.Name} : {member.MemberType}",
    };

    static string Constant(FieldInfo field) => field.IsLiteral ? $"const = {Value(field.GetRawConstantValue())} : " : "";

    static IEnumerable<string> Accessors(PropertyInfo property)
    {
        if (property.GetMethod is { } getter && IsVisible(getter))
            yield return getter.IsStatic ? "static get;" : "get;";
        if (property.SetMethod is { } setter && IsVisible(setter))
            yield return setter.ReturnParameter.GetRequiredCustomModifiers().Length > 0 ? "init;" : "set;";
    }

    static string Parameters(MethodBase method) => string.Join(", ", method.GetParameters().Select(parameter =>
        $"{Name(parameter.ParameterType)} {parameter.Name}{(parameter.HasDefaultValue ? $" = {Value(parameter.DefaultValue)}" : "")}"));

    static string Value(object? value) => value switch
    {
        null => "null",
        string text => $"\"{text}\"",
        _ => Convert.ToString(value, System.Globalization.CultureInfo.InvariantCulture)!,
    };

    static string Generic(MethodInfo method) =>
        method.IsGenericMethod ? $"<{string.Join(", ", method.GetGenericArguments().Select(Name))}>" : "";

    static string Kind(Type type) =>
        type.IsInterface ? "interface" : type.IsEnum ? "enum" : type.IsValueType ? "struct"
        : type is { IsAbstract: true, IsSealed: true } ? "static class" : type.IsAbstract ? "abstract class"
        : (type.IsSealed ? "sealed " : "") + (type.GetMethod("<Clone>$") is null ? "class" : "record");

    static string Bases(Type type) =>
        type.BaseType is { } parent && parent != typeof(object) && !type.IsValueType ? $" : {Name(parent)}" : "";

    static string Name(Type type)
    {
        if (type.IsGenericParameter)
            return type.Name;
        if (Nullable.GetUnderlyingType(type) is { } underlying)
            return $"{Name(underlying)}?";
        if (type.HasElementType)
            return Name(type.GetElementType()!) + (type.IsArray ? "[]" : "&");

        if (Keywords.TryGetValue(type, out string? keyword))
            return keyword;

        string name = (type.DeclaringType is { } outer ? $"{Name(outer)}." : "") + type.Name.Split('`')[0];
        return type.IsGenericType ? $"{name}<{string.Join(", ", type.GetGenericArguments().Select(Name))}>" : name;
    }
}
