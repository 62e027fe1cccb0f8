package ladderwell.state;

import java.util.Arrays;
import ladderwell.numeric.DoubleDouble;
import ladderwell.numeric.DoubleDoubleFunctions;
import ladderwell.numeric.Interruption;

/**
 * Amplitudes of D(α) S(ξ) |0⟩ for α ≥ 0 real, and of S(ξ) D(β) |0⟩ for β ≥ 0 real; ξ = r e^{iψ}.
 *
 * <p>Either is annihilated by b = μ a + ν a† − β, μ = cosh r, ν = e^{iψ} sinh r, with β = μ α + ν α* and so α = μ β − ν β*: μ √(n+1) c_{n+1} = β
 * c_n − ν √n c_{n−1}. Upwards
 * the amplitudes are the dominant solution, so the recurrence is stable, and started anywhere below the window it forgets its start.
 *
 * <p>Error. b†b has the levels 0, 1, 2, …, so that a normalised vector φ is at most ‖b φ‖ away from the ray of the state: one number that
 * covers the tails, the start and the rounding of the recurrence. It is evaluated on the double-double amplitudes with the rows that stick
 * out of the window. The phase follows from ⟨α| D(α) S(ξ) |0⟩ = 1/√μ &gt; 0.
 *
 * @source Yuen, Phys. Rev. A 13 (1976) 2226
 */
final class SqueezedWindow {
    /** Largest r: the tail then falls by tanh² r per level pair, which takes some 1e5 levels. */
    static final double LARGEST_SQUEEZING = 5;

    private long first;
    private double[] re = new double[0];
    private double[] im = new double[0];
    private final DoubleDouble mu;
    private final DoubleDouble nuRe;
    private final DoubleDouble nuIm;
    private final DoubleDouble betaRe;
    private final DoubleDouble betaIm;
    private final DoubleDouble alphaRe;
    private final DoubleDouble alphaIm;
    private double[] reLow = new double[0];
    private double[] imLow = new double[0];
    private final KeptWindow kept;

    /**
     * The state.
     *
     * @param size √(α*α), or √(β*β) where squeezing comes last
     * @param squeezedLast whether the displacement is squeezed too
     * @param psi ψ, as a sum of two doubles
     * @param tolerance norm error wanted
     */
    SqueezedWindow(DoubleDouble size, boolean squeezedLast, double r, DoubleDouble psi, double tolerance) {
        DoubleDoubleFunctions.Pair hyperbolic = DoubleDoubleFunctions.coshSinh(r);
        DoubleDoubleFunctions.Pair turn = DoubleDoubleFunctions.cosSin(psi);
        mu = hyperbolic.first();
        nuRe = hyperbolic.second().times(turn.first());
        nuIm = hyperbolic.second().times(turn.second());
        betaRe = squeezedLast ? size : size.times(mu.plus(nuRe));
        betaIm = squeezedLast ? DoubleDouble.ZERO : size.times(nuIm);
        alphaRe = squeezedLast ? size.times(mu.minus(nuRe)) : size;
        alphaIm = squeezedLast ? size.times(nuIm).negated() : DoubleDouble.ZERO;
        double mean = alphaRe.hi() * alphaRe.hi() + alphaIm.hi() * alphaIm.hi();
        if (!(mean <= Amplitudes.LARGEST_MEAN)) {
            throw new IllegalArgumentException(
                    "squeezing brings the displacement to " + mean + " quanta; states are carried up to 1e12");
        }

        QuantaTail tail = tail(r, psi);
        // a weight w outside leaves edges of size √w, which b lifts by up to this, and the phase by √μ more
        double lift = (mu.hi() + Math.hypot(nuRe.hi(), nuIm.hi()))
                * Math.sqrt(mean + mu.hi() * mu.hi() + 1)
                * (1 + 2 * Math.sqrt(mu.hi()));
        double weight = Math.max(1e-60, Math.pow(tolerance / (8 * lift), 2));
        double reached = fill(tail, mean, weight);
        for (int again = 0; again < 3 && reached > 0.5 * tolerance; again++) {
            weight *= 1e-3;
            reached = fill(tail, mean, weight);
        }
        double[] moments = new double[Amplitudes.MOMENTS];
        double sum = tail.outside(first, first + re.length, moments);
        kept = new KeptWindow(first, re, im, reached, moments, sum).trimmed(tolerance);
    }

    KeptWindow kept() {
        return kept;
    }

    /** Amplitudes on the window that leaves out the weight; returns the norm error. */
    private double fill(QuantaTail tail, double mean, double weight) {
        long start = tail.below(weight * 1e-8);
        long end = tail.above(weight);
        if (end - start > HarmonicStates.MOST_LEVELS) {
            throw HarmonicStates.tooManyLevels("this squeezed state", end - start);
        }
        int size = (int) (end - start);
        double[] upRe = new double[size];
        double[] upReLow = new double[size];
        double[] upIm = new double[size];
        double[] upImLow = new double[size];
        run(start, upRe, upReLow, upIm, upImLow);
        // the run-in is cut off
        long kept = Math.max(start, tail.below(weight));
        int skip = (int) (kept - start);
        first = kept;
        re = Arrays.copyOfRange(upRe, skip, size);
        im = Arrays.copyOfRange(upIm, skip, size);
        reLow = Arrays.copyOfRange(upReLow, skip, size);
        imLow = Arrays.copyOfRange(upImLow, skip, size);

        double norm = Math.sqrt(weight());
        double residual = residual() / norm * (1 + 1e-9);
        double off = turn(mean, norm);
        if (!(residual < 0.2)) {
            return 2;
        }
        double ray = 1.02 * residual;
        // the overlap is 1/√μ in size and off by the ray's error and its own
        double phase = 1.6 * Math.sqrt(mu.hi()) * (ray + off);
        return phase < 1 ? ray + phase + 0x1p-51 : 2;
    }

    /** ln G of the Gaussian state, from the Weyl symbol of e^{wn}; α along x turned by the squeezing angle ψ/2. */
    private QuantaTail tail(double r, DoubleDouble psi) {
        double mean = alphaRe.hi() * alphaRe.hi() + alphaIm.hi() * alphaIm.hi();
        double small = Math.exp(-2 * r);
        double large = Math.exp(2 * r);
        DoubleDoubleFunctions.Pair half = DoubleDoubleFunctions.cosSin(psi.times(0.5));
        double c = half.first().value();
        double s = half.second().value();
        double along = 2 * Math.pow(c * alphaRe.hi() + s * alphaIm.hi(), 2);
        double across = 2 * Math.pow(c * alphaIm.hi() - s * alphaRe.hi(), 2);
        // G is finite up to tanh(w/2) = e^{−2r}
        double largest = r == 0 ? Double.POSITIVE_INFINITY : Math.log1p(2 * small / (1 - small));
        double sinh = Math.sinh(r);
        return new QuantaTail(
                w -> {
                    double t = Math.tanh(w / 2);
                    double one = 1 - t * small;
                    double two = 1 - t * large;
                    if (!(two > 0)) {
                        return Double.POSITIVE_INFINITY;
                    }
                    return -w / 2
                            - Math.log(Math.cosh(w / 2))
                            - 0.5 * (Math.log(one) + Math.log(two))
                            + t * (along / one + across / two);
                },
                largest,
                mean + sinh * sinh);
    }

    private void run(long start, double[] re, double[] reLow, double[] im, double[] imLow) {
        re[0] = 0x1p-500;
        DoubleDouble beforeRe = DoubleDouble.ZERO;
        DoubleDouble beforeIm = DoubleDouble.ZERO;
        DoubleDouble hereRe = DoubleDouble.of(re[0]);
        DoubleDouble hereIm = DoubleDouble.ZERO;
        DoubleDouble root = DoubleDouble.of((double) start).sqrt();
        for (int i = 0; i + 1 < re.length; i++) {
            if ((i & 0xffff) == 0) {
                Interruption.check();
            }
            DoubleDouble next = DoubleDouble.of((double) (start + i + 1)).sqrt();
            DoubleDouble divisor = mu.times(next);
            DoubleDouble a = betaRe.times(hereRe)
                    .minus(betaIm.times(hereIm))
                    .minus(root.times(nuRe.times(beforeRe).minus(nuIm.times(beforeIm))));
            DoubleDouble b = betaRe.times(hereIm)
                    .plus(betaIm.times(hereRe))
                    .minus(root.times(nuRe.times(beforeIm).plus(nuIm.times(beforeRe))));
            beforeRe = hereRe;
            beforeIm = hereIm;
            hereRe = a.dividedBy(divisor);
            hereIm = b.dividedBy(divisor);
            root = next;
            if (Math.abs(hereRe.hi()) + Math.abs(hereIm.hi()) > 0x1p400) {
                // what lies 2^−900 below is nothing
                shrink(re, i + 1);
                shrink(reLow, i + 1);
                shrink(im, i + 1);
                shrink(imLow, i + 1);
                beforeRe = beforeRe.times(0x1p-800);
                beforeIm = beforeIm.times(0x1p-800);
                hereRe = hereRe.times(0x1p-800);
                hereIm = hereIm.times(0x1p-800);
            }
            re[i + 1] = hereRe.hi();
            reLow[i + 1] = hereRe.lo();
            im[i + 1] = hereIm.hi();
            imLow[i + 1] = hereIm.lo();
        }
        // largest part near 1, so that squares stay in range
        double most = 0;
        for (int i = 0; i < re.length; i++) {
            most = Math.max(most, Math.max(Math.abs(re[i]), Math.abs(im[i])));
        }
        double scale = Math.scalb(1.0, -Math.getExponent(most));
        for (double[] part : new double[][] {re, reLow, im, imLow}) {
            for (int i = 0; i < part.length; i++) {
                part[i] *= scale;
            }
        }
    }

    private static void shrink(double[] part, int count) {
        for (int i = 0; i < count; i++) {
            part[i] *= 0x1p-800;
        }
    }

    private double weight() {
        double sum = 0;
        double lost = 0;
        for (int i = 0; i < re.length; i++) {
            double add = re[i] * re[i] + im[i] * im[i];
            double next = sum + add;
            lost += DoubleDouble.sumError(sum, add, next);
            sum = next;
        }
        return sum + lost;
    }

    /** ‖b φ‖ of what is kept, with the rows beside the window. */
    private double residual() {
        double sum = 0;
        int n = re.length;
        for (int i = -1; i <= n; i++) {
            long level = first + i;
            if (level < 0) {
                continue;
            }
            DoubleDouble a = DoubleDouble.ZERO;
            DoubleDouble b = DoubleDouble.ZERO;
            if (i + 1 < n) {
                DoubleDouble factor =
                        mu.times(DoubleDouble.of((double) (level + 1)).sqrt());
                a = factor.times(new DoubleDouble(re[i + 1], reLow[i + 1]));
                b = factor.times(new DoubleDouble(im[i + 1], imLow[i + 1]));
            }
            if (i >= 1) {
                DoubleDouble root = DoubleDouble.of((double) level).sqrt();
                DoubleDouble cRe = root.times(new DoubleDouble(re[i - 1], reLow[i - 1]));
                DoubleDouble cIm = root.times(new DoubleDouble(im[i - 1], imLow[i - 1]));
                a = a.plus(nuRe.times(cRe)).minus(nuIm.times(cIm));
                b = b.plus(nuRe.times(cIm)).plus(nuIm.times(cRe));
            }
            if (i >= 0 && i < n) {
                DoubleDouble cRe = new DoubleDouble(re[i], reLow[i]);
                DoubleDouble cIm = new DoubleDouble(im[i], imLow[i]);
                a = a.minus(betaRe.times(cRe)).plus(betaIm.times(cIm));
                b = b.minus(betaRe.times(cIm)).minus(betaIm.times(cRe));
            }
            sum += a.hi() * a.hi() + b.hi() * b.hi();
        }
        // each row is right to 2^−98 of its largest term
        double rounding = 0x1p-98
                * (mu.hi() + Math.hypot(nuRe.hi(), nuIm.hi()) + Math.hypot(betaRe.hi(), betaIm.hi()))
                * Math.sqrt((double) (first + n + 1))
                * Math.sqrt(weight());
        return Math.sqrt(sum) + 4 * rounding;
    }

    /**
     * Normalises, and turns the phase so that the overlap with the coherent state is positive.
     *
     * @return error of that overlap besides the residual
     */
    private double turn(double mean, double norm) {
        PoissonWindow coherent = new PoissonWindow(mean, 1e-32);
        double[] roots = coherent.roots();
        DoubleDouble a = DoubleDouble.ZERO;
        DoubleDouble b = DoubleDouble.ZERO;
        long from = Math.max(first, coherent.first());
        long to = Math.min(first + re.length, coherent.first() + roots.length);
        // e^{−iθn} with e^{iθ} = α/|α|, in double-double: n of its roundings are nothing
        DoubleDouble length =
                alphaRe.times(alphaRe).plus(alphaIm.times(alphaIm)).sqrt();
        boolean turned = alphaIm.hi() != 0;
        DoubleDouble stepRe = turned ? alphaRe.dividedBy(length) : DoubleDouble.ONE;
        DoubleDouble stepIm = turned ? alphaIm.dividedBy(length).negated() : DoubleDouble.ZERO;
        DoubleDouble turnRe = DoubleDouble.ONE;
        DoubleDouble turnIm = DoubleDouble.ZERO;
        for (int bit = 62; turned && bit >= 0; bit--) {
            DoubleDouble square = turnRe.times(turnRe).minus(turnIm.times(turnIm));
            turnIm = turnRe.times(turnIm).times(2.0);
            turnRe = square;
            if ((from >> bit & 1) == 1) {
                DoubleDouble next = turnRe.times(stepRe).minus(turnIm.times(stepIm));
                turnIm = turnRe.times(stepIm).plus(turnIm.times(stepRe));
                turnRe = next;
            }
        }
        for (long n = from; n < to; n++) {
            double root = roots[(int) (n - coherent.first())];
            double x = root * re[(int) (n - first)];
            double y = root * im[(int) (n - first)];
            if (!turned) {
                a = a.plus(x);
                b = b.plus(y);
                continue;
            }
            double c = turnRe.hi();
            double s = turnIm.hi();
            a = a.plus(c * x - s * y);
            b = b.plus(c * y + s * x);
            DoubleDouble next = turnRe.times(stepRe).minus(turnIm.times(stepIm));
            turnIm = turnRe.times(stepIm).plus(turnIm.times(stepRe));
            turnRe = next;
        }
        double size = Math.hypot(a.hi(), b.hi());
        if (!(size > 0)) {
            throw new IllegalArgumentException(
                    "this squeezed state does not overlap the coherent state that fixes its phase");
        }
        double c = a.hi() / size / norm;
        double s = b.hi() / size / norm;
        for (int i = 0; i < re.length; i++) {
            double x = re[i];
            re[i] = c * x + s * im[i];
            im[i] = c * im[i] - s * x;
        }
        // tails of 1e-16 on both sides, the coherent amplitudes, a few roundings of each product
        return 2e-16 + PoissonWindow.RELATIVE_ERROR + 0x1p-50;
    }
}
