package ladderwell.state;

import java.util.ArrayList;
import java.util.List;
import ladderwell.evidence.PhysicsException;
import ladderwell.numeric.Interruption;

/**
 * A mixed state as pure states with weights, Σ w_i |ψ_i⟩⟨ψ_i|: what quantum jumps start from, and the shortest form of a density operator.
 * Immutable.
 */
public final class Mixture {
    /** Largest mean quanta of heat; the levels kept grow as this times ln(1/tolerance). */
    public static final double LARGEST_HEAT = 1e5;

    private final String name;
    private final List<Amplitudes> states;
    private final double[] weights;
    private final double missingWeight;

    private Mixture(String name, List<Amplitudes> states, double[] weights, double missingWeight) {
        this.name = name;
        this.states = List.copyOf(states);
        this.weights = weights;
        this.missingWeight = missingWeight;
    }

    /** A pure state. */
    public static Mixture pure(Amplitudes state) {
        return new Mixture("pure state", List.of(state), new double[] {1}, 0);
    }

    /**
     * The thermal state, p_m = n̄^m/(n̄ + 1)^(m+1).
     *
     * @param quanta n̄, 0 … 1e5
     * @param tolerance trace norm of the error allowed, 1e-14 … 0.1
     */
    public static Mixture thermal(double quanta, double tolerance) {
        return displacedThermal(quanta, 0, 0, tolerance);
    }

    /**
     * The displaced thermal state D(α) ρ_th D(α)†, α = √mean e^{i phase}: displaced number states with the weights of heat.
     *
     * @param quanta n̄ of the heat, 0 … 1e5
     * @param mean |α|², 0 … 1e12
     * @param phase arg α in radians
     * @param tolerance trace norm of the error allowed, 1e-14 … 0.1
     * @throws IllegalArgumentException if an argument is outside its range
     * @throws PhysicsException.NotConverged if the tolerance is not met
     */
    public static Mixture displacedThermal(double quanta, double mean, double phase, double tolerance) {
        if (!(quanta >= 0 && quanta <= LARGEST_HEAT)) {
            throw new IllegalArgumentException("mean quanta of heat must lie between 0 and 1e5, got " + quanta);
        }
        Amplitudes.checkTolerance(tolerance);
        // Σ_{m ≥ M} p_m = (n̄/(n̄ + 1))^M
        double falls = Math.log1p(1 / quanta);
        int count = quanta == 0 ? 1 : (int) Math.ceil(-Math.log(tolerance / 2) / falls) + 1;
        double[] weights = new double[count];
        List<Amplitudes> states = new ArrayList<>();
        for (int m = 0; m < count; m++) {
            Interruption.check();
            weights[m] = quanta == 0 ? 1 : Math.exp(-m * falls) / (quanta + 1);
            // half the tolerance for the tail, half for the states: 2.1 errors each in trace norm
            states.add(HarmonicStates.displacedNumber(m, mean, phase, Math.max(1e-14, Math.min(0.1, tolerance / 6))));
        }
        double missing = quanta == 0 ? 0 : Math.exp(-count * falls) * (1 + 1e-9);
        return new Mixture(mean == 0 ? "thermal state" : "displaced thermal state", states, weights, missing);
    }

    /** How many pure states. */
    public int size() {
        return weights.length;
    }

    /** One of them. */
    public Amplitudes state(int i) {
        return states.get(i);
    }

    /** Its weight. */
    public double weight(int i) {
        return weights[i];
    }

    /** Weight of the pure states left out. */
    public double missingWeight() {
        return missingWeight;
    }

    /** Trace norm of the error, guaranteed: what is left out and the errors of the pure states. */
    public double traceNormError() {
        double sum = missingWeight;
        for (int i = 0; i < weights.length; i++) {
            // ‖ |φ⟩⟨φ| − |ψ⟩⟨ψ| ‖₁ ≤ (‖φ‖ + ‖ψ‖) ‖φ − ψ‖; exp and the sum of the weights: a few roundings each
            sum += weights[i] * (2.1 * states.get(i).normError() + 0x1p-48);
        }
        return sum;
    }

    /**
     * The density operator on the window of all levels that occur.
     *
     * @param allowedBytes memory allowed for it
     * @throws PhysicsException.TooLarge if it needs more
     */
    public DensityOperator density(double allowedBytes) {
        long first = Long.MAX_VALUE;
        long end = 0;
        for (Amplitudes state : states) {
            first = Math.min(first, state.first(0));
            int last = state.segments() - 1;
            end = Math.max(end, state.first(last) + state.length(last));
        }
        double levels = end - first;
        double bytes = 8.0 * levels * (levels + 1);
        if (bytes > allowedBytes || levels > 40_000) {
            throw new PhysicsException.TooLarge(
                    "the density operator of this " + name + " needs " + (long) levels + " levels",
                    bytes,
                    allowedBytes,
                    "loosen the tolerance, or start jumps from the mixture");
        }
        DensityOperator.Sum sum = new DensityOperator.Sum(first, (int) levels);
        for (int i = 0; i < weights.length; i++) {
            Interruption.check();
            sum.add(weights[i], states.get(i));
        }
        return sum.total(traceNormError());
    }
}
