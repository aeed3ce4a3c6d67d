using System.Numerics;
using FtEstimate.MagicStates;
using MathNet.Numerics.RootFinding;

namespace FtEstimate.Tests.MagicStates;

public sealed class FifteenToOneTests
{
    [Theory]
    [InlineData(1e-12)]
    [InlineData(1e-4)]
    [InlineData(0.01)]
    [InlineData(0.14)]
    [InlineData(0.5)]
    public void Polynomials_equal_the_sum_over_all_patterns_of_faulty_inputs(double p)
    {
        // The inputs are the fifteen non-zero points of four bits. A pattern passes when its points add up to zero (the four X checks of
        // the punctured Reed-Muller code, Bravyi 2005, arXiv:quant-ph/0403025) and is a logical error when its weight is odd.
        double accepted = 0;
        double bad = 0;
        for (int pattern = 0; pattern < 1 << 15; pattern++)
        {
            int sum = 0;
            for (int input = 1; input <= 15; input++)
            {
                sum ^= ((pattern >> (input - 1)) & 1) * input;
            }

            if (sum == 0)
            {
                int weight = BitOperations.PopCount((uint)pattern);
                double probability = Math.Pow(p, weight) * Math.Pow(1 - p, 15 - weight);
                accepted += probability;
                bad += weight % 2 == 1 ? probability : 0;
            }
        }

        // rounding of some 2000 additions
        Assert.Equal(accepted, FifteenToOne.Acceptance(p), 1e-12 * accepted);
        Assert.Equal(bad / accepted, FifteenToOne.OutputError(p), 1e-12 * bad / accepted);
    }

    [Theory]
    [InlineData(1e-2, 0.860090, 3.6088e-5)]
    [InlineData(1e-3, 0.985105, 3.5105e-8)]
    [InlineData(1e-4, 0.998501, 3.5011e-11)]
    public void Values_equal_an_exact_enumeration_to_the_digits_kept(double p, double acceptance, double outputError)
    {
        // exact enumeration of all 2^15 patterns in other arithmetic, rounded to six and five digits
        Assert.Equal(acceptance, FifteenToOne.Acceptance(p), 5e-7);
        Assert.Equal(outputError, FifteenToOne.OutputError(p), 0.00005 * Math.Pow(10, Math.Floor(Math.Log10(outputError))));
    }

    [Theory]
    [InlineData(1e-3)]
    [InlineData(0.02)]
    [InlineData(0.3)]
    public void Output_error_equals_the_closed_form_where_that_has_digits(double p)
    {
        // Bravyi 2005, arXiv:quant-ph/0403025; four numbers near 16 cancel, which leaves an absolute error of some 1e-15
        double e = 1 - 2 * p;
        double closed = (1 - 15 * Math.Pow(e, 7) + 15 * Math.Pow(e, 8) - Math.Pow(e, 15)) / (2 * (1 + 15 * Math.Pow(e, 8)));
        Assert.Equal(closed, FifteenToOne.OutputError(p), 1e-14);
    }

    [Fact]
    public void Small_errors_follow_thirty_five_times_the_cube()
    {
        // next order: 35 p³ (1 + 3 p + ...)
        double p = 1e-12;
        Assert.Equal(35e-36, FifteenToOne.OutputError(p), 35e-36 * 1e-11);
    }

    [Fact]
    public void The_fixed_point_is_where_output_error_equals_input_error()
    {
        double root = Brent.FindRoot(p => FifteenToOne.OutputError(p) - p, 0.05, 0.3, 1e-12);
        Assert.Equal(FifteenToOne.FixedPoint, root, 5e-6);
    }

    [Theory]
    [InlineData(-1e-9)]
    [InlineData(0.51)]
    [InlineData(double.NaN)]
    public void Errors_that_are_no_error_of_a_state_are_refused(double p)
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => FifteenToOne.OutputError(p));
        Assert.Throws<ArgumentOutOfRangeException>(() => FifteenToOne.Acceptance(p));
    }
}
