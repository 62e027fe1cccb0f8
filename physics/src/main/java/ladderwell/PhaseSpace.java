package ladderwell;

import static ladderwell.quantity.Units.ONE;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import ladderwell.classical.ClassicalOrbit;
import ladderwell.evidence.Bound;
import ladderwell.phasespace.PhaseField;
import ladderwell.phasespace.PhaseFunctions;
import ladderwell.phasespace.PhaseGrid;
import ladderwell.phasespace.PhaseState;
import ladderwell.phasespace.Support;
import ladderwell.quantity.Digits;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Quantity;
import org.jspecify.annotations.Nullable;

/**
 * The state of a run at one instant, read in phase space, in scaled units: Wigner and Husimi functions on a grid sized from the state, their marginals
 * and negativity. What is read is computed when it is first asked for.
 */
public final class PhaseSpace {
    /** Less of the state than this may lie outside the grid, in position and in momentum. */
    private static final double SHARE = 1e-7;

    /** Up to so many times as wide as the state the picture grows for the classical orbit. */
    private static final double WIDER = 3;

    private static final int ORBIT_POINTS = 200;

    private static final int LEAST_POINTS = 161;
    private static final int MOST_POINTS = 401;

    /** Points on a side for numbers that integrate: fringes finer than what a picture shows must be followed. */
    private static final int MOST_FOR_INTEGRALS = 1601;

    private final Run run;
    private final double time;
    private final PhaseState state;
    private final Support box;
    private final PhaseGrid grid;
    private final PhaseFunctions functions = new PhaseFunctions();
    private @Nullable PhaseField wigner;
    private @Nullable PhaseField husimi;
    private PhaseField.@Nullable Reading negativity;

    private PhaseSpace(Run run, double time) {
        this.run = run;
        this.time = time;
        state = run.representation().phaseState(run.state(), time);
        box = state.visible(SHARE);
        grid = PhaseGrid.covering(withOrbit(run, box), LEAST_POINTS, MOST_POINTS);
    }

    /** The box, widened to show the whole classical orbit where that is not much larger. */
    private static Support withOrbit(Run run, Support box) {
        ClassicalOrbit orbit = run.classical();
        double last = run.time(run.times() - 1);
        double end = run.state().oscillator().moves()
                ? last
                : Math.min(last, period(run).orElse(last));
        double left = box.left();
        double right = box.right();
        double low = box.low();
        double high = box.high();
        for (int i = 0; i <= ORBIT_POINTS; i++) {
            double x = orbit.position(end * i / ORBIT_POINTS);
            double p = orbit.momentum(end * i / ORBIT_POINTS);
            left = Math.min(left, x);
            right = Math.max(right, x);
            low = Math.min(low, p);
            high = Math.max(high, p);
        }
        boolean near =
                right - left < WIDER * (box.right() - box.left()) && high - low < WIDER * (box.high() - box.low());
        return near ? new Support(left, right, low, high, box.missed()) : box;
    }

    private static OptionalDouble period(Run run) {
        try {
            return OptionalDouble.of(run.state().period());
        } catch (IllegalArgumentException e) {
            return OptionalDouble.empty(); // no classical particle is bound at this energy
        }
    }

    static PhaseSpace at(Run run, Quantity instant) {
        boolean natural = run.state().oscillator().scale().isNatural();
        Checks.kind("instant", instant, natural ? Kind.NUMBER : Kind.TIME, Kind.PERIODS);
        double scaled = instant.kind() == Kind.PERIODS
                ? instant.value() * run.state().period()
                : instant.si() / run.state().oscillator().scale().time();
        double last = run.time(run.times() - 1);
        if (!(scaled >= 0 && scaled <= last * (1 + 1e-9))) {
            throw new IllegalArgumentException("the instant " + instant + " lies outside the run, which lasts "
                    + run.evolution().duration());
        }
        return new PhaseSpace(run, run.representation().instant(Math.min(scaled, last)));
    }

    /** The run it was read from. */
    public Run run() {
        return run;
    }

    /** The instant, scaled; on a grid the run's time nearest to the one asked for. */
    public double time() {
        return time;
    }

    /** The instant in lab units. */
    public Quantity labTime() {
        return run.labTime(time);
    }

    /** The instant in classical periods, where there are any. */
    public OptionalDouble periods() {
        OptionalDouble period = period(run);
        return period.isPresent() ? OptionalDouble.of(time / period.getAsDouble()) : period;
    }

    /**
     * The grid: all but a ten-millionth of the state lies on it, in position and in momentum (of momenta that fall off slowly all but about a
     * thousandth), and the classical orbit where that is not much larger.
     */
    public PhaseGrid grid() {
        return grid;
    }

    /** Whether the grid shows every fringe; where it does not, a smaller part can be asked for with {@link #wigner(PhaseGrid)}. */
    public boolean resolved() {
        return grid.resolves(box);
    }

    /** The Wigner function. @units 1/ħ */
    public synchronized PhaseField wigner() {
        PhaseField field = wigner;
        if (field == null) {
            field = functions.wigner(state, grid);
            wigner = field;
        }
        return field;
    }

    /** The Wigner function on another grid. */
    public PhaseField wigner(PhaseGrid on) {
        return new PhaseFunctions().wigner(state, on);
    }

    /**
     * The Husimi function: the mean over coherent states of {@link #width}. @units 1/ħ
     */
    public synchronized PhaseField husimi() {
        PhaseField field = husimi;
        if (field == null) {
            field = functions.husimi(state, grid, width());
            husimi = field;
        }
        return field;
    }

    /** The Husimi function on another grid, with coherent states of another width. */
    public PhaseField husimi(PhaseGrid on, double width) {
        return new PhaseFunctions().husimi(state, on, width);
    }

    /**
     * Width of the coherent states of {@link #husimi()}, |⟨x|α⟩|² ∝ e^{−(x−x₀)²/width²}: that of the harmonic oscillator's own; elsewhere of the
     * shape of the grid.
     */
    public double width() {
        return run.state().oscillator() instanceof Ladder ? 1 : Math.sqrt(grid.halfX() / grid.halfP());
    }

    /** ∫|W| dx dp − 1, twice the volume of the negative parts of W; on a grid of its own that follows the fringes. */
    public synchronized PhaseField.Reading negativity() {
        PhaseField.Reading reading = negativity;
        if (reading == null) {
            PhaseGrid fine = PhaseGrid.covering(box, 2 * LEAST_POINTS, MOST_FOR_INTEGRALS);
            reading = new PhaseFunctions().negativity(state, fine);
            negativity = reading;
        }
        return reading;
    }

    /** The numbers of a card. */
    public List<Fact> facts() {
        PhaseField field = wigner();
        List<Fact> facts = new ArrayList<>();
        facts.add(Fact.exact("instant", "t", labTime()));
        periods().ifPresent(p -> facts.add(Fact.exact("instant in periods", "t/T", p, ONE)));
        facts.add(fact("greatest value", "max ħW", greatest(field), field.bound()));
        facts.add(fact("least value", "min ħW", field.least(), field.bound()));
        facts.add(fact(
                "negativity", "∫|W| − 1", negativity().value(), negativity().bound()));
        return List.copyOf(facts);
    }

    private static Fact fact(String name, String symbol, double value, Bound bound) {
        return new Fact(name, symbol, Quantity.of(value, ONE), bound);
    }

    private static double greatest(PhaseField field) {
        double greatest = Double.NEGATIVE_INFINITY;
        for (int i = 0; i < field.grid().nx(); i++) {
            for (double value : field.row(i)) {
                greatest = Math.max(greatest, value);
            }
        }
        return greatest;
    }

    /** What the picture says, in one line. */
    public String verdict() {
        PhaseField field = wigner();
        PhaseField.Reading parts = negativity();
        String range =
                "ħW between " + shown(field.least(), field.bound()) + " and " + shown(greatest(field), field.bound());
        return parts.value() <= parts.bound().size()
                        && field.least() >= -field.bound().size()
                ? range + "; nowhere negative on the grid beyond its error"
                : range + "; negativity ∫|W| − 1 = " + parts.bound().beside(parts.value());
    }

    /** Four digits at most, fewer where the error allows no more. */
    private static String shown(double value, Bound bound) {
        return Math.abs(value) <= 2 * bound.size()
                ? "0"
                : Digits.pretty(Digits.withBound(value, Math.max(bound.size(), 5e-5 * Math.abs(value)))
                        .replaceAll("\\(\\d+\\)", ""));
    }

    /** Grid, method and error, in one line. */
    public String errorLine() {
        return grid.nx() + " × " + grid.np() + " points · correlations ψ(x+y)ψ*(x−y) summed over y · ħW off by ≤ "
                + Digits.pretty(Digits.upward(wigner().bound().size(), 2)) + ", "
                + wigner().bound().kind().word()
                + (resolved() ? "" : " · fringes are finer than this grid");
    }
}
