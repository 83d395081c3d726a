namespace System.Runtime.CompilerServices
{
    /// <summary>Lets records compile on netstandard2.0, which lacks this marker.</summary>
    static class IsExternalInit;

    /// <summary>Lets required members compile on netstandard2.0.</summary>
    [AttributeUsage(AttributeTargets.All)]
    sealed class RequiredMemberAttribute : Attribute;

    /// <summary>Lets required members compile on netstandard2.0.</summary>
    [AttributeUsage(AttributeTargets.All)]
    sealed class CompilerFeatureRequiredAttribute : Attribute
    {
        public CompilerFeatureRequiredAttribute(string featureName) => FeatureName = featureName;

        public string FeatureName { get; }
    }
}

namespace System.Diagnostics.CodeAnalysis
{
    /// <summary>Lets records with required members be copied on netstandard2.0.</summary>
    [AttributeUsage(AttributeTargets.All)]
    sealed class SetsRequiredMembersAttribute : Attribute;
}
