package ladderwell.window;

import java.util.ArrayList;
import java.util.List;
import ladderwell.evidence.Certainty;
import ladderwell.numeric.DoubleDouble;
import ladderwell.operator.LadderPolynomial;
import ladderwell.window.SeriesPolynomial.Series;

/**
 * A frame that is displaced along the mean-field path α(t), so that what is left to carry is the fluctuation: ρ = D(α) σ D(α)†. With any path the equation of σ is exact; a
 * good one keeps its window small. The path of a step is a polynomial whose coefficients are doubles, taken as they are; α itself and all
 * that is made of it is carried in double-double.
 *
 * <p>H_f = H(a + α) + Σ (i/2)(c* G − c G†) − iα' a† + iα'* a with the jumps shifted too, Γ(a + α) = c + G.
 */
final class FrameCourse implements Course {
    /** Degree of the path in a step. */
    private static final int DEGREE = 8;

    private final FormulaCourse hamiltonian;
    private final List<LadderPolynomial> jumps;
    /** What is not H in dα/dt of the mean field: ½ Σ (G†[a, G] + [G†, a] G), in normal order. */
    private final LadderPolynomial damping;

    private DoubleDouble re;
    private DoubleDouble im;
    private Series path = Series.zero(1);
    private Squeeze squeeze = Squeeze.NONE;
    private double pullRe;
    private double pullIm;
    private double pull;

    FrameCourse(FormulaCourse hamiltonian, List<LadderPolynomial> jumps, double alphaRe, double alphaIm) {
        this.hamiltonian = hamiltonian;
        this.jumps = jumps;
        re = DoubleDouble.of(alphaRe);
        im = DoubleDouble.of(alphaIm);
        LadderPolynomial a = LadderPolynomial.a();
        LadderPolynomial sum = LadderPolynomial.zero();
        for (LadderPolynomial g : jumps) {
            sum = sum.plus(g.adjoint().times(a.commutator(g)))
                    .plus(g.adjoint().commutator(a).times(g));
        }
        damping = sum.times(0.5);
    }

    DoubleDouble re() {
        return re;
    }

    DoubleDouble im() {
        return im;
    }

    /** α at a time since the step began, in double-double. */
    DoubleDouble[] at(double s) {
        DoubleDouble sumRe = DoubleDouble.ZERO;
        DoubleDouble sumIm = DoubleDouble.ZERO;
        for (int k = path.length() - 1; k >= 0; k--) {
            sumRe = sumRe.times(s).plus(path.re()[k]);
            sumIm = sumIm.times(s).plus(path.im()[k]);
        }
        return new DoubleDouble[] {sumRe.plus(re), sumIm.plus(im)};
    }

    Squeeze squeeze() {
        return squeeze;
    }

    /** The state was changed from σ to R†σR. */
    void squeezed(double r, double phi) {
        squeeze = squeeze.after(r, phi);
    }

    /** ⟨a⟩ of the fluctuation as the frame without squeezing has it. */
    double[] unsqueezed(double[] mean) {
        return new double[] {
            squeeze.uRe() * mean[0] - squeeze.uIm() * mean[1] + squeeze.vRe() * mean[0] + squeeze.vIm() * mean[1],
            squeeze.uRe() * mean[1] + squeeze.uIm() * mean[0] + squeeze.vIm() * mean[0] - squeeze.vRe() * mean[1]
        };
    }

    /** Lets the next steps bring the mean of the fluctuation back towards 0. */
    void recentre(double meanRe, double meanIm, double rate) {
        pullRe = meanRe;
        pullIm = meanIm;
        pull = rate;
    }

    @Override
    public Generator generator(double time, double length) {
        List<LadderPolynomial> orders = hamiltonian.orders(time, length);
        List<LadderPolynomial> here =
                orders.stream().map(p -> p.shifted(re, im)).toList();
        path = path(here);
        Series slope = path.derivative();
        SeriesPolynomial h = SeriesPolynomial.of(here).withRoom(1).shifted(path);
        List<List<LadderPolynomial>> moved = new ArrayList<>();
        for (LadderPolynomial jump : jumps) {
            SeriesPolynomial g =
                    SeriesPolynomial.of(List.of(jump.shifted(re, im))).shifted(path);
            Series c = g.takeConstant();
            // (i/2)(c* G − c G†)
            for (int j = 0; j < g.rows(); j++) {
                for (int k = 0; k < g.columns(); k++) {
                    if (!g.at(j, k).isZero()) {
                        Series half = g.at(j, k).times(c.conjugate()).times(0.5).turned();
                        h = h.withRoom(Math.max(j, k));
                        h.add(j, k, half);
                        h.add(k, j, half.conjugate());
                    }
                }
            }
            moved.add(g.orders());
        }
        h.add(1, 0, slope.turned().times(-1));
        h.add(0, 1, slope.conjugate().turned());
        h.takeConstant();
        if (squeeze.isNone()) {
            return Generator.of(h.orders(), moved);
        }
        return Generator.of(
                h.orders().stream().map(squeeze::seen).toList(),
                moved.stream().map(g -> g.stream().map(squeeze::seen).toList()).toList());
    }

    /** Taylor coefficients of the mean-field path from here, β(0) = 0. */
    private Series path(List<LadderPolynomial> orders) {
        LadderPolynomial a = LadderPolynomial.a();
        LadderPolynomial decay = damping.shifted(re, im);
        List<LadderPolynomial> velocity = new ArrayList<>();
        for (int j = 0; j < orders.size(); j++) {
            LadderPolynomial force = orders.get(j).commutator(a).times(0, 1);
            velocity.add(j == 0 ? force.plus(decay) : force);
        }
        double[] betaRe = new double[DEGREE + 1];
        double[] betaIm = new double[DEGREE + 1];
        for (int k = 0; k < DEGREE; k++) {
            double[] next = coefficient(velocity, betaRe, betaIm, k);
            betaRe[k + 1] = next[0] / (k + 1);
            betaIm[k + 1] = next[1] / (k + 1);
        }
        betaRe[1] += pull * pullRe;
        betaIm[1] += pull * pullIm;
        Series series = Series.zero(DEGREE + 1);
        for (int k = 0; k <= DEGREE; k++) {
            series.re()[k] = DoubleDouble.of(betaRe[k]);
            series.im()[k] = DoubleDouble.of(betaIm[k]);
        }
        return series;
    }

    /** Coefficient of s^k of the symbol of the velocity at β(s). */
    private static double[] coefficient(List<LadderPolynomial> velocity, double[] betaRe, double[] betaIm, int k) {
        double sumRe = 0;
        double sumIm = 0;
        for (int order = 0; order <= Math.min(k, velocity.size() - 1); order++) {
            LadderPolynomial v = velocity.get(order);
            int rows = v.raisingDegree();
            int columns = v.loweringDegree();
            // powers of β and β* up to s^(k − order)
            int length = k - order + 1;
            double[][] upRe = new double[columns + 1][length];
            double[][] upIm = new double[columns + 1][length];
            powers(betaRe, betaIm, 1, upRe, upIm);
            double[][] downRe = new double[rows + 1][length];
            double[][] downIm = new double[rows + 1][length];
            powers(betaRe, betaIm, -1, downRe, downIm);
            for (int i = 0; i <= rows; i++) {
                for (int j = 0; j <= columns; j++) {
                    double cRe = v.re(i, j);
                    double cIm = v.im(i, j);
                    if (cRe == 0 && cIm == 0) {
                        continue;
                    }
                    double re = 0;
                    double im = 0;
                    for (int l = 0; l < length; l++) {
                        int r = length - 1 - l;
                        re += downRe[i][l] * upRe[j][r] - downIm[i][l] * upIm[j][r];
                        im += downRe[i][l] * upIm[j][r] + downIm[i][l] * upRe[j][r];
                    }
                    sumRe += cRe * re - cIm * im;
                    sumIm += cRe * im + cIm * re;
                }
            }
        }
        return new double[] {sumRe, sumIm};
    }

    private static void powers(double[] betaRe, double[] betaIm, int sign, double[][] re, double[][] im) {
        int length = re[0].length;
        re[0][0] = 1;
        for (int p = 1; p < re.length; p++) {
            for (int i = 0; i < length; i++) {
                for (int j = 0; i + j < length && j < betaRe.length; j++) {
                    re[p][i + j] += re[p - 1][i] * betaRe[j] - sign * im[p - 1][i] * betaIm[j];
                    im[p][i + j] += sign * re[p - 1][i] * betaIm[j] + im[p - 1][i] * betaRe[j];
                }
            }
        }
    }

    @Override
    public double off(Equation equation, double length) {
        return hamiltonian.off(equation, length, re, im);
    }

    @Override
    public double atBreaks(Equation equation) {
        return hamiltonian.atBreaks(equation);
    }

    @Override
    public double nextBreak(double time) {
        return hamiltonian.nextBreak(time);
    }

    @Override
    public void advance(double length) {
        DoubleDouble[] end = at(length);
        re = end[0];
        im = end[1];
        // the path ahead is not known before the next generator
        path = Series.zero(1);
    }

    @Override
    public Certainty certainty() {
        return hamiltonian.certainty();
    }
}
