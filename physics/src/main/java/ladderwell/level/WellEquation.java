package ladderwell.level;

import java.math.BigDecimal;
import java.math.MathContext;
import ladderwell.evidence.PhysicsException;
import ladderwell.numeric.DoubleDouble;

/**
 * The equation of the bound levels of a finite well, solved in double-double and enclosed.
 *
 * <p>With z = k/2, z₀ = √(V₀/2) and sin θ = z/z₀ every level n = 0, 1, … of either parity obeys z₀ sin θ + θ = (n+1) π/2, whose
 * left side grows with θ from 0 to z₀ + π/2 at the rim: level n exists just when z₀ &gt; n π/2, there is one root for each, and none
 * can be skipped. (The textbook condition, for instance Schiff, Quantum Mechanics, sec. 9, solved for the phase: √ε π = nπ − 2
 * asin √(ε/v).)
 *
 * <p>Two unknowns keep every digit. Deep levels: θ itself. Levels near the rim, where θ → π/2 and E → V₀ say nothing about κ: β =
 * π/2 − θ, which obeys β + z₀ (1 − cos β) = z₀ − nπ/2, all terms positive. The right side of the top level, where the difference may
 * be a hair, is taken as (V₀/2 − n²π²/4) / (z₀ + nπ/2) with the numerator to 60 digits.
 *
 * <p>Enclosure: for a residual r evaluated with error ε the root lies within (|r| + ε) / (least slope between) by the mean value
 * theorem; slopes are known in sign and monotone.
 */
final class WellEquation {
    /** Shallowest well: below, the binding energy V₀²/2 nears the smallest double. */
    static final double LEAST_DEPTH = 1e-100;

    /** Deepest well: 4.5e11 levels; level numbers and z₀ keep full precision. */
    static final double LARGEST_DEPTH = 1e24;

    /** Relative error of one evaluated term: about ten operations of 2^−103. */
    private static final double TERM = 0x1p-99;

    private static final DoubleDouble EIGHTH_TURN = DoubleDouble.QUARTER_TURN.times(0.5);

    // OEIS A002388: π² to 78 decimals.
    private static final BigDecimal PI_SQUARED =
            new BigDecimal("9.869604401089358618834490999876151135313699407240790626413349376220044822419205");

    private final double depth;
    private final DoubleDouble rim;
    private final long count;

    WellEquation(double depth) {
        if (!(depth >= LEAST_DEPTH && depth <= LARGEST_DEPTH)) {
            throw new IllegalArgumentException(
                    "the depth of a finite well must be between 1e-100 and 1e24 ħ²/(m L²), got " + depth);
        }
        this.depth = depth;
        rim = DoubleDouble.of(depth / 2).sqrt();
        count = countLevels();
    }

    long count() {
        return count;
    }

    /** Number of n ≥ 0 with n² π²/2 &lt; V₀, decided with 60 digits (π² is irrational: equality does not occur). */
    private long countLevels() {
        long n = (long) Math.ceil(Math.sqrt(2 * depth) / Math.PI);
        while (n > 1 && aboveThreshold(n - 1).signum() <= 0) {
            n--;
        }
        while (aboveThreshold(n).signum() > 0) {
            n++;
        }
        return n;
    }

    /** V₀/2 − n²π²/4, positive just when level n exists. */
    private BigDecimal aboveThreshold(long n) {
        BigDecimal quarterTurns = new BigDecimal(n).pow(2).multiply(PI_SQUARED).divide(BigDecimal.valueOf(4));
        return new BigDecimal(depth / 2).subtract(quarterTurns);
    }

    WellLevel solve(long n) {
        DoubleDouble room = room(n);
        double slack = n == count - 1 ? 4 * TERM * room.hi() : 4 * TERM * rim.hi();
        boolean nearRim = EIGHTH_TURN
                        .plus(rim.times(SmallAngle.versine(EIGHTH_TURN)))
                        .minus(room)
                        .hi()
                >= 0;
        return nearRim ? nearRim(n, room, slack) : deep(n);
    }

    /** z₀ − nπ/2. */
    private DoubleDouble room(long n) {
        DoubleDouble below = DoubleDouble.QUARTER_TURN.times((double) n);
        if (n < count - 1) {
            return rim.minus(below);
        }
        BigDecimal difference = aboveThreshold(n).round(MathContext.DECIMAL128);
        double high = difference.doubleValue();
        double low = difference.subtract(new BigDecimal(high)).doubleValue();
        return DoubleDouble.sum(high, low).dividedBy(rim.plus(below));
    }

    /** β + z₀ (1 − cos β) = room; convex and rising. */
    private WellLevel nearRim(long n, DoubleDouble room, double slack) {
        double z0 = rim.hi();
        double d = room.hi();
        double start = 2 * d / (1 + Math.sqrt(1 + 2 * z0 * d));
        for (int i = 0; i < 8; i++) {
            double half = Math.sin(start / 2);
            start -= (start + 2 * z0 * half * half - d) / (1 + z0 * Math.sin(start));
        }
        DoubleDouble beta = DoubleDouble.of(start);
        for (int i = 0; i < 3; i++) {
            double slope = 1 + z0 * Math.sin(beta.hi());
            beta = beta.minus(DoubleDouble.of(residualNearRim(beta, room).hi() / slope));
        }
        double residual = Math.abs(residualNearRim(beta, room).hi()) + 4 * TERM * d + slack;
        // The root lies above beta − residual, since the slope is at least 1; the slope is least there.
        double leastSlope = 1 + z0 * Math.sin(Math.max(0, beta.hi() - residual)) * (1 - 0x1p-40);
        double error = residual / leastSlope * (1 + 0x1p-40);
        checkEnclosed(n, error, beta.hi());
        DoubleDouble sine = SmallAngle.sine(beta);
        DoubleDouble cosine = DoubleDouble.ONE.minus(SmallAngle.versine(beta));
        double relative = error / (beta.hi() - error);
        // E = 2 z₀² cos² β: relative change 2 tan β dβ, β ≤ π/4 + error.
        return level(cosine, sine, 2.1 * error * Math.tan(beta.hi()) + 2.1 * error * error, relative);
    }

    private DoubleDouble residualNearRim(DoubleDouble beta, DoubleDouble room) {
        return beta.minus(room).plus(rim.times(SmallAngle.versine(beta)));
    }

    /** θ + z₀ sin θ = (n+1) π/2; concave and rising. */
    private WellLevel deep(long n) {
        double z0 = rim.hi();
        DoubleDouble target = DoubleDouble.QUARTER_TURN.times((double) (n + 1));
        double t = target.hi();
        double start = t / (1 + z0);
        for (int i = 0; i < 8; i++) {
            start -= (start + z0 * Math.sin(start) - t) / (1 + z0 * Math.cos(start));
        }
        DoubleDouble theta = DoubleDouble.of(start);
        for (int i = 0; i < 3; i++) {
            double slope = 1 + z0 * Math.cos(theta.hi());
            theta = theta.minus(DoubleDouble.of(residualDeep(theta, target).hi() / slope));
        }
        double residual = Math.abs(residualDeep(theta, target).hi()) + 8 * TERM * t;
        // θ ≤ π/4 up to rounding, for the root too: cos θ ≥ 0.7.
        double error = residual / (1 + 0.7 * z0);
        checkEnclosed(n, error, theta.hi());
        DoubleDouble sine = SmallAngle.sine(theta);
        DoubleDouble cosine = DoubleDouble.ONE.minus(SmallAngle.versine(theta));
        return level(sine, cosine, 2.1 * error / theta.hi(), 1.1 * error);
    }

    private DoubleDouble residualDeep(DoubleDouble theta, DoubleDouble target) {
        return theta.minus(target).plus(rim.times(SmallAngle.sine(theta)));
    }

    /** The enclosure must be far narrower than the root; anything else is a failed iteration. */
    private static void checkEnclosed(long n, double error, double root) {
        if (!(error < 1e-10 * root)) {
            throw new PhysicsException.NotConverged("level " + n + " of the finite well", 11, error / root, 1e-10);
        }
    }

    private WellLevel level(
            DoubleDouble wallSine, DoubleDouble wallCosine, double relativeEnergy, double relativeDecay) {
        DoubleDouble waveNumber = rim.times(2).times(wallSine);
        DoubleDouble energy = waveNumber.times(waveNumber).times(0.5);
        DoubleDouble decay = rim.times(2).times(wallCosine);
        return new WellLevel(
                waveNumber,
                energy,
                energy.hi() * (relativeEnergy + 4 * TERM) * (1 + 0x1p-40),
                decay.value(),
                (relativeDecay + 4 * TERM + 0x1p-53) * (1 + 0x1p-40),
                wallSine.value(),
                wallCosine.value());
    }
}
