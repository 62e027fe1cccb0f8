package ladderwell.gaussian;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.TreeSet;
import ladderwell.evidence.Bound;
import ladderwell.evidence.PhysicsException;
import ladderwell.numeric.Interruption;
import ladderwell.numeric.LegendreRule;
import ladderwell.operator.OperatorFormula;

/**
 * The flow where H varies: in each step E′ = A E, q′ = A q + b and N′ = A N + N Aᵀ + D are solved by collocation at 16 Gauss points (order
 * 32 at the end of a step), iterated to rounding.
 *
 * <p>Bound. The interpolated derivative differs from A E (A q + b, …) by the residual, measured at 24 other Gauss points. An error c
 * made at time s reaches the end T as at most ‖Φ(T, s)‖ c (its square for covariances), and ‖Φ(T, s)‖ is at most the product of the
 * norms of the steps between, and at most ‖S(T)‖ ‖S(s)‖ e^{−Γ(T−s)/2} with S = e^{Γt/2} E, det S = 1. Both sums are kept, the smaller one
 * counts.
 */
final class SteppedFlow {
    private static final int NODES = 16;
    private static final int BETWEEN = 24;
    /** E (4, by rows), q (2), N (3: xx, xp, pp). */
    private static final int UNKNOWNS = 9;

    private static final int MOST_ITERATIONS = 80;
    private static final int MOST_STEPS = 5_000_000;
    /** Largest ‖A‖ h: beyond, the iteration gets slow. */
    private static final double LONGEST_STEP = 1.5;

    private static final double U = 0x1p-50;

    /** Nodes on (0, 1), their weights, integrals and values of the basis polynomials at the points between. */
    private static final double[] AT = new double[NODES];

    private static final double[] WEIGHT = new double[NODES];
    private static final double[] POINT = new double[BETWEEN];
    private static final double[] POINT_WEIGHT = new double[BETWEEN];
    private static final double[][] INTEGRAL = new double[NODES][NODES];
    private static final double[][] POINT_INTEGRAL = new double[BETWEEN][NODES];
    private static final double[][] POINT_VALUE = new double[BETWEEN][NODES];

    static {
        rule(AT, WEIGHT);
        rule(POINT, POINT_WEIGHT);
        for (int i = 0; i < NODES; i++) {
            integrals(AT[i], INTEGRAL[i]);
        }
        for (int i = 0; i < BETWEEN; i++) {
            integrals(POINT[i], POINT_INTEGRAL[i]);
            for (int j = 0; j < NODES; j++) {
                POINT_VALUE[i][j] = basis(j, POINT[i]);
            }
        }
    }

    private static void rule(double[] at, double[] weight) {
        double[][] rule = LegendreRule.of(at.length);
        for (int i = 0; i < at.length; i++) {
            at[i] = (1 + rule[0][i]) / 2;
            weight[i] = rule[1][i] / 2;
        }
    }

    /** ∫_0^x of each basis polynomial, exact by the Gauss rule on (0, x). */
    private static void integrals(double x, double[] out) {
        for (int j = 0; j < NODES; j++) {
            double sum = 0;
            for (int g = 0; g < NODES; g++) {
                sum += WEIGHT[g] * basis(j, x * AT[g]);
            }
            out[j] = x * sum;
        }
    }

    private static double basis(int j, double x) {
        double product = 1;
        for (int k = 0; k < NODES; k++) {
            if (k != j) {
                product *= (x - AT[k]) / (AT[j] - AT[k]);
            }
        }
        return product;
    }

    private final Drift drift;
    private final double tolerance;

    private double time;
    private double x;
    private double p;
    private double xx;
    private double xp;
    private double pp;
    /** e^{Γt/2} E from the start on. */
    private final double[] unimodular = {1, 0, 0, 1};

    private double meanByStep;
    private double meanByFlow;
    private double covarianceByStep;
    private double covarianceByFlow;

    private final double[][] field = new double[NODES][Drift.SIZE];
    private final double[][] value = new double[NODES][UNKNOWNS];
    private final double[][] slope = new double[NODES][UNKNOWNS];
    private final double[] end = new double[UNKNOWNS];
    private double flowResidual;
    private double forceResidual;
    private double noiseResidual;
    private double amplification;

    SteppedFlow(Drift drift, GaussianState start, double tolerance) {
        this.drift = drift;
        this.tolerance = tolerance;
        x = start.x();
        p = start.p();
        xx = start.xx();
        xp = start.xp();
        pp = start.pp();
    }

    List<GaussianPoint> path(double[] times) {
        List<GaussianPoint> points = new ArrayList<>();
        double last = times.length == 0 ? 0 : times[times.length - 1];
        double[] breaks = breaks(last);
        int next = 0;
        double[] steps = {last / 16, 0};
        for (double t : times) {
            while (next < breaks.length && breaks[next] <= time) {
                next++;
            }
            while (time < t) {
                double limit = next < breaks.length && breaks[next] < t ? breaks[next] : t;
                advance(limit, steps, last);
                if (next < breaks.length && time >= breaks[next]) {
                    next++;
                }
            }
            points.add(point(t));
        }
        return List.copyOf(points);
    }

    private double[] breaks(double last) {
        TreeSet<Double> all = new TreeSet<>();
        if (last > 0) {
            for (OperatorFormula.Term term : drift.terms()) {
                for (double at : term.factor().breakTimes(0, last)) {
                    all.add(at);
                }
            }
        }
        return all.stream().mapToDouble(Double::doubleValue).toArray();
    }

    /** Steps to the limit; steps[0] is the length to try, steps[1] how many were made. */
    private void advance(double limit, double[] steps, double last) {
        while (time < limit) {
            Interruption.check();
            if (steps[1]++ > MOST_STEPS) {
                throw new PhysicsException.NotConverged("the Gaussian motion", MOST_STEPS, meanError(), tolerance);
            }
            double h = Math.min(steps[0], limit - time);
            boolean whole = h >= limit - time;
            if (!whole && h < 16 * Math.ulp(time)) {
                throw new PhysicsException.NotConverged(
                        "the Gaussian motion at t = " + time, (long) steps[1], meanError(), tolerance);
            }
            if (!solve(h)) {
                steps[0] = h / 2;
                continue;
            }
            double size = Math.sqrt(xx * xx + 2 * xp * xp + pp * pp);
            double length = Math.hypot(x, p);
            double flowError = amplification * flowResidual;
            double meanError = flowError * length + amplification * forceResidual;
            double norm = norm2(end);
            double covarianceError =
                    (2 * norm + flowError) * flowError * size + amplification * amplification * noiseResidual;
            double allowed = 0.1 * tolerance * h / last;
            // below this the residual is rounding, which shorter steps do not lessen
            double floor = 64 * U * (1 + length + size);
            double worst = Math.max(meanError, covarianceError);
            if (worst > Math.max(allowed, floor)) {
                steps[0] = h * Math.max(0.25, 0.8 * Math.pow(allowed / worst, 1.0 / NODES));
                continue;
            }
            take(h, meanError, covarianceError, norm);
            time = whole ? limit : time + h;
            double grow = worst == 0 ? 2 : 0.8 * Math.pow(Math.max(allowed, floor) / worst, 1.0 / NODES);
            steps[0] = Math.max(whole ? steps[0] : 0, h * Math.min(2, Math.max(0.5, grow)));
        }
    }

    /** Solves one step into {@link #end} and the residuals; false if it is too long. */
    private boolean solve(double h) {
        double largest = 0;
        for (int i = 0; i < NODES; i++) {
            drift.at(time + h * AT[i], field[i]);
            largest = Math.max(largest, size(field[i]));
            Arrays.fill(value[i], 0);
            value[i][0] = 1;
            value[i][3] = 1;
        }
        if (largest * h > LONGEST_STEP) {
            return false;
        }
        double change = Double.POSITIVE_INFINITY;
        for (int k = 0; k < MOST_ITERATIONS; k++) {
            for (int i = 0; i < NODES; i++) {
                derivative(field[i], value[i], slope[i]);
            }
            double moved = 0;
            for (int i = 0; i < NODES; i++) {
                for (int u = 0; u < UNKNOWNS; u++) {
                    double sum = 0;
                    for (int j = 0; j < NODES; j++) {
                        sum += INTEGRAL[i][j] * slope[j][u];
                    }
                    double now = h * sum + (u == 0 || u == 3 ? 1 : 0);
                    moved = Math.max(moved, Math.abs(now - value[i][u]) / (1 + Math.abs(now)));
                    value[i][u] = now;
                }
            }
            // what is left of the iteration is part of the residual; stop where it no longer falls
            if (moved == 0 || moved < 1e-15 && moved >= 0.5 * change) {
                break;
            }
            change = moved;
        }
        for (int u = 0; u < UNKNOWNS; u++) {
            double sum = 0;
            for (int j = 0; j < NODES; j++) {
                sum += WEIGHT[j] * slope[j][u];
            }
            end[u] = h * sum + (u == 0 || u == 3 ? 1 : 0);
        }
        residuals(h);
        return true;
    }

    private void residuals(double h) {
        double[] at = new double[Drift.SIZE];
        double[] there = new double[UNKNOWNS];
        double[] wanted = new double[UNKNOWNS];
        double[] off = new double[UNKNOWNS];
        flowResidual = 0;
        forceResidual = 0;
        noiseResidual = 0;
        double total = 0;
        for (int i = 0; i < BETWEEN; i++) {
            drift.at(time + h * POINT[i], at);
            for (int u = 0; u < UNKNOWNS; u++) {
                double sum = 0;
                double derivative = 0;
                for (int j = 0; j < NODES; j++) {
                    sum += POINT_INTEGRAL[i][j] * slope[j][u];
                    derivative += POINT_VALUE[i][j] * slope[j][u];
                }
                there[u] = h * sum + (u == 0 || u == 3 ? 1 : 0);
                off[u] = derivative;
            }
            derivative(at, there, wanted);
            for (int u = 0; u < UNKNOWNS; u++) {
                off[u] -= wanted[u];
            }
            double w = h * POINT_WEIGHT[i];
            flowResidual += w * Math.hypot(Math.hypot(off[0], off[1]), Math.hypot(off[2], off[3]));
            forceResidual += w * Math.hypot(off[4], off[5]);
            noiseResidual += w * Math.sqrt(off[6] * off[6] + 2 * off[7] * off[7] + off[8] * off[8]);
            total += w * size(at);
        }
        amplification = Math.exp(total);
    }

    /** ‖A‖ in the Frobenius norm. */
    private double size(double[] at) {
        double a = at[0] - drift.damping / 2;
        double d = -at[0] - drift.damping / 2;
        return Math.sqrt(a * a + at[1] * at[1] + at[2] * at[2] + d * d);
    }

    private void derivative(double[] at, double[] v, double[] out) {
        double a = at[0] - drift.damping / 2;
        double b = at[1];
        double c = at[2];
        double d = -at[0] - drift.damping / 2;
        out[0] = a * v[0] + b * v[2];
        out[1] = a * v[1] + b * v[3];
        out[2] = c * v[0] + d * v[2];
        out[3] = c * v[1] + d * v[3];
        out[4] = a * v[4] + b * v[5] + at[3];
        out[5] = c * v[4] + d * v[5] + at[4];
        out[6] = 2 * (a * v[6] + b * v[7]) + drift.noiseXx;
        out[7] = c * v[6] + (a + d) * v[7] + b * v[8] + drift.noiseXp;
        out[8] = 2 * (c * v[7] + d * v[8]) + drift.noisePp;
    }

    /** Largest singular value of [[m0, m1], [m2, m3]]. */
    private static double norm2(double[] m) {
        double sum = Math.hypot(m[0] + m[3], m[1] - m[2]);
        double difference = Math.hypot(m[0] - m[3], m[1] + m[2]);
        return (sum + difference) / 2;
    }

    private void take(double h, double meanError, double covarianceError, double norm) {
        double size = Math.sqrt(xx * xx + 2 * xp * xp + pp * pp);
        double length = Math.hypot(x, p);
        double e0 = end[0];
        double e1 = end[1];
        double e2 = end[2];
        double e3 = end[3];
        // what an error made in this step is carried on from its start by
        double before = norm2(unimodular);
        double decay = Math.exp(-drift.damping * h / 2);
        double grow = 1 / decay;

        double newX = e0 * x + e1 * p + end[4];
        double newP = e2 * x + e3 * p + end[5];
        double newXx = e0 * e0 * xx + 2 * e0 * e1 * xp + e1 * e1 * pp + end[6];
        double newXp = e0 * e2 * xx + (e0 * e3 + e1 * e2) * xp + e1 * e3 * pp + end[7];
        double newPp = e2 * e2 * xx + 2 * e2 * e3 * xp + e3 * e3 * pp + end[8];
        x = newX;
        p = newP;
        xx = newXx;
        xp = newXp;
        pp = newPp;
        if (!Double.isFinite(x + p + xx + xp + pp)) {
            throw new IllegalArgumentException("the mode runs away: by t = " + (time + h)
                    + " its means or variances are beyond the largest numbers");
        }
        double meanPart = meanError + U * (norm * length + Math.hypot(x, p));
        double covariancePart = covarianceError + U * (norm * norm * size + Math.sqrt(xx * xx + 2 * xp * xp + pp * pp));
        meanByStep = norm * meanByStep + meanPart;
        covarianceByStep = norm * norm * covarianceByStep + covariancePart;

        double u0 = grow * (e0 * unimodular[0] + e1 * unimodular[2]);
        double u1 = grow * (e0 * unimodular[1] + e1 * unimodular[3]);
        double u2 = grow * (e2 * unimodular[0] + e3 * unimodular[2]);
        double u3 = grow * (e2 * unimodular[1] + e3 * unimodular[3]);
        unimodular[0] = u0;
        unimodular[1] = u1;
        unimodular[2] = u2;
        unimodular[3] = u3;
        // the part is made within the step: its end is what it is carried on from, at most norm2 of the step away from
        // the start
        double carried = Math.max(before, norm2(unimodular));
        meanByFlow = decay * meanByFlow + meanPart * carried;
        covarianceByFlow = decay * decay * covarianceByFlow + covariancePart * carried * carried;
    }

    private double meanError() {
        double byFlow = norm2(unimodular) * meanByFlow;
        return byFlow <= meanByStep ? byFlow : meanByStep;
    }

    private GaussianPoint point(double t) {
        double norm = norm2(unimodular);
        double byFlow = norm * norm * covarianceByFlow;
        double covariance = byFlow <= covarianceByStep ? byFlow : covarianceByStep;
        return GaussianPoint.of(
                t,
                x,
                p,
                xx,
                xp,
                pp,
                Bound.estimated(1.01 * meanError() + U * Math.hypot(x, p)),
                Bound.estimated(1.01 * covariance + U * (xx + pp)));
    }
}
