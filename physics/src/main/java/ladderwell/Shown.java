package ladderwell;

import ladderwell.evidence.Bound;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Scale;
import ladderwell.quantity.Unit;
import ladderwell.quantity.Units;

/** Turns SI values into facts in the readable unit of their size. */
record Shown(Scale scale) {

    Fact fact(String name, String symbol, Kind kind, double si, double relativeUncertainty) {
        Unit unit = scale.display(kind, Math.abs(si));
        return Fact.closedForm(name, symbol, unit.fromSi(si), unit, relativeUncertainty);
    }

    /** A scaled energy of the oscillator, with its mass's uncertainty where the scale depends on the mass. */
    Fact energy(String name, String symbol, double scaled, Oscillator oscillator) {
        return fact(name, symbol, Kind.ENERGY, scaled * scale.energy(), massUncertainty(oscillator));
    }

    /** Relative standard uncertainty of the mass, where energies in the oscillator's scale depend on it. */
    double massUncertainty(Oscillator oscillator) {
        return oscillator instanceof Ladder
                ? 0
                : oscillator.given().stream()
                        .filter(f -> f.name().equals("mass"))
                        .mapToDouble(f -> Checks.relativeUncertainty(f.value()))
                        .sum();
    }

    /**
     * A computed number in scaled units.
     *
     * @param scaled its value
     * @param bound its error, in the same unit
     * @param relativeUncertainty what the mass adds, as a standard uncertainty
     */
    Fact scaled(String name, String symbol, Kind kind, double scaled, Bound bound, double relativeUncertainty) {
        double size = scale.of(kind);
        Unit unit = scale.display(kind, Math.abs(scaled * size));
        double value = unit.fromSi(scaled * size);
        double off = unit.fromSi(bound.size() * size) * (1 + 0x1p-50) + 4 * Math.ulp(value);
        Bound shown = relativeUncertainty == 0
                ? new Bound(bound.kind(), off)
                : Bound.statistical(off + Math.abs(value) * relativeUncertainty);
        return new Fact(name, symbol, Quantity.of(value, unit), shown);
    }

    /** The energy of a level with its error. */
    Fact level(String name, String symbol, Oscillator oscillator, long n) {
        Bound bound = oscillator.levels().energyBound(n);
        return scaled(name, symbol, Kind.ENERGY, oscillator.levels().energyHigh(n), bound, massUncertainty(oscillator));
    }

    /**
     * The mean energy of a state on a ladder, computed from its operator.
     *
     * @param magnitude size of the terms that were added
     */
    Fact ladderEnergy(String symbol, double scaled, double magnitude, Ladder oscillator) {
        double off = magnitude * 0x1p-44;
        // the harmonic terms are all positive and few; those of a polynomial may cancel
        Bound bound = oscillator instanceof Harmonic ? Bound.guaranteed(off) : Bound.estimated(off);
        return scaled("mean energy", symbol, Kind.ENERGY, scaled, bound, massUncertainty(oscillator));
    }

    /** A plain number with a relative error of so many units in the last place. */
    static Fact number(String name, String symbol, double value, double ulps) {
        return new Fact(name, symbol, Quantity.of(value, Units.ONE), Bound.guaranteed(ulps * Math.ulp(value)));
    }
}
