package ladderwell;

import static ladderwell.quantity.Units.KELVIN;
import static ladderwell.quantity.Units.ONE;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import ladderwell.classical.ClassicalOrbit;
import ladderwell.level.Levels;
import ladderwell.operator.LadderPolynomial;
import ladderwell.quantity.Constants;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Scale;
import ladderwell.quantity.Unit;

/**
 * The harmonic oscillator H = p²/2m + mω²x²/2. Scaled: lengths in √(ħ/mω), energies in ħω, times in 1/ω, E_n = n + ½.
 *
 * @param mass the mass; empty for the natural oscillator ħ = m = ω = 1
 * @param spacing what fixes ω: a cycle frequency ν (ω = 2πν), an angular frequency ω, a wavenumber (ω = 2πcν̃) or the
 *     level spacing as an energy (ω = E/ħ); empty for the natural oscillator
 */
public record Harmonic(Optional<Quantity> mass, Optional<Quantity> spacing) implements Ladder {

    private static final Levels LADDER = Levels.harmonic();

    public Harmonic {
        if (mass.isPresent() != spacing.isPresent()) {
            throw new IllegalArgumentException(
                    "a harmonic oscillator needs a mass and a frequency, or neither (natural units)");
        }
        mass.ifPresent(m -> Checks.positive("mass", m, Kind.MASS));
        spacing.ifPresent(s -> Checks.positive(
                "frequency", s, Kind.CYCLE_FREQUENCY, Kind.ANGULAR_FREQUENCY, Kind.WAVENUMBER, Kind.ENERGY));
        // refuses a mass and a frequency whose scale leaves the range of numbers
        if (mass.isPresent()) {
            Scale.harmonic(
                    mass.orElseThrow().si(), spacing.map(Harmonic::angular).orElseThrow());
        }
    }

    /** A harmonic oscillator on the way: its mass, or natural units. */
    public static final class Declaring {
        Declaring() {}

        /** The oscillator with ħ = m = ω = 1. */
        public Harmonic natural() {
            return new Harmonic(Optional.empty(), Optional.empty());
        }

        /** The mass; then give the frequency. */
        public WithMass mass(double value, Unit unit) {
            return new WithMass(Quantity.of(value, unit));
        }
    }

    /** A harmonic oscillator with its mass, waiting for what fixes ω. */
    public static final class WithMass {
        private final Quantity mass;

        WithMass(Quantity mass) {
            this.mass = Checks.positive("mass", mass, Kind.MASS);
        }

        /** ν in Hz (ω = 2πν) or ω in rad/s, as the unit says. */
        public Harmonic frequency(double value, Unit unit) {
            return with(Checks.positive(
                    "frequency", Quantity.of(value, unit), Kind.CYCLE_FREQUENCY, Kind.ANGULAR_FREQUENCY));
        }

        /** The wavenumber ν̃ = 1/λ; ω = 2πcν̃. */
        public Harmonic wavenumber(double value, Unit unit) {
            return with(Checks.positive("wavenumber", Quantity.of(value, unit), Kind.WAVENUMBER));
        }

        /** The level spacing ħω as an energy. */
        public Harmonic spacing(double value, Unit unit) {
            return with(Checks.positive("spacing", Quantity.of(value, unit), Kind.ENERGY));
        }

        private Harmonic with(Quantity spacing) {
            return new Harmonic(Optional.of(mass), Optional.of(spacing));
        }
    }

    /** ω in rad/s; 1 for the natural oscillator. */
    public double angularFrequency() {
        return spacing.map(Harmonic::angular).orElse(1.0);
    }

    private static double angular(Quantity spacing) {
        return switch (spacing.kind()) {
            case CYCLE_FREQUENCY -> 2 * Math.PI * spacing.si();
            case ANGULAR_FREQUENCY -> spacing.si();
            case WAVENUMBER -> 2 * Math.PI * Constants.LIGHT_SPEED * spacing.si();
            case ENERGY -> spacing.si() / Constants.HBAR;
            default -> throw new IllegalStateException("checked by the constructor: " + spacing.kind());
        };
    }

    @Override
    public String kind() {
        return "harmonic";
    }

    @Override
    public Scale scale() {
        return mass.map(m -> Scale.harmonic(m.si(), angularFrequency())).orElseGet(Scale::natural);
    }

    @Override
    public Levels levels() {
        return LADDER;
    }

    @Override
    public double potential(double x) {
        return x * x / 2;
    }

    @Override
    public double classicalPeriod(double energy) {
        return 2 * Math.PI;
    }

    @Override
    public ClassicalOrbit orbit(double position, double momentum, double energy) {
        return ClassicalOrbit.harmonic(position, momentum);
    }

    @Override
    public double coherentEnergy(double re, double im) {
        return re * re + im * im + 0.5;
    }

    @Override
    public LadderPolynomial energyOperator() {
        return LadderPolynomial.number().plus(LadderPolynomial.constant(0.5, 0));
    }

    @Override
    public double numberEnergy(long n) {
        return LADDER.energyHigh(n);
    }

    @Override
    public List<Fact> given() {
        List<Fact> given = new ArrayList<>();
        mass.ifPresent(m -> given.add(Fact.exact("mass", "m", m)));
        spacing.ifPresent(s -> given.add(Fact.exact(
                switch (s.kind()) {
                    case WAVENUMBER -> "wavenumber";
                    case ENERGY -> "spacing";
                    default -> "frequency";
                },
                "",
                s)));
        return List.copyOf(given);
    }

    @Override
    public List<Fact> facts() {
        Scale scale = scale();
        if (scale.isNatural()) {
            return List.of(
                    Fact.exact("mass", "m", 1, ONE),
                    Fact.exact("angular frequency", "ω", 1, ONE),
                    Fact.closedForm("period", "T", 2 * Math.PI, ONE, 0),
                    Fact.closedForm("zero-point length", "√(ħ/2mω)", Math.sqrt(0.5), ONE, 0));
        }
        double omega = angularFrequency();
        double hbarOmega = Constants.HBAR * omega;
        double massUncertainty = Checks.relativeUncertainty(mass.orElseThrow());
        Shown shown = new Shown(scale);
        List<Fact> facts = new ArrayList<>();
        facts.add(Fact.exact("mass", "m", mass.orElseThrow()));
        facts.add(shown.fact("frequency", "ν", Kind.CYCLE_FREQUENCY, omega / (2 * Math.PI), 0));
        facts.add(shown.fact("angular frequency", "ω = 2πν", Kind.ANGULAR_FREQUENCY, omega, 0));
        facts.add(shown.fact("period", "T = 1/ν", Kind.TIME, 2 * Math.PI / omega, 0));
        facts.add(shown.fact("level spacing", "ħω", Kind.ENERGY, hbarOmega, 0));
        facts.add(Fact.closedForm("level spacing over k", "ħω/k", hbarOmega / Constants.BOLTZMANN, KELVIN, 0));
        facts.add(shown.fact(
                "zero-point length", "√(ħ/2mω)", Kind.LENGTH, scale.length() * Math.sqrt(0.5), massUncertainty / 2));
        facts.add(shown.fact(
                "zero-point momentum",
                "√(ħmω/2)",
                Kind.MOMENTUM,
                scale.momentum() * Math.sqrt(0.5),
                massUncertainty / 2));
        return List.copyOf(facts);
    }
}
