package ladderwell;

import ladderwell.quantity.Kind;
import ladderwell.quantity.Scale;
import ladderwell.quantity.Unit;

/** Turns SI values into facts in the readable unit of their size. */
record Shown(Scale scale) {

    Fact fact(String name, String symbol, Kind kind, double si, double relativeUncertainty) {
        Unit unit = scale.display(kind, Math.abs(si));
        return Fact.closedForm(name, symbol, unit.fromSi(si), unit, relativeUncertainty);
    }

    /** A scaled energy of the oscillator, with its mass's uncertainty where the scale depends on the mass. */
    Fact energy(String name, String symbol, double scaled, Oscillator oscillator) {
        double uncertainty = oscillator instanceof Harmonic
                ? 0
                : oscillator.given().stream()
                        .filter(f -> f.name().equals("mass"))
                        .mapToDouble(f -> Checks.relativeUncertainty(f.value()))
                        .sum();
        return fact(name, symbol, Kind.ENERGY, scaled * scale.energy(), uncertainty);
    }
}
