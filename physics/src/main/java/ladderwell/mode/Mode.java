package ladderwell.mode;

import static java.util.Objects.requireNonNull;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import ladderwell.operator.Boundedness;
import ladderwell.operator.LadderPolynomial;
import ladderwell.operator.OperatorFormula;
import ladderwell.quantity.Digits;

/**
 * One mode: H/ħ = ω n + Σ parts, and the jumps it makes. Immutable; each {@code with} gives a new one.
 *
 * <p>In the lab ω n is the mode itself and ω_f is 0; in a frame rotating at ω_f the same mode has the detuning ω − ω_f, and each part
 * says what it leaves out there ({@link #neglected}).
 *
 * @param omega ω, rad/s or plain in natural units; may be 0 where the parts hold all of H
 * @param natural true if all numbers are plain
 * @param frame the frame
 * @param parts in the order given
 * @param jumps in the order given
 */
public record Mode(double omega, boolean natural, Frame frame, List<Part> parts, List<Jump> jumps) {

    /**
     * Checks units, and that the Hamiltonian moves states for all times: a polynomial of degree above 2 that is bounded neither below nor
     * above lets them escape in finite time.
     *
     * @throws IllegalArgumentException for such a Hamiltonian, or if a part is in other units
     */
    public Mode {
        requireNonNull(frame, "frame");
        parts = List.copyOf(parts);
        jumps = List.copyOf(jumps);
        if (!Double.isFinite(omega)) {
            throw new IllegalArgumentException("the frequency of a mode must be a finite number, not " + omega);
        }
        for (Part part : parts) {
            if (!part.fits(natural)) {
                throw new IllegalArgumentException(
                        "the mode is in " + (natural ? "natural" : "lab") + " units and its part " + part + " is not");
            }
        }
        OperatorFormula hamiltonian = sum(omega, frame, parts);
        LadderPolynomial start = hamiltonian.at(0);
        if (Boundedness.isRefused(start)) {
            throw new IllegalArgumentException(
                    "the Hamiltonian is bounded neither below nor above and lets states escape in"
                            + " finite time: " + Boundedness.of(start).reason()
                            + "; add a term of a higher even degree, or use a potential with a wall");
        }
    }

    /**
     * A mode without parts and jumps, in the lab.
     *
     * @param omega rad/s
     */
    public static Mode lab(double omega) {
        return new Mode(omega, false, Frame.LAB, List.of(), List.of());
    }

    /** A mode without parts and jumps in natural units. */
    public static Mode natural(double omega) {
        return new Mode(omega, true, Frame.LAB, List.of(), List.of());
    }

    /** This with one more part. */
    public Mode with(Part part) {
        List<Part> more = new ArrayList<>(parts);
        more.add(part);
        return new Mode(omega, natural, frame, more, jumps);
    }

    /** This with one more jump. */
    public Mode with(Jump jump) {
        return with(List.of(jump));
    }

    /** This with more jumps, such as those of a bath. */
    public Mode with(List<Jump> bath) {
        List<Jump> more = new ArrayList<>(jumps);
        more.addAll(bath);
        return new Mode(omega, natural, frame, parts, more);
    }

    /**
     * The same mode in the frame rotating at ω_f.
     *
     * @throws IllegalArgumentException if a part or a jump has no such frame
     */
    public Mode rotating(double frequency) {
        for (Jump jump : jumps) {
            LadderPolynomial operator = jump.operator();
            if (operator.raises() + operator.lowers() > 0 && !turnsAsOne(operator)) {
                throw new IllegalArgumentException("the jump operator " + operator
                        + " mixes parts that turn at different rates and has no rotating frame; look at it in the lab");
            }
        }
        return new Mode(omega, natural, new Frame(frequency), parts, jumps);
    }

    /** True if every term changes the number of quanta by the same amount, so that a rotating frame gives it a phase only. */
    private static boolean turnsAsOne(LadderPolynomial operator) {
        int change = Integer.MIN_VALUE;
        for (int j = 0; j <= operator.raisingDegree(); j++) {
            for (int k = 0; k <= operator.loweringDegree(); k++) {
                if (operator.re(j, k) != 0 || operator.im(j, k) != 0) {
                    if (change != Integer.MIN_VALUE && change != j - k) {
                        return false;
                    }
                    change = j - k;
                }
            }
        }
        return true;
    }

    /** H/ħ in the frame of this mode. */
    public OperatorFormula hamiltonian() {
        return sum(omega, frame, parts);
    }

    private static OperatorFormula sum(double omega, Frame frame, List<Part> parts) {
        OperatorFormula sum = OperatorFormula.of(LadderPolynomial.number().times(omega - frame.frequency()));
        for (Part part : parts) {
            sum = sum.plus(frame.isLab() ? part.inLab() : part.inFrame(frame.frequency()));
        }
        return sum;
    }

    /** What the rotating frame leaves out, part by part; empty in the lab. */
    public List<String> neglected() {
        List<String> all = new ArrayList<>();
        if (!frame.isLab()) {
            for (Part part : parts) {
                String words = part.neglected(frame.frequency());
                if (!words.isEmpty()) {
                    all.add(words);
                }
            }
        }
        return List.copyOf(all);
    }

    /** True if H is at most quadratic at all times and every jump linear: Gaussian states stay Gaussian. */
    public boolean isGaussian() {
        return hamiltonian().degree() <= 2 && jumps.stream().allMatch(Jump::isLinear);
    }

    /**
     * The rate at which ⟨a⟩ grows without end at a time, if it does: a quadratic H whose pump beats the loss, or a gain above the loss. Higher
     * powers, in H or in the jumps, stop such growth; then there is no runaway.
     *
     * @return rad/s or plain; empty if there is none
     */
    public Optional<Double> runaway(double t) {
        LadderPolynomial h = hamiltonian().at(t);
        if (h.degree() > 2
                || !jumps.stream()
                        .allMatch(jump -> jump.isLinear() || jump.rate().perSecond() == 0)) {
            return Optional.empty();
        }
        // da/dt = −i (c_11 a + 2 c_20 a†) − (κ_down − κ_up)/2 a
        double damping = 0;
        for (Jump jump : jumps) {
            LadderPolynomial l = jump.operator();
            double down = l.re(0, 1) * l.re(0, 1) + l.im(0, 1) * l.im(0, 1);
            double up = l.re(1, 0) * l.re(1, 0) + l.im(1, 0) * l.im(1, 0);
            damping += jump.rate().perSecond() * (down - up) / 2;
        }
        double pump = 2 * Math.hypot(h.re(2, 0), h.im(2, 0));
        double detuning = Math.abs(h.re(1, 1));
        double growth = pump > detuning ? Math.sqrt((pump - detuning) * (pump + detuning)) - damping : -damping;
        return growth > 0 ? Optional.of(growth) : Optional.empty();
    }

    /** {@link #runaway} in a sentence; empty if there is none. */
    public Optional<String> runawayWarning(double t) {
        return runaway(t)
                .map(growth ->
                        "the mode runs away: ⟨a⟩ grows at " + Digits.significant(growth, 3) + (natural ? "" : " /s")
                                + " and nothing stops it; more loss, more detuning or a Kerr term would");
    }
}
