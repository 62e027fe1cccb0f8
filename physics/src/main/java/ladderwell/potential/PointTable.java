package ladderwell.potential;

import java.util.ArrayList;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Unit;
import ladderwell.quantity.Units;
import tech.tablesaw.api.NumericColumn;
import tech.tablesaw.api.Table;
import tech.tablesaw.columns.Column;

/** A potential as columns of a table: position, value and, if there is a third, the uncertainty of the value. */
final class PointTable {
    private static final Pattern HEAD = Pattern.compile(".*?(?:/\\s*(\\S.*?)|\\(([^)]*)\\)|\\[([^]]*)])\\s*");

    private PointTable() {}

    static Potential potential(Quantity mass, Table table) {
        if (table.columnCount() < 2 || table.columnCount() > 3) {
            throw new IllegalArgumentException(
                    "a table of a potential has columns for x, V and, if known, the uncertainty of V;"
                            + " this one has " + table.columnCount() + ": " + table.columnNames());
        }
        boolean natural = mass.kind() == Kind.NUMBER;
        List<double[]> values = new ArrayList<>();
        List<Unit> units = new ArrayList<>();
        for (Column<?> column : table.columns()) {
            values.add(numbers(column));
            units.add(natural ? Units.ONE : unit(column.name()));
        }
        double[] uncertainty = new double[0];
        if (values.size() == 3) {
            if (!units.get(2).equals(units.get(1))) {
                throw new IllegalArgumentException("the columns '"
                        + table.column(1).name() + "' and '" + table.column(2).name() + "' must be in the same unit");
            }
            uncertainty = values.get(2);
        }
        return Potential.tabulated(mass, units.get(0), values.get(0), units.get(1), values.get(1), uncertainty);
    }

    private static double[] numbers(Column<?> column) {
        if (column instanceof NumericColumn<?> numeric) {
            return numeric.asDoubleArray();
        }
        double[] numbers = new double[column.size()];
        for (int i = 0; i < numbers.length; i++) {
            String text = column.getString(i).strip();
            try {
                numbers[i] = Double.parseDouble(text);
            } catch (NumberFormatException e) {
                throw new IllegalArgumentException(
                        "'" + text + "' in row " + (i + 1) + " of column '" + column.name() + "' is no number", e);
            }
        }
        return numbers;
    }

    /** The unit in a head such as "x / nm", "x (nm)" or "x [nm]". */
    private static Unit unit(String head) {
        Matcher matcher = HEAD.matcher(head);
        if (!matcher.matches()) {
            throw new IllegalArgumentException(
                    "column '" + head + "' names no unit; expected a head such as 'x / nm' or 'V / eV'");
        }
        String symbol = matcher.group(1) != null
                ? matcher.group(1)
                : matcher.group(2) != null ? matcher.group(2) : matcher.group(3);
        return Units.parse(symbol.strip())
                .orElseThrow(() -> new IllegalArgumentException("'" + symbol + "' in the head '" + head
                        + "' is no unit; expected one such as nm, angstrom, eV or /cm"));
    }
}
