using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Fill;

/// <summary>
/// Bridges by Gaussian-process regression on the angular velocity. Several models of the motion are asked and weighted by how well
/// each explains the neighbourhood (Rasmussen and Williams 2006, section 5.2).
/// </summary>
internal sealed class GaussianBridge(Increments increments, MotionModels learned)
{
    // How much of the evidence is believed. No model is true of a living joint, yet with sixty neighbours of three axes the least wrong
    // one would silence all others; at a tenth each still has its say (tempering: Grunwald and van Ommen 2017).
    private const double Belief = 0.1;

    /// <summary>Expected turns, shares of the closing error and expected squared errors of the intervals of a run.</summary>
    public (Vec3[] Turns, double[] Shares, double[] SquaredErrors) Across(OpenRun run)
    {
        var (first, count) = (run.First - 1, run.Count + 1);
        var (models, neighbours) = learned.About(first, count);
        var beside = increments.Beside(first, count, neighbours);
        var posteriors = Array.ConvertAll(models, m => new Posterior(m, increments, beside, first, count));
        var weights = Weights(posteriors);
        var (turns, shares) = (new Vec3[count], new double[count]);
        for (var m = 0; m < posteriors.Length; m++)
        {
            for (var g = 0; g < count; g++)
            {
                turns[g] += weights[m] * posteriors[m].Turns[g];
                shares[g] += weights[m] * posteriors[m].Shares[g];
            }
        }

        return (turns, shares, SquaredErrors(posteriors, weights, turns));
    }

    private static double[] Weights(Posterior[] posteriors)
    {
        var evidence = Array.ConvertAll(posteriors, p => p.Evidence);
        var top = evidence.Max();
        var weights = Array.ConvertAll(evidence, e => Math.Exp(Belief * (e - top)));
        var sum = weights.Sum();
        return Array.ConvertAll(weights, w => w / sum);
    }

    /// <summary>The spread within each model, and of the models' closed sums about the mean of all.</summary>
    private static double[] SquaredErrors(Posterior[] posteriors, double[] weights, Vec3[] turns)
    {
        var total = turns.Aggregate(Vec3.Zero, (a, b) => a + b);
        var result = new double[turns.Length];
        var mean = new Vec3[turns.Length];
        var sums = Array.ConvertAll(posteriors, p => ClosedSums(p, total));
        for (var g = 0; g < turns.Length; g++)
        {
            for (var m = 0; m < posteriors.Length; m++)
            {
                mean[g] += weights[m] * sums[m][g];
            }

            for (var m = 0; m < posteriors.Length; m++)
            {
                result[g] += weights[m] * (posteriors[m].SquaredErrors[g] + (sums[m][g] - mean[g]).NormSquared);
            }
        }

        return result;
    }

    private static Vec3[] ClosedSums(Posterior posterior, Vec3 total)
    {
        var open = posterior.Turns.Aggregate(Vec3.Zero, (a, b) => a + b);
        var sums = new Vec3[posterior.Turns.Length];
        var sum = Vec3.Zero;
        for (var g = 0; g < sums.Length; g++)
        {
            sum += posterior.Turns[g] + (posterior.Shares[g] * (total - open));
            sums[g] = sum;
        }

        return sums;
    }
}
