package ladderwell;

import java.util.Arrays;
import java.util.List;
import java.util.OptionalDouble;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Scale;
import ladderwell.quantity.Unit;
import tech.tablesaw.api.DoubleColumn;
import tech.tablesaw.api.Table;

/** A run as a Tablesaw table in lab units: one unit for a whole column, the error beside each value. */
final class RunTable {
    private RunTable() {}

    static Table of(Run run, List<Observable> observables) {
        if (observables.isEmpty()) {
            throw new IllegalArgumentException("a table needs at least one observable, such as position or energy");
        }
        if (observables.stream().distinct().count() != observables.size()) {
            throw new IllegalArgumentException("a table names each observable once");
        }
        Memory.require(
                "a table of " + run.times() + " times and " + observables.size() + " observables",
                (2.0 * observables.size() + 2) * run.times() * Double.BYTES * 2,
                "ask for fewer frames or fewer observables");
        Scale scale = run.state().oscillator().scale();
        Table table = Table.create(
                run.state().kind() + " in " + run.state().oscillator().kind());
        addTimes(table, run, scale);
        for (Observable observable : observables) {
            Series series = run.series(observable);
            addSeries(table, series, scale);
        }
        return table;
    }

    private static void addTimes(Table table, Run run, Scale scale) {
        double[] lab = new double[run.times()];
        Unit unit = scale.display(Kind.TIME, run.time(run.times() - 1) * scale.time());
        for (int j = 0; j < lab.length; j++) {
            lab[j] = unit.fromSi(run.time(j) * scale.time());
        }
        table.addColumns(DoubleColumn.create(head("time", unit), lab));
        period(run).ifPresent(period -> {
            double[] periods = new double[run.times()];
            Arrays.setAll(periods, j -> run.time(j) / period);
            table.addColumns(DoubleColumn.create("time / periods", periods));
        });
    }

    private static OptionalDouble period(Run run) {
        try {
            return OptionalDouble.of(run.state().period());
        } catch (IllegalArgumentException notBound) {
            return OptionalDouble.empty();
        }
    }

    private static void addSeries(Table table, Series series, Scale scale) {
        Kind kind = series.kind();
        double size = scale.of(kind);
        double largest = 0;
        for (int j = 0; j < series.size(); j++) {
            largest = Math.max(largest, Math.abs(series.value(j)));
        }
        Unit unit = scale.display(kind, largest * size);
        double[] values = new double[series.size()];
        double[] errors = new double[series.size()];
        for (int j = 0; j < values.length; j++) {
            values[j] = unit.fromSi(series.value(j) * size);
            // three roundings of the conversion, then outward
            errors[j] = Math.nextUp(unit.fromSi(series.error(j) * size) * (1 + 0x1p-50) + 4 * Math.ulp(values[j]));
        }
        String name = series.observable().name();
        table.addColumns(
                DoubleColumn.create(head(name, unit), values),
                DoubleColumn.create(
                        head("± " + name, unit) + " (" + series.certainty().word() + ")", errors));
    }

    /** "position / nm". */
    static String head(String name, Unit unit) {
        return unit.symbol().isEmpty() ? name : name + " / " + unit.symbol();
    }
}
