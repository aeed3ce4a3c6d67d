using FtEstimate.MagicStates;
using FtEstimate.MagicStates.Distillation;
using static FtEstimate.MagicStates.Distillation.QubitSet;

namespace FtEstimate.Tests.MagicStates.Distillation;

public sealed class LevelSumTests
{
    // Rounding of a few hundred non-negative terms; no digits may be lost however small the sum.
    private const double Rounding = 1e-12;

    [Theory]
    [InlineData(1e-2)]
    [InlineData(1e-3)]
    [InlineData(1e-4)]
    public void First_level_equals_a_plain_sum_over_its_events(double p)
    {
        // step table of Litinski 2019, arXiv:1905.06903, written out once more
        PatchDistances d = new(11, 5, 7);
        double Law(int distance) => 0.1 * Math.Pow(50 * p, (distance + 1) / 2.0);
        (double pX, double pZ, double pm, double dm) = (Law(11), Law(5), Law(7), 7);
        double single = (p / 3 + 0.5 * (dm / 5) * pZ * dm) + 0.5 * (p / 3 + 0.5 * 5 * pm) + 0.5 * p / 3;
        double Several(double w) => (p / 3 + 0.5 * pm * dm) + 0.5 * (p / 3 + 0.5 * pm * dm + 0.5 * w * (11 / dm) * pm) + 0.5 * p / 3;

        PlainPatternSum sum = new(5);
        void Turn(double w, params int[] qubits)
        {
            sum.Rotate(qubits.Sum(q => 1 << (q - 1)), qubits.Length == 1 ? single : Several(w));
            if (qubits.Contains(1))
            {
                sum.Z(1, 0.5 * w / 11 * pX * dm);
            }
        }

        void Store(params int[] qubits)
        {
            foreach (int q in qubits)
            {
                sum.X(q, q == 1 ? 0.5 * pX * dm : 0.5 * (5.0 / 11) * pX * dm);
                sum.Z(q, q == 1 ? 0.5 * pX * dm : 0.5 * (11.0 / 5) * pZ * dm);
            }
        }

        Turn(0, 2); Turn(0, 3); Turn(0, 4); Turn(15, 2, 3, 4);
        Store(2, 3, 4);
        Turn(11 + 10, 1, 2, 3); Turn(11 + 15, 1, 2, 4);
        Store(1, 2, 3, 4);
        Turn(11 + 15, 1, 3, 4); Turn(11 + 20, 1, 4, 5); Turn(0, 5);
        Store(1, 2, 3, 4, 5);
        Turn(11 + 20, 1, 2, 5); Turn(11 + 20, 1, 3, 5);
        Store(1, 2, 3, 4, 5);
        Turn(11 + 20, 1, 2, 3, 4, 5); Turn(15, 3, 4, 5);
        sum.X(1, 0.5 * pX * (dm + 22));
        sum.Z(1, 0.5 * pX * (dm + 22));
        Store(2, 3, 4, 5);
        Turn(20, 2, 4, 5); Turn(20, 2, 3, 5);
        Store(2, 3, 4, 5);
        double accepted = sum.Accepted(1, (_, _) => 1);
        double bad = sum.Accepted(1, (x, z) => x == 1 ? 0.5 : z);

        LevelResult level = FactoryEvaluation.FirstLevel(d, new NoiseTable(new FactoryNoise(Law, p)));
        Assert.Equal(accepted, level.Acceptance, Rounding);
        Assert.Equal(bad / accepted, level.OutputError, Rounding * level.OutputError);
    }

    [Theory]
    [InlineData(1e-3)]
    [InlineData(1e-9)]
    public void Second_level_equals_a_plain_sum_over_its_events(double p)
    {
        PatchDistances d = new(25, 11, 13);
        PatchErrors patch = new(p * 1e-4, p, p * 0.1);
        double ell = 160;
        double time = 15;
        (double D, double Z, double m, double pm) = (25, 11, 13, patch.M);

        PlainPatternSum sum = new(5);
        void Turn(double w, bool disturbs, params int[] qubits)
        {
            double error = (p + 0.5 * ell * pm) + 0.5 * (0.5 * ell * pm + 0.5 * (w + m) * (D / m) * pm);
            sum.Rotate(qubits.Sum(q => 1 << (q - 1)), error);
            if (disturbs)
            {
                sum.Z(1, 0.5 * (w + m) * (m / D) * patch.X);
            }
        }

        void Store(params int[] qubits)
        {
            foreach (int q in qubits)
            {
                sum.X(q, q == 1 ? 0.5 * patch.X * time : 0.5 * (Z / D) * patch.X * time);
                sum.Z(q, q == 1 ? 0.5 * patch.X * time : 0.5 * (D / Z) * patch.Z * time);
            }
        }

        Turn(D + Z, false, 2); Turn(3 * Z, false, 3);
        Store(2, 3);
        Turn(D + 3 * Z, false, 4); Turn(Z, false, 5);
        Store(2, 3, 4, 5);
        Turn(D + 2 * Z, true, 1, 2, 3); Turn(4 * Z, false, 2, 3, 4);
        Store(1, 2, 3, 4, 5);
        Turn(D + 3 * Z, true, 1, 3, 4); Turn(D + 4 * Z, true, 1, 2, 4);
        Store(1, 2, 3, 4, 5);
        Turn(D + 4 * Z, true, 1, 2, 5); Turn(D + 4 * Z, true, 1, 4, 5);
        Store(1, 2, 3, 4, 5);
        Turn(D + 4 * Z, true, 1, 3, 5); Turn(D + 4 * Z, true, 1, 2, 3, 4, 5);
        Store(1, 2, 3, 4, 5);
        Turn(D + 4 * Z, true, 2, 4, 5); Turn(3 * Z, false, 3, 4, 5);
        sum.X(1, 0.5 * patch.X * (m + 2 * D));
        sum.Z(1, 0.5 * patch.X * (m + 2 * D));
        Store(2, 3, 4, 5);
        Turn(4 * Z, false, 2, 3, 5);
        Store(2, 3, 5);
        double accepted = sum.Accepted(1, (_, _) => 1);
        double bad = sum.Accepted(1, (x, z) => x == 1 ? 0.5 : z);

        LevelResult level = LevelSum.Of(
            new LevelPlan(FifteenToOneSchedules.SecondLevel), LevelNoise.FedByFactories(d, patch, p, ell, time));
        Assert.Equal(accepted, level.Acceptance, Rounding);
        Assert.Equal(bad / accepted, level.OutputError, Rounding * level.OutputError);
    }

    [Theory]
    [InlineData(1e-3)]
    [InlineData(1e-8)]
    public void A_table_of_seven_qubits_and_four_outputs_gives_the_twenty_to_four_protocol(double p)
    {
        // rotations of Litinski 2019, arXiv:1905.06903; weights of all accepted patterns and of those with a wrong output by exact
        // enumeration of 2^20 patterns
        double[] passing = [1, 0, 22, 160, 589, 1888, 4936, 9760, 15538, 20960, 23364, 20960, 15538, 9760, 4936, 1888, 589, 160, 22, 0, 1];
        double[] wrong = [0, 0, 22, 160, 509, 1888, 4348, 9760, 13512, 20960, 20568, 20960, 13498, 9760, 4356, 1888, 512, 160, 18, 0, 1];
        int[][] rotations =
        [
            [5], [6], [1, 5, 6], [5, 6, 7], [1, 6, 7], [7], [1, 5, 7], [2, 5, 6], [1, 2, 3, 4, 6], [2, 5, 7], [1, 2, 3, 4, 5], [2, 6, 7],
            [1, 2, 3, 4, 5, 6, 7], [3, 5, 6], [1, 2, 3, 4, 7], [3, 5, 7], [3, 6, 7], [4, 5, 6], [4, 5, 7], [4, 6, 7],
        ];
        LevelResult level = Perfect(rotations, outputs: 4, qubits: 7, DistillationSchedule.InfidelityOfTStates(4), p);

        double accepted = Weigh(passing, p);
        Assert.Equal(accepted, level.Acceptance, Rounding);
        Assert.Equal(Weigh(wrong, p) / accepted, 4 * level.OutputError, Rounding * level.OutputError * 4);
    }

    [Theory]
    [InlineData(1e-3)]
    [InlineData(1e-8)]
    public void A_table_of_four_qubits_gives_the_eight_to_ccz_protocol(double p)
    {
        // P_acc = [1 + (1−2p)^8]/2 and P_acc p_out = 28 p²(1−p)^6 + 56 p⁴(1−p)^4 + 28 p⁶(1−p)² (exact); any Z spoils the state
        int[][] rotations = [[1, 4], [4], [1, 2, 4], [1, 3, 4], [1, 2, 3, 4], [2, 3, 4], [2, 4], [3, 4]];
        double[] infidelity = new double[64];
        Array.Fill(infidelity, 1, 1, 63);
        LevelResult level = Perfect(rotations, outputs: 3, qubits: 4, infidelity, p);

        double accepted = (1 + Math.Pow(1 - 2 * p, 8)) / 2;
        double wrong = Weigh([0, 0, 28, 0, 56, 0, 28, 0, 0], p);
        Assert.Equal(accepted, level.Acceptance, Rounding);
        Assert.Equal(wrong / accepted, 3 * level.OutputError, Rounding * level.OutputError * 3);
    }

    private static LevelResult Perfect(int[][] rotations, int outputs, int qubits, double[] infidelity, double inputError)
    {
        DistillationStep[] steps = [.. rotations.Select(r => new DistillationStep([new Rotation(Of(r), 0, 0, None)], None, None))];
        LevelNoise noise = LevelNoise.FedByFactories(new PatchDistances(15, 7, 9), default, inputError, 0, 9);
        return LevelSum.Of(new LevelPlan(new DistillationSchedule(outputs, qubits, steps, infidelity)), noise);
    }

    private static double Weigh(double[] patterns, double p) =>
        patterns.Select((count, weight) => count * Math.Pow(p, weight) * Math.Pow(1 - p, patterns.Length - 1 - weight)).Sum();
}
