package ladderwell.quantity;

import java.util.Optional;
import javax.measure.MetricPrefix;

/** SI prefixes in steps of a thousand, and the choice of one that makes a magnitude readable. */
final class Prefixes {

    /** Smallest to largest; centi is left to /cm and cm, which are units of their own here. */
    private static final MetricPrefix[] THOUSANDS = {
        MetricPrefix.YOCTO, MetricPrefix.ZEPTO, MetricPrefix.ATTO, MetricPrefix.FEMTO, MetricPrefix.PICO,
        MetricPrefix.NANO, MetricPrefix.MICRO, MetricPrefix.MILLI, MetricPrefix.KILO, MetricPrefix.MEGA,
        MetricPrefix.GIGA, MetricPrefix.TERA, MetricPrefix.PETA, MetricPrefix.EXA, MetricPrefix.ZETTA,
        MetricPrefix.YOTTA
    };

    private Prefixes() {}

    /** Power of ten of a prefix as typed: 0 for "", -6 for "u" and "µ". */
    static Optional<Integer> exponent(String typed) {
        if (typed.isEmpty()) {
            return Optional.of(0);
        }
        if (typed.equals("u") || typed.equals("µ")) {
            return Optional.of(-6);
        }
        for (MetricPrefix prefix : THOUSANDS) {
            if (prefix != MetricPrefix.MICRO && prefix.getSymbol().equals(typed)) {
                return Optional.of(prefix.getExponent());
            }
        }
        return Optional.empty();
    }

    /** Symbol of a prefix; a power of ten that has none is a mistake of this package. */
    static String symbol(int exponent) {
        if (exponent == 0) {
            return "";
        }
        if (exponent == -6) {
            return "µ";
        }
        for (MetricPrefix prefix : THOUSANDS) {
            if (prefix.getExponent() == exponent) {
                return prefix.getSymbol();
            }
        }
        throw new IllegalArgumentException("no SI prefix stands for 10^" + exponent);
    }

    /** A prefix before a unit that has none: kHz from Hz, krad/s from rad/s. */
    static Unit prefixed(int exponent, Unit base) {
        return exponent == 0
                ? base
                : new Unit(
                        symbol(exponent) + base.symbol(), base.kind(), base.coefficient(), base.exponent() + exponent);
    }

    /** ħ over a prefixed metre. */
    static Unit momentum(int lengthExponent) {
        return new Unit("ħ/" + symbol(lengthExponent) + "m", Kind.MOMENTUM, Constants.HBAR, -lengthExponent);
    }

    /** The prefix that brings an SI magnitude between 1 and 1000; the base unit itself for 0. */
    static Unit readable(Unit base, double magnitude) {
        return prefixed(thousands(base.fromSi(Math.abs(magnitude)), -24, 24), base);
    }

    static Unit display(Kind kind, double magnitude) {
        return switch (kind) {
            case MASS -> mass(magnitude);
            case LENGTH -> prefixed(thousands(magnitude, -24, 3), Units.METRE);
            case TIME -> prefixed(thousands(magnitude, -24, 0), Units.SECOND);
            case MOMENTUM -> momentum(-thousands(magnitude / Constants.HBAR, -3, 24));
            case ENERGY -> readable(Units.ELECTRONVOLT, magnitude);
            case TEMPERATURE -> prefixed(thousands(magnitude, -24, 0), Units.KELVIN);
            case CYCLE_FREQUENCY -> readable(Units.HERTZ, magnitude);
            case ANGULAR_FREQUENCY -> readable(Units.RADIAN_PER_SECOND, magnitude);
            case WAVENUMBER -> Units.PER_CENTIMETRE;
            case ANGLE, SQUEEZING, PERIODS, NUMBER -> Units.si(kind);
        };
    }

    /** Electron masses below a tenth of an atomic mass unit, u up to a million u (biomolecules), prefixed grams above. */
    private static Unit mass(double kilograms) {
        double atomic = Units.ATOMIC_MASS.fromSi(kilograms);
        if (atomic < 0.1) {
            return Units.ELECTRON_MASS;
        }
        if (atomic < 1e6) {
            return Units.ATOMIC_MASS;
        }
        return prefixed(thousands(Units.GRAM.fromSi(kilograms), -24, 3), Units.GRAM);
    }

    /** Largest multiple of three not above the decimal exponent of the magnitude, within the limits. */
    private static int thousands(double magnitude, int least, int most) {
        int exponent = most;
        while (exponent > least && Unit.timesPowerOfTen(magnitude, -exponent) < 1) {
            exponent -= 3;
        }
        return magnitude == 0 ? 0 : exponent;
    }
}
