package ladderwell;

import java.util.Arrays;
import ladderwell.evidence.Bound;
import ladderwell.evidence.Certainty;
import ladderwell.level.Levels;
import ladderwell.quantity.Digits;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Scale;
import ladderwell.quantity.Unit;
import tech.tablesaw.api.DoubleColumn;
import tech.tablesaw.api.LongColumn;
import tech.tablesaw.api.StringColumn;
import tech.tablesaw.api.Table;

/**
 * Levels as a Tablesaw table in readable units: energy and spacing to the next level, each with its error. Levels that cannot be told apart at
 * this precision are named in a column of their own.
 *
 * <p>Where the scale of energy rests on a mass given in u or in electron masses, the standard uncertainty of that constant is added, and the
 * errors are statistical.
 */
final class LevelColumns {
    private final Oscillator oscillator;
    private final Levels levels;
    private final double size;
    private final double uncertainty;

    private LevelColumns(Oscillator oscillator) {
        this.oscillator = oscillator;
        levels = oscillator.levels();
        size = oscillator.scale().of(Kind.ENERGY);
        uncertainty = new Shown(oscillator.scale()).massUncertainty(oscillator);
    }

    static Table of(Oscillator oscillator, long... shown) {
        if (shown.length == 0) {
            throw new IllegalArgumentException("a table of levels needs at least one level");
        }
        return new LevelColumns(oscillator).table(shown);
    }

    private Table table(long... shown) {
        Scale scale = oscillator.scale();
        double largest = 0;
        double widest = 0;
        Certainty sure = uncertainty == 0 ? Certainty.GUARANTEED : Certainty.STATISTICAL;
        boolean clustered = false;
        for (long n : shown) {
            Superposition.checkLevel(oscillator, n);
            largest = Math.max(largest, Math.abs(levels.energyHigh(n)) * size);
            widest = n + 1 < levels.count() ? Math.max(widest, levels.splitting(n) * size) : widest;
            sure = sure.weaker(levels.energyBound(n).kind());
            clustered |= !levels.cluster(n).single();
        }
        Unit unit = scale.display(Kind.ENERGY, largest);
        Unit spacingUnit = scale.display(Kind.ENERGY, widest);
        String how = " (" + sure.word() + ")";
        LongColumn level = LongColumn.create("level n");
        DoubleColumn energy = DoubleColumn.create(head("energy", unit));
        DoubleColumn energyError = DoubleColumn.create(head("± energy", unit) + how);
        DoubleColumn spacing = DoubleColumn.create(head("spacing to the next", spacingUnit));
        DoubleColumn spacingError = DoubleColumn.create(head("± spacing to the next", spacingUnit) + how);
        StringColumn clusters = StringColumn.create("not told apart");
        double bottom = bottom();
        for (long n : shown) {
            level.append(n);
            double value = levels.energyHigh(n);
            double off = levels.energyError(n) + Math.abs(levels.energyLow(n));
            append(energy, energyError, unit, value, off + uncertainty * (value - bottom));
            Levels.Cluster cluster = levels.cluster(n);
            clusters.append(cluster.single() ? "" : words(cluster, unit));
            if (n + 1 < levels.count()) {
                double gap = levels.splitting(n);
                Bound bound = levels.splittingBound(n);
                // Parameters of the potential stay when the mass changes: a spacing is as sure as the upper level, but
                // no less sure
                // than itself where it is tiny.
                double sensitive = uncertainty == 0 ? 0 : sensitive(n, gap, bottom);
                append(
                        spacing,
                        spacingError,
                        spacingUnit,
                        gap,
                        bound.size() + 2 * Math.ulp(gap) + uncertainty * sensitive);
            } else {
                spacing.appendMissing();
                spacingError.appendMissing();
            }
        }
        Table table = Table.create("levels of " + oscillator.kind(), level, energy, energyError, spacing, spacingError);
        return clustered ? table.addColumns(clusters) : table;
    }

    private double sensitive(long n, double gap, double bottom) {
        return oscillator instanceof Box ? gap : levels.energyHigh(n + 1) - bottom;
    }

    /** The least of the potential; energies above it go with the mass at most in proportion. */
    private double bottom() {
        if (!(oscillator instanceof PotentialWell well)) {
            return 0;
        }
        double least = well.potential(well.potential().minimum());
        // At a singular end the kinetic energy is of the size of the binding energy (virial theorem).
        return Double.isFinite(least) ? least : 3 * Math.min(0, levels.energyHigh(0));
    }

    private String words(Levels.Cluster cluster, Unit unit) {
        return cluster.first() + " to " + cluster.last() + " within "
                + Digits.upward(unit.fromSi(cluster.spread().size() * size), 2) + " " + unit.symbol();
    }

    private void append(DoubleColumn values, DoubleColumn errors, Unit unit, double scaled, double scaledError) {
        double value = unit.fromSi(scaled * size);
        values.append(value);
        // Four ulp cover the scale and the three roundings of the conversion; then outward.
        errors.append(Math.nextUp(unit.fromSi(scaledError * size) * (1 + 0x1p-50) + 4 * Math.ulp(value)));
    }

    /** "energy / meV". */
    static String head(String name, Unit unit) {
        return unit.symbol().isEmpty() ? name : name + " / " + unit.symbol();
    }

    /** The lowest levels, from 0. */
    static long[] lowest(int count) {
        long[] shown = new long[count];
        Arrays.setAll(shown, n -> n);
        return shown;
    }
}
