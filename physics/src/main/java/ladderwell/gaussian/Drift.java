package ladderwell.gaussian;

import java.util.ArrayList;
import java.util.List;
import ladderwell.mode.Jump;
import ladderwell.operator.LadderPolynomial;
import ladderwell.operator.OperatorFormula;

/**
 * r̄′ = A r̄ + b and V′ = A V + V Aᵀ + D of a quadratic H and linear jumps, A = B − Γ/2 with B traceless. Of H = c_11 a†a + (c_20 a†² + h.c.) +
 * (c_10 a† + h.c.): B = [[2 Im c_20, c_11 − 2 Re c_20], [−c_11 − 2 Re c_20, −2 Im c_20]], b = √2 (Im c_10, −Re c_10). A jump γ, L = u a +
 * v a† + w adds γ(|u|² − |v|²) to Γ, (γ/√2)(v w* − u* w) to b (real and imaginary part) and γ Ω Re(l* lᵀ) Ωᵀ to D, L = lᵀ r + w.
 */
final class Drift {
    /** What H adds at one time: a, b, c of B = [[a, b], [c, −a]] and the two parts of the force. */
    static final int SIZE = 5;

    final double damping;
    final double noiseXx;
    final double noiseXp;
    final double noisePp;
    private final double[] constant;
    private final List<OperatorFormula.Term> terms;
    private final List<double[]> shapes = new ArrayList<>();

    /**
     * Reads H and the jumps.
     *
     * @throws IllegalArgumentException if H is not quadratic or a jump not linear
     */
    Drift(OperatorFormula h, List<Jump> jumps) {
        if (h.degree() > 2) {
            throw new IllegalArgumentException("Gaussian states stay Gaussian only under a quadratic Hamiltonian, and '"
                    + h + "' is of degree " + h.degree());
        }
        h.hermiticityBreak().ifPresent(broken -> {
            throw new IllegalArgumentException("the Hamiltonian '" + h + "' is not Hermitian: " + broken);
        });
        double gamma = 0;
        double forceX = 0;
        double forceP = 0;
        double dxx = 0;
        double dxp = 0;
        double dpp = 0;
        for (Jump jump : jumps) {
            double rate = jump.rate().perSecond();
            if (rate == 0) {
                continue;
            }
            LadderPolynomial l = jump.operator();
            if (!jump.isLinear()) {
                throw new IllegalArgumentException(
                        "Gaussian states stay Gaussian only under jumps that are linear in a and a†, and " + jump.name()
                                + " jumps by " + l);
            }
            double uRe = l.re(0, 1);
            double uIm = l.im(0, 1);
            double vRe = l.re(1, 0);
            double vIm = l.im(1, 0);
            double wRe = l.re(0, 0);
            double wIm = l.im(0, 0);
            gamma += rate * (uRe * uRe + uIm * uIm - vRe * vRe - vIm * vIm);
            // v w* − u* w
            forceX += rate * Math.sqrt(0.5) * (vRe * wRe + vIm * wIm - uRe * wRe - uIm * wIm);
            forceP += rate * Math.sqrt(0.5) * (vIm * wRe - vRe * wIm - uRe * wIm + uIm * wRe);
            // l = (u + v, i (u − v))/√2
            double xRe = uRe + vRe;
            double xIm = uIm + vIm;
            double pRe = -(uIm - vIm);
            double pIm = uRe - vRe;
            dxx += rate * 0.5 * (pRe * pRe + pIm * pIm);
            dpp += rate * 0.5 * (xRe * xRe + xIm * xIm);
            dxp -= rate * 0.5 * (xRe * pRe + xIm * pIm);
        }
        damping = gamma;
        noiseXx = dxx;
        noiseXp = dxp;
        noisePp = dpp;
        constant = shape(h.constant());
        constant[3] += forceX;
        constant[4] += forceP;
        terms = h.terms();
        for (OperatorFormula.Term term : terms) {
            shapes.add(shape(term.operator()));
        }
    }

    private static double[] shape(LadderPolynomial h) {
        double n = h.re(1, 1);
        double re = h.re(2, 0);
        double im = h.im(2, 0);
        return new double[] {2 * im, n - 2 * re, -n - 2 * re, Math.sqrt(2) * h.im(1, 0), -Math.sqrt(2) * h.re(1, 0)};
    }

    boolean isConstant() {
        return terms.isEmpty();
    }

    List<OperatorFormula.Term> terms() {
        return terms;
    }

    /** B and b at one time. */
    void at(double t, double[] out) {
        System.arraycopy(constant, 0, out, 0, SIZE);
        for (int k = 0; k < terms.size(); k++) {
            double factor = terms.get(k).factor(t);
            double[] shape = shapes.get(k);
            for (int i = 0; i < SIZE; i++) {
                out[i] += factor * shape[i];
            }
        }
    }
}
