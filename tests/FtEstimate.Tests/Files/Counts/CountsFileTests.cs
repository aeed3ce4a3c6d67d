using System.Globalization;
using FtEstimate.Files;
using FtEstimate.Files.Counts;
using FtEstimate.Noise;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Memory;
using FtEstimate.Tests.Simulation.Memory;

namespace FtEstimate.Tests.Files.Counts;

public sealed class CountsFileTests
{
    private static readonly MemoryCounts Counted = SmallQuestion.Counted(SmallQuestion.Of(shots: 700), new Shard(1, 2));

    [Fact]
    public void What_was_written_is_read_again()
    {
        MemoryCounts read = Read(CountsFile.Text(Counted)).Counts!;

        Assert.Empty(CountsFile.Differences(read.Question, Counted.Question));
        Assert.Equal(Counted.Question.Noise, read.Question.Noise);
        Assert.Equal(Counted.Question.Settings.ToArray(), read.Question.Settings.ToArray());
        Assert.Equal((Counted.Origin, Counted.Shard), (read.Origin, read.Shard));
        Assert.Equal(Counted.Experiments.ToArray(), read.Experiments.ToArray());
        Assert.Equal(CountsFile.Text(Counted), CountsFile.Text(read));
    }

    [Fact]
    public void Every_rate_of_an_atom_array_is_kept_to_the_last_bit()
    {
        RoundErrors errors = new()
        {
            CzGate = 1.0 / 3e3,
            WaitingInLayer = new PauliChannel(1.0 / 7e4, 1e-5, 1.0 / 9e4),
            OnData = PauliChannel.Depolarising(1.0 / 3e2),
            CheckFlip = 0.1 + 0.2,
            DataLossPerSlot = 1e-300,
            DataLossTold = true,
            RoundsBetweenLooks = 4,
        };
        MemoryQuestion question = Counted.Question with { Noise = new AtomMemoryNoise(errors), Seed = ulong.MaxValue };

        MemoryQuestion read = Read(CountsFile.Text(MemoryCounts.Begin(question, Counted.Origin, Shard.Whole))).Counts!.Question;

        Assert.Equal((question.Noise, question.Seed), (read.Noise, read.Seed));
    }

    [Fact]
    public void The_file_is_the_same_in_a_country_with_decimal_commas()
    {
        CultureInfo before = CultureInfo.CurrentCulture;
        string text = CountsFile.Text(Counted);
        try
        {
            CultureInfo commas = (CultureInfo)CultureInfo.InvariantCulture.Clone();
            commas.NumberFormat.NumberDecimalSeparator = ",";
            CultureInfo.CurrentCulture = commas;

            Assert.Equal(text, CountsFile.Text(Counted));
            Assert.NotNull(Read(text).Counts);
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    [Fact]
    public void A_file_cut_off_anywhere_is_refused()
    {
        string text = CountsFile.Text(Counted).TrimEnd();
        for (int length = 0; length < text.Length; length += 1 + (length / 20))
        {
            Assert.NotNull(Read(text[..length]).Fault);
        }
    }

    [Fact]
    public void A_file_with_one_changed_character_is_refused()
    {
        string text = CountsFile.Text(Counted).TrimEnd();
        for (int place = 0; place < text.Length; place += 23)
        {
            string edited = string.Concat(text.AsSpan(0, place), text[place] == '1' ? "2" : "1", text.AsSpan(place + 1));
            Assert.NotNull(Read(edited).Fault);
        }
    }

    [Theory]
    [InlineData("", "the file is empty")]
    [InlineData("{", "this is no counts file, or its end is missing")]
    [InlineData("[]", "this is no counts file of this program")]
    [InlineData("{\"format\": 5, \"checksum\": \"0\"}", "this is no counts file of this program")]
    [InlineData("{\"format\": \"memory counts 1\", \"checksum\": 4}", "this is no counts file, or its end is missing")]
    [InlineData("{\"format\": \"memory counts 1\", \"checksum\": \"00\"}", "the checksum does not fit the content: the file was edited or damaged")]
    public void A_file_of_another_kind_is_refused(string text, string why) => Assert.Equal(why, Read(text).Fault!.Message);

    [Fact]
    public void Counts_of_another_version_of_the_simulator_are_refused()
    {
        string text = CountsFile.Text(Counted).Replace("\"simulation_version\": 1", "\"simulation_version\": 99", StringComparison.Ordinal);

        Assert.Contains("counted by version 99 of the simulator", Read(Sealed(text)).Fault!.Message, StringComparison.Ordinal);
    }

    // a right checksum alone does not make a file sound
    [Theory]
    [InlineData("\"shard\": \"2/2\"", "\"shard\": \"3/2\"")]
    [InlineData("\"distance\": 3", "\"distance\": 4")]
    [InlineData("\"decoder\": \"union-find\"", "\"decoder\": \"oracle\"")]
    [InlineData("\"circuit\": \"textbook\"", "\"circuit\": \"atom-array\"")]
    [InlineData("\"shots\": 256,", "\"shots\": 255,")]
    [InlineData("\"blocks\": 1,", "\"blocks\": 9,")]
    [InlineData("\"failures\":", "\"failures\": -1, \"old\":")]
    [InlineData("\"seed\": 7", "\"seed\": -7")]
    public void Contents_that_contradict_each_other_are_refused(string part, string by)
    {
        string text = CountsFile.Text(Counted);
        Assert.Contains(part, text, StringComparison.Ordinal);

        Assert.NotNull(Read(Sealed(text.Replace(part, by, StringComparison.Ordinal))).Fault);
    }

    [Fact]
    public void Differences_of_questions_are_named_field_by_field()
    {
        MemoryQuestion asked = Counted.Question with
        {
            Seed = 8,
            Decoder = DecoderKind.Matching,
            Noise = new TextbookMemoryNoise(UniformNoise.EveryPlace(0.01) with { Pair = 0.02 }, 0.01),
            Settings = [new(3, 3, PauliBasis.Z)],
        };

        Assert.Equal(
            ["decoder: union-find there, matching here", "seed: 7 there, 8 here", "uniform.pair: 0.01 there, 0.02 here"],
            CountsFile.Differences(Counted.Question, asked).Where(difference => !difference.StartsWith("experiments: ", StringComparison.Ordinal)));
        Assert.Equal(4, CountsFile.Differences(Counted.Question, asked).Length);
    }

    /// <summary>A text with its checksum made right: what only someone who knows the format could do.</summary>
    private static string Sealed(string text)
    {
        int place = text.LastIndexOf("\"checksum\": \"", StringComparison.Ordinal) + "\"checksum\": \"".Length;
        string open = string.Concat(text.AsSpan(0, place), new string('0', 64), text.AsSpan(place + 64));
        string sum = Convert.ToHexStringLower(System.Security.Cryptography.SHA256.HashData(System.Text.Encoding.UTF8.GetBytes(open)));
        return string.Concat(open.AsSpan(0, place), sum, open.AsSpan(place + 64));
    }

    private static CountsReading Read(string text)
    {
        using TemporaryFolder folder = new();
        return CountsFile.Read(folder.Write("c.json", text));
    }
}
