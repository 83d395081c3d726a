// Every claim of this assembly that says nothing else.
[assembly: SuiteTerms(Risk = 1e-10, Confidence = 0.9999)]
