package ladderwell;

import java.util.Arrays;
import ladderwell.evidence.Bound;
import ladderwell.level.Levels;
import ladderwell.numeric.DensityFrames;
import ladderwell.numeric.Interruption;
import ladderwell.numeric.Workers;
import ladderwell.window.PureWindow;
import ladderwell.window.WindowMotion;
import ladderwell.window.WindowState;

/** |ψ(x, t)|² or ⟨x|ρ|x⟩ of states in windows, on a grid that covers the motion. */
final class WindowDensity {
    /** Spreads that the grid reaches beyond the mean position. */
    private static final double MARGIN = 5.5;
    /** |φ_n| is below 0.82 everywhere (Cramér). */
    private static final double HIGHEST = 0.82;

    private WindowDensity() {}

    static Density of(Run run, WindowMotion motion, int points) {
        if (points < 2) {
            throw new IllegalArgumentException("a density needs at least 2 points, not " + points);
        }
        Memory.require(
                "a density of " + motion.size() + " times and " + points + " points",
                (double) Double.BYTES
                        * points
                        * (motion.size() + 2.0 * motion.work().mostLevels()),
                "ask for fewer frames or fewer points");
        double[] x = grid(run, motion.size(), points);
        double[][] values = new double[motion.size()][];
        double error = 0;
        for (int j = 0; j < values.length; j++) {
            Interruption.check();
            WindowState state = motion.displaced(j);
            double[][] functions = Levels.harmonic()
                    .waveFunctions(
                            state.first(),
                            state.levels(),
                            seen(x, motion.displacementRe(j).value()));
            values[j] = frame(state, functions, points);
            double off = state.traceNormError().size();
            // inside the window |⟨x|δ|x⟩| ≤ Σ φ² ‖δ‖; what lies above adds as much again
            double levels = state.levels();
            error = Math.max(
                    error,
                    2 * HIGHEST * HIGHEST * Math.min(1, 4 / Math.sqrt(levels)) * levels * off
                            + 2 * levels * Levels.harmonic().waveFunctionError(state.first() + state.levels() - 1));
        }
        return new Density(run, x, values, Bound.estimated(error), "sum over number states");
    }

    /** The same places in the frame of the window. */
    private static double[] seen(double[] x, double displacement) {
        double[] seen = new double[x.length];
        for (int i = 0; i < x.length; i++) {
            seen[i] = x[i] - Math.sqrt(2) * displacement;
        }
        return seen;
    }

    private static double[] grid(Run run, int times, int points) {
        Series position = run.series(Observable.POSITION);
        Series spread = run.series(Observable.SPREAD_OF_POSITION);
        double left = Double.POSITIVE_INFINITY;
        double right = Double.NEGATIVE_INFINITY;
        for (int j = 0; j < times; j++) {
            left = Math.min(left, position.value(j) - MARGIN * spread.value(j));
            right = Math.max(right, position.value(j) + MARGIN * spread.value(j));
        }
        // a mode is seen about its middle unless it never comes near it
        double far = Math.max(Math.abs(left), Math.abs(right));
        if (left < 0 && right > 0) {
            left = -far;
            right = far;
        }
        double[] x = new double[points];
        for (int i = 0; i < points; i++) {
            x[i] = left + (right - left) * i / (points - 1);
        }
        return x;
    }

    private static double[] frame(WindowState state, double[][] functions, int points) {
        double[] sum = new double[points];
        if (state instanceof PureWindow pure) {
            double[][] frames = DensityFrames.of(functions)
                    .of(new double[][] {pure.reals()}, new double[][] {pure.imaginaries()}, Workers.CALLER);
            return frames[0];
        }
        double[] row = new double[points];
        for (int m = 0; m < state.levels(); m++) {
            // Σ_n Re ρ_mn φ_n over the lower triangle, off-diagonal elements twice
            Arrays.fill(row, 0);
            for (int n = 0; n <= m; n++) {
                double weight = (n == m ? 1 : 2) * state.re(m, n);
                double[] f = functions[n];
                for (int i = 0; i < points; i++) {
                    row[i] += weight * f[i];
                }
            }
            double[] f = functions[m];
            for (int i = 0; i < points; i++) {
                sum[i] += row[i] * f[i];
            }
        }
        return sum;
    }
}
