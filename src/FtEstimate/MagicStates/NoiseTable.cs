using FtEstimate.MagicStates.Distillation;

namespace FtEstimate.MagicStates;

/// <summary>The noise with each patch error worked out once. Not for use by several threads at a time.</summary>
internal sealed class NoiseTable(FactoryNoise noise)
{
    private double[] _errors = NotYet(64);

    public double InjectedError { get; } = Math.Clamp(noise.InjectedError, 0, 0.75);

    public PatchErrors At(PatchDistances distances) => new(At(distances.X), At(distances.Z), At(distances.M));

    private static double[] NotYet(int size)
    {
        double[] errors = new double[size];
        Array.Fill(errors, double.NaN);
        return errors;
    }

    private double At(int distance)
    {
        if (distance >= _errors.Length)
        {
            double[] known = _errors;
            _errors = NotYet(2 * distance);
            known.CopyTo(_errors, 0);
        }

        double error = _errors[distance];
        if (double.IsNaN(error))
        {
            error = Math.Clamp(noise.LogicalErrorPerRound(distance), 0, 1);
            _errors[distance] = error;
        }

        return error;
    }
}
