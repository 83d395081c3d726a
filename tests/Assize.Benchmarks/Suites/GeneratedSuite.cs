using System.Globalization;
using System.Text;

namespace Assize.Benchmarks;

/// <summary>Sources of a test suite of a given size, the same every time.</summary>
static class GeneratedSuite
{
    const int TestsInAFile = 20;

    static readonly string[] Ordinary =
    [
        """
            var order = new Order("a{0}", {0});
            order.Add("bread", 2);
            Assert.Equal(2, order.Lines);
            Assert.Equal("a{0}", order.Name);
        """,
        """
            var order = new Order("b{0}", {0});
            for (int i = 0; i < 10; i++)
                order.Add("line " + i, i);
            Assert.Equal(10, order.Lines);
            Assert.True(order.Total >= 45, "too little: " + order.Total);
        """,
        """
            string text = new Order("c{0}", {0}).ToString();
            Assert.Contains("c{0}", text);
            Assert.StartsWith("c", text);
            Assert.False(string.IsNullOrEmpty(text));
        """,
        """
            int[] values = [3, 1, 2, {0}];
            Array.Sort(values);
            foreach (int value in values)
                Assert.True(value > 0);
            for (int i = 1; i < values.Length; i++)
            {{
                int before = values[i - 1];
                Assert.True(before <= values[i]);
            }}
        """,
        """
            var thrown = Assert.Throws<ArgumentException>(() => new Order("", {0}));
            Assert.Equal("name", thrown.ParamName);
            Assert.NotNull(thrown.Message);
        """,
        """
            var orders = Enumerable.Range(0, 5).Select(i => new Order("d" + i, {0})).ToList();
            int total = 0;
            while (total < 100)
                total += orders.Count + 1;
            Assert.Equal(5, orders.Count);
            Assert.InRange(total, 100, 110);
            Assert.All(orders, order => Assert.Equal(0, order.Lines));
        """,
    ];

    static readonly string[] Statistical =
    [
        """
            var rng = new Random();
            int heads = 0;
            for (int i = 0; i < 1{0}; i++)
            {{
                if (rng.NextDouble() < 0.5)
                    heads++;
            }}

            Assert.InRange(heads / 1{0}.0, 0.45, 0.55);
        """,
        """
            const int trials = 2{0};
            int hits = 0;
            var picker = new Picker(new Random());
            for (int i = 0; i < trials; i++)
                hits += picker.IsNorth() ? 1 : 0;
            double share = (double)hits / trials;
            Assert.True(Math.Abs(share - 0.25) < 0.05, "share is " + share);
        """,
        """
            var rng = new Random();
            int sixes = 0;
            for (int i = 0; i < 60{0}; i++)
                if (rng.Next(6) == 5)
                    sixes++;
            Assert.True(sixes > 9{0});
            Assert.True(sixes < 11{0});
        """,
        """
            var rng = new Random();
            int low = Enumerable.Range(0, 5{0}).Count(_ => rng.Next(100) < 30);
            Assert.Equal(0.3, low / 5{0}.0, 0.04);
        """,
    ];

    /// <summary>The files; every so many-th test is statistical, none for null.</summary>
    public static IEnumerable<string> Files(int tests, int? statisticalEvery)
    {
        for (int first = 0; first < tests; first += TestsInAFile)
            yield return File(first, Math.Min(TestsInAFile, tests - first), statisticalEvery);
    }

    /// <summary>What the tests test, and what their draws come from.</summary>
    public const string Product = """
        using System;
        namespace Shop;
        public sealed class Order
        {
            public Order(string name, int number) => Name = name.Length > 0 ? name : throw new ArgumentException("empty", nameof(name));
            public string Name { get; }
            public int Lines { get; private set; }
            public int Total { get; private set; }
            public void Add(string what, int amount) { Lines++; Total += amount; }
            public override string ToString() => Name + Lines;
        }
        public sealed class Picker(Random random)
        {
            public bool IsNorth() => random.Next(4) == 0;
        }
        """;

    static string File(int first, int count, int? statisticalEvery)
    {
        var text = new StringBuilder("using System;\nusing System.Linq;\nusing Shop;\nusing Xunit;\n");
        text.Append(CultureInfo.InvariantCulture, $"public class Tests{first}\n{{\n");
        for (int i = first; i < first + count; i++)
        {
            var bodies = statisticalEvery is { } every && i % every == 0 ? Statistical : Ordinary;
            string body = string.Format(CultureInfo.InvariantCulture, bodies[i / (statisticalEvery ?? 1) % bodies.Length], i % 900 + 100);
            text.Append(CultureInfo.InvariantCulture, $"    [Fact]\n    public void Test_{i}()\n    {{\n{body}\n    }}\n\n");
        }

        return text.Append("}\n").ToString();
    }
}
