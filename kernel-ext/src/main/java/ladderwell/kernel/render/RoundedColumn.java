package ladderwell.kernel.render;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import ladderwell.quantity.Digits;
import tech.tablesaw.api.ColumnType;
import tech.tablesaw.api.NumericColumn;
import tech.tablesaw.api.Table;
import tech.tablesaw.columns.Column;

/**
 * The cells of one column as they are shown. A column of numbers with a ± column behind it is rounded where the largest
 * ± shown has its second digit, so that all points stand under each other; the ± shown covers that rounding too.
 */
final class RoundedColumn {
    /** Significant digits where nothing says how many are meant. */
    private static final int PLAIN_DIGITS = 6;

    /** Most significant digits that are shown at all. */
    private static final int MOST = SupportedDigits.MOST;

    private RoundedColumn() {}

    /** True if the heading marks the column as the error of the one before it. */
    static boolean isError(Column<?> column) {
        return column.name().startsWith("±");
    }

    static boolean isNumber(Column<?> column) {
        return column instanceof NumericColumn<?>;
    }

    /** The first {@code rows} cells of the column. */
    static String[] cells(Table table, int index, int rows) {
        Column<?> column = table.column(index);
        String[] cells = new String[rows];
        if (column instanceof NumericColumn<?> numbers) {
            if (index + 1 < table.columnCount()
                    && isError(table.column(index + 1))
                    && table.column(index + 1) instanceof NumericColumn<?> errors) {
                int place = place(numbers, errors, rows);
                for (int i = 0; i < rows; i++) {
                    cells[i] = value(numbers, i, place);
                }
                return cells;
            }
            if (isError(column) && index > 0 && table.column(index - 1) instanceof NumericColumn<?> values) {
                int place = place(values, numbers, rows);
                for (int i = 0; i < rows; i++) {
                    cells[i] = error(values, numbers, i, place);
                }
                return cells;
            }
            if (column.type().equals(ColumnType.DOUBLE) || column.type().equals(ColumnType.FLOAT)) {
                return plain(numbers, rows);
            }
        }
        for (int i = 0; i < rows; i++) {
            cells[i] = column.isMissing(i) ? "" : column.getString(i);
        }
        return cells;
    }

    /** Rounded to six digits, and as many behind the point in every row where that is possible. */
    private static String[] plain(NumericColumn<?> numbers, int rows) {
        double largest = 0;
        int behind = 0;
        boolean fixed = true;
        for (int i = 0; i < rows; i++) {
            double value = numbers.isMissing(i) ? 0 : numbers.getDouble(i);
            if (!Double.isFinite(value)) {
                continue;
            }
            largest = Math.max(largest, Math.abs(value));
            BigDecimal rounded =
                    new BigDecimal(value).round(new MathContext(PLAIN_DIGITS)).stripTrailingZeros();
            behind = Math.max(behind, rounded.scale());
            fixed &= value == 0 || Math.abs(value) >= 1e-4 && Math.abs(value) < 1e7;
        }
        int before = largest < 1 ? 0 : (int) Math.floor(Math.log10(largest)) + 1;
        int digits = Math.max(0, Math.min(behind, PLAIN_DIGITS - before));
        String[] cells = new String[rows];
        for (int i = 0; i < rows; i++) {
            if (numbers.isMissing(i)) {
                cells[i] = "";
            } else if (!Double.isFinite(numbers.getDouble(i))) {
                cells[i] = String.valueOf(numbers.getDouble(i));
            } else if (fixed) {
                cells[i] = minus(new BigDecimal(numbers.getDouble(i)).setScale(digits, RoundingMode.HALF_EVEN));
            } else {
                cells[i] = Digits.pretty(Digits.significant(numbers.getDouble(i), PLAIN_DIGITS));
            }
        }
        return cells;
    }

    /** The decimal place to which a whole column is rounded; {@code Integer.MIN_VALUE} if each row needs its own. */
    private static int place(NumericColumn<?> values, NumericColumn<?> errors, int rows) {
        double error = 0;
        double largest = 0;
        for (int i = 0; i < rows; i++) {
            if (values.isMissing(i) || errors.isMissing(i) || !Double.isFinite(errors.getDouble(i))) {
                continue;
            }
            error = Math.max(error, errors.getDouble(i));
            largest = Math.max(largest, Math.abs(values.getDouble(i)));
        }
        if (largest >= 1e7 || largest < 1e-4) {
            return Integer.MIN_VALUE;
        }
        int top = (int) Math.floor(Math.log10(largest));
        int second = error > 0 ? (int) Math.floor(Math.log10(error)) - 1 : Integer.MIN_VALUE;
        int place = Math.max(second, top - MOST + 1);
        return place > top || place > 0 ? Integer.MIN_VALUE : place;
    }

    private static String value(NumericColumn<?> values, int i, int place) {
        if (values.isMissing(i)) {
            return "";
        }
        double value = values.getDouble(i);
        if (!Double.isFinite(value)) {
            return String.valueOf(value);
        }
        return place == Integer.MIN_VALUE
                ? Digits.pretty(Digits.significant(value, MOST))
                : minus(new BigDecimal(value).setScale(-place, RoundingMode.HALF_EVEN));
    }

    private static String error(NumericColumn<?> values, NumericColumn<?> errors, int i, int place) {
        if (errors.isMissing(i)) {
            return "";
        }
        double error = errors.getDouble(i);
        if (!Double.isFinite(error)) {
            return error > 0 ? "unknown" : String.valueOf(error);
        }
        double value = values.isMissing(i) ? 0 : values.getDouble(i);
        if (Double.isFinite(value) && value != 0) {
            BigDecimal exact = new BigDecimal(value);
            BigDecimal shown = place == Integer.MIN_VALUE
                    ? exact.round(new MathContext(MOST, RoundingMode.HALF_EVEN))
                    : exact.setScale(-place, RoundingMode.HALF_EVEN);
            error = Math.nextUp(error + Math.nextUp(shown.subtract(exact).abs().doubleValue()));
        }
        return Digits.pretty(Digits.upward(error, 2));
    }

    private static String minus(BigDecimal number) {
        return number.signum() == 0 && number.scale() <= 0
                ? "0"
                : number.toPlainString().replace('-', '−');
    }
}
