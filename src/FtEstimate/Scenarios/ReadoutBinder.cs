using System.Collections.Immutable;
using FtEstimate.Machines;
using FtEstimate.Scenarios.Keys;

namespace FtEstimate.Scenarios;

/// <summary>Turns the inputs of readout schemes into their records; what a scheme does not say about detection, [detection] says.</summary>
internal static class ReadoutBinder
{
    private const string Stem = ReadoutKeys.Path + ".";
    private const string KindEnd = ".kind";

    /// <summary>All schemes, the one in use first, the others in the order of the file.</summary>
    public static ImmutableArray<ReadoutScheme> Bind(InputSet inputs)
    {
        string use = new TableInputs(inputs, ReadoutKeys.Path).Text(ReadoutKeys.Use);
        ImmutableArray<ReadoutScheme>.Builder schemes = ImmutableArray.CreateBuilder<ReadoutScheme>();
        schemes.Add(BindScheme(inputs, use));
        foreach (string name in SchemeNames(inputs))
        {
            if (name != use)
            {
                schemes.Add(BindScheme(inputs, name));
            }
        }

        return schemes.ToImmutable();
    }

    private static IEnumerable<string> SchemeNames(InputSet inputs)
    {
        foreach (Input input in inputs.InOrder)
        {
            string path = input.Path;
            if (path.StartsWith(Stem, StringComparison.Ordinal)
                && path.EndsWith(KindEnd, StringComparison.Ordinal)
                && path.Length > Stem.Length + KindEnd.Length)
            {
                yield return path[Stem.Length..^KindEnd.Length];
            }
        }
    }

    private static ReadoutScheme BindScheme(InputSet inputs, string name)
    {
        TableInputs scheme = new(inputs, Stem + name);
        Detector detector = BindDetector(scheme, new TableInputs(inputs, DetectionKeys.Detection.Path));
        double recoolSeconds = scheme.Number(ReadoutKeys.RecoolTime);
        return scheme.Text(ReadoutKeys.Kind) switch
        {
            "shelved" => new Shelved(
                name,
                detector,
                recoolSeconds,
                scheme.Number(ReadoutKeys.ShelveTime),
                scheme.Number(ReadoutKeys.ShelveError),
                scheme.Number(ReadoutKeys.SelectTime),
                scheme.Number(ReadoutKeys.SelectError),
                scheme.NumberOr(ReadoutKeys.SelectAtOnce, double.PositiveInfinity),
                scheme.Number(ReadoutKeys.SelectCrosstalk),
                scheme.NumberOr(ReadoutKeys.ShelvedT1, double.PositiveInfinity),
                scheme.Number(ReadoutKeys.ShelvedT2),
                scheme.Number(ReadoutKeys.ResidualScatter)),
            "second_species" => new SecondSpecies(
                name,
                detector,
                recoolSeconds,
                scheme.Whole(ReadoutKeys.EnsembleAtoms),
                scheme.Whole(ReadoutKeys.Banks),
                scheme.Number(ReadoutKeys.DataDisturbance)),
            "moved_apart" => new MovedApart(
                name,
                detector,
                recoolSeconds,
                scheme.NumberOrNull(ReadoutKeys.Distance),
                scheme.NumberOrNull(ReadoutKeys.ExchangeTime),
                scheme.FlagOr(ReadoutKeys.ReadInRound, true),
                scheme.Whole(ReadoutKeys.Banks),
                scheme.Number(ReadoutKeys.DataDisturbance)),
            "in_place" => new InPlace(
                name,
                detector,
                recoolSeconds,
                scheme.Number(ReadoutKeys.DataDisturbance)),
            string other => throw new InvalidOperationException($"unchecked kind of readout {other}"),
        };
    }

    private static Detector BindDetector(TableInputs scheme, TableInputs detection)
    {
        double? exposureSeconds = ExposureSeconds(scheme, detection);
        double transferSeconds = NumberOr(DetectionKeys.ImageTransfer, 0);
        bool tellsLoss = scheme.FlagOr(DetectionKeys.TellsLoss, detection.FlagOr(DetectionKeys.TellsLoss, false));
        if (CountsPhotons(scheme, detection))
        {
            return new PhotonCounting(
                Number(DetectionKeys.Signal),
                Number(DetectionKeys.Background),
                Number(DetectionKeys.Depump),
                Number(DetectionKeys.Loss),
                NumberOr(DetectionKeys.Brighten, 0),
                exposureSeconds,
                transferSeconds,
                tellsLoss);
        }

        TableInputs flips = StatesFlips(scheme) ? scheme : detection;
        double? meanFlip = flips.NumberOrNull(DetectionKeys.FlipError);
        return new StatedReadout(
            meanFlip ?? flips.Number(DetectionKeys.DarkFlip),
            meanFlip ?? flips.Number(DetectionKeys.BrightFlip),
            Number(DetectionKeys.LossPerLook),
            exposureSeconds ?? throw new InvalidOperationException("a stated readout without an exposure"),
            transferSeconds,
            tellsLoss);

        double Number(KeyDefinition key) => scheme.NumberOrNull(key) ?? detection.Number(key);

        double NumberOr(KeyDefinition key, double otherwise) => scheme.NumberOrNull(key) ?? detection.NumberOr(key, otherwise);
    }

    // what the scheme states goes before what [detection] states
    private static bool CountsPhotons(TableInputs scheme, TableInputs detection) =>
        !StatesFlips(scheme) && (scheme.Gives(DetectionKeys.Signal) || !StatesFlips(detection));

    private static bool StatesFlips(TableInputs table) => table.Gives(DetectionKeys.FlipError) || table.Gives(DetectionKeys.DarkFlip);

    // "best" in a scheme goes before a number in [detection]
    private static double? ExposureSeconds(TableInputs scheme, TableInputs detection) =>
        scheme.Gives(DetectionKeys.Exposure)
            ? scheme.NumberOrNull(DetectionKeys.Exposure)
            : detection.NumberOrNull(DetectionKeys.Exposure);
}
