package ladderwell.window;

import java.util.ArrayList;
import java.util.List;
import ladderwell.operator.LadderPolynomial;

/**
 * The equation of motion dσ/ds = K σ + σ K† + Σ G σ G† with K = −iH − ½ Σ G†G; for vectors dψ/ds = K ψ without jumps. Each operator is a
 * polynomial in the time s since the step began.
 *
 * @param drift K by orders of s, at least one
 * @param jumps each G by orders of s
 */
record Generator(List<LadderPolynomial> drift, List<List<LadderPolynomial>> jumps) {

    Generator {
        drift = List.copyOf(drift);
        jumps = List.copyOf(jumps);
    }

    /** Of what does not vary; jumps are scaled by the roots of their rates. */
    static Generator constant(LadderPolynomial hamiltonian, List<LadderPolynomial> jumps) {
        return of(List.of(hamiltonian), jumps.stream().map(List::of).toList());
    }

    /** Of a Hamiltonian and jumps by orders of s. */
    static Generator of(List<LadderPolynomial> hamiltonian, List<List<LadderPolynomial>> jumps) {
        int orders = hamiltonian.size();
        for (List<LadderPolynomial> g : jumps) {
            orders = Math.max(orders, 2 * g.size() - 1);
        }
        List<LadderPolynomial> drift = new ArrayList<>();
        for (int j = 0; j < orders; j++) {
            LadderPolynomial sum = j < hamiltonian.size() ? hamiltonian.get(j).times(0, -1) : LadderPolynomial.zero();
            for (List<LadderPolynomial> g : jumps) {
                for (int i = Math.max(0, j - g.size() + 1); i <= Math.min(j, g.size() - 1); i++) {
                    sum = sum.minus(g.get(j - i).adjoint().times(g.get(i)).times(0.5));
                }
            }
            drift.add(sum);
        }
        return new Generator(drift, jumps);
    }

    boolean isConstant() {
        return drift.size() == 1 && jumps.stream().allMatch(g -> g.size() == 1);
    }

    /** How many levels one application reaches beyond a window. */
    int reach() {
        int reach = 1;
        for (LadderPolynomial k : drift) {
            reach = Math.max(reach, k.bandwidth());
        }
        for (List<LadderPolynomial> g : jumps) {
            for (LadderPolynomial part : g) {
                reach = Math.max(reach, part.bandwidth());
            }
        }
        return reach;
    }
}
