package ladderwell.quantity;

import tech.units.indriya.AbstractUnit;
import tech.units.indriya.function.MultiplyConverter;
import tech.units.indriya.quantity.Quantities;

/** The bridge to JSR-385; the only class that touches its implementation, so that nothing else waits for it to load. */
final class Measures {

    private Measures() {}

    static javax.measure.Unit<?> of(Unit unit) {
        javax.measure.Unit<?> si = si(unit.kind());
        javax.measure.Unit<?> sized =
                unit.coefficient() == 1 ? si : si.transform(MultiplyConverter.of(unit.coefficient()));
        return unit.exponent() == 0 ? sized : sized.transform(MultiplyConverter.ofTenExponent(unit.exponent()));
    }

    static javax.measure.Quantity<?> of(Quantity quantity) {
        return Quantities.getQuantity(quantity.value(), of(quantity.unit()));
    }

    private static javax.measure.Unit<?> si(Kind kind) {
        return switch (kind) {
            case MASS -> tech.units.indriya.unit.Units.KILOGRAM;
            case LENGTH -> tech.units.indriya.unit.Units.METRE;
            case TIME -> tech.units.indriya.unit.Units.SECOND;
            case MOMENTUM ->
                tech.units.indriya.unit.Units.KILOGRAM.multiply(tech.units.indriya.unit.Units.METRE_PER_SECOND);
            case ENERGY -> tech.units.indriya.unit.Units.JOULE;
            case TEMPERATURE -> tech.units.indriya.unit.Units.KELVIN;
            case CYCLE_FREQUENCY -> tech.units.indriya.unit.Units.HERTZ;
            case ANGULAR_FREQUENCY -> tech.units.indriya.unit.Units.RADIAN.divide(tech.units.indriya.unit.Units.SECOND);
            case WAVENUMBER -> tech.units.indriya.unit.Units.METRE.inverse();
            case ANGLE -> tech.units.indriya.unit.Units.RADIAN;
            case SQUEEZING, PERIODS, NUMBER -> AbstractUnit.ONE;
        };
    }
}
