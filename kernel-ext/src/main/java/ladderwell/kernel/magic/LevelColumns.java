package ladderwell.kernel.magic;

import ladderwell.Fact;
import ladderwell.FiniteWell;
import ladderwell.Harmonic;
import ladderwell.Oscillator;
import ladderwell.evidence.Certainty;
import ladderwell.level.Levels;
import ladderwell.quantity.Constants;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Scale;
import ladderwell.quantity.Unit;
import ladderwell.quantity.Units;
import tech.tablesaw.api.DoubleColumn;
import tech.tablesaw.api.LongColumn;
import tech.tablesaw.api.Table;

/**
 * Levels as a Tablesaw table in lab units: energy and spacing to the next level, each with its error.
 *
 * <p>The error of a level is guaranteed. Where the scale of energy rests on a mass given in u or in electron masses, the
 * standard uncertainty of that constant is added, and the errors are statistical.
 */
final class LevelColumns {
    private LevelColumns() {}

    static Table of(Oscillator oscillator, long... shown) {
        Levels levels = oscillator.levels();
        Scale scale = oscillator.scale();
        double uncertainty = massUncertainty(oscillator);
        String sure = " (" + (uncertainty == 0 ? Certainty.GUARANTEED : Certainty.STATISTICAL).word() + ")";
        double size = scale.of(Kind.ENERGY);
        Unit unit = scale.display(Kind.ENERGY, levels.energyHigh(shown[shown.length - 1]) * size);
        double widest = 0;
        for (long n : shown) {
            widest = n + 1 < levels.count() ? Math.max(widest, spacing(levels, n) * size) : widest;
        }
        Unit spacingUnit = scale.display(Kind.ENERGY, widest);

        LongColumn level = LongColumn.create("level n");
        DoubleColumn energy = DoubleColumn.create(head("energy", unit));
        DoubleColumn energyError = DoubleColumn.create(head("± energy", unit) + sure);
        DoubleColumn spacing = DoubleColumn.create(head("spacing to the next", spacingUnit));
        DoubleColumn spacingError = DoubleColumn.create(head("± spacing to the next", spacingUnit) + sure);
        for (long n : shown) {
            level.append(n);
            double value = levels.energyHigh(n);
            double off = levels.energyError(n) + Math.abs(levels.energyLow(n));
            append(energy, energyError, unit, size, value, off + uncertainty * value);
            if (n + 1 < levels.count()) {
                double gap = spacing(levels, n);
                double gapOff = levels.energyError(n) + levels.energyError(n + 1) + 2 * Math.ulp(gap);
                // In a finite well the depth stays when the mass changes, so a spacing is as sure as the upper level.
                double sensitive = oscillator instanceof FiniteWell ? levels.energyHigh(n + 1) : gap;
                append(spacing, spacingError, spacingUnit, size, gap, gapOff + uncertainty * sensitive);
            } else {
                spacing.appendMissing();
                spacingError.appendMissing();
            }
        }
        return Table.create("levels of " + oscillator.kind(), level, energy, energyError, spacing, spacingError);
    }

    private static double spacing(Levels levels, long n) {
        return (levels.energyHigh(n + 1) - levels.energyHigh(n)) + (levels.energyLow(n + 1) - levels.energyLow(n));
    }

    private static void append(
            DoubleColumn values, DoubleColumn errors, Unit unit, double size, double scaled, double scaledError) {
        double value = unit.fromSi(scaled * size);
        values.append(value);
        // Four ulp cover the scale and the three roundings of the conversion; then outward.
        errors.append(Math.nextUp(unit.fromSi(scaledError * size) * (1 + 0x1p-50) + 4 * Math.ulp(value)));
    }

    private static double massUncertainty(Oscillator oscillator) {
        if (oscillator instanceof Harmonic) {
            return 0;
        }
        for (Fact fact : oscillator.given()) {
            Quantity value = fact.value();
            if (value.unit().equals(Units.ATOMIC_MASS)) {
                return Constants.ATOMIC_MASS_CONSTANT_UNCERTAINTY / Constants.ATOMIC_MASS_CONSTANT;
            }
            if (value.unit().equals(Units.ELECTRON_MASS)) {
                return Constants.ELECTRON_REST_MASS_UNCERTAINTY / Constants.ELECTRON_REST_MASS;
            }
        }
        return 0;
    }

    private static String head(String name, Unit unit) {
        return unit.symbol().isEmpty() ? name : name + " / " + unit.symbol();
    }
}
