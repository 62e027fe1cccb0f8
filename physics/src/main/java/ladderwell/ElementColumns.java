package ladderwell;

import java.util.Arrays;
import java.util.List;
import ladderwell.evidence.Bound;
import ladderwell.evidence.Certainty;
import ladderwell.formula.Dimension;
import ladderwell.formula.Formula;
import ladderwell.level.Elements;
import ladderwell.level.Levels;
import ladderwell.numeric.Interruption;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Scale;
import ladderwell.quantity.Unit;
import ladderwell.quantity.Units;
import tech.tablesaw.api.DoubleColumn;
import tech.tablesaw.api.LongColumn;
import tech.tablesaw.api.Table;

/**
 * Transition elements as a Tablesaw table in readable units: a row for every pair m ≤ n, for each coupling its element and the error beside it.
 * Errors are those of the calculation, for masses and parameters as given.
 */
final class ElementColumns {
    private final Oscillator oscillator;
    private final Levels levels;
    private final Scale scale;
    private final long[] kept;

    /** Values and errors of one coupling, in SI or natural units, pair by pair. */
    private static final class Values {
        private final double[] value;
        private final double[] error;
        private Certainty certainty = Certainty.GUARANTEED;

        Values(int pairs) {
            value = new double[pairs];
            error = new double[pairs];
        }

        void put(int pair, double element, Bound bound, double size) {
            value[pair] = element * size;
            error[pair] = bound.size() * size * (1 + 0x1p-50) + 4 * Math.ulp(value[pair]);
            certainty = certainty.weaker(bound.kind());
        }

        double largest() {
            double largest = 0;
            for (double v : value) {
                largest = Math.max(largest, Math.abs(v));
            }
            return largest;
        }
    }

    private ElementColumns(Oscillator oscillator, long[] kept) {
        this.oscillator = oscillator;
        this.kept = kept;
        levels = oscillator.levels();
        scale = oscillator.scale();
    }

    static Table of(Oscillator oscillator, long[] kept, List<Coupling> couplings) {
        if (kept.length == 0 || Arrays.stream(kept).distinct().count() != kept.length) {
            throw new IllegalArgumentException("a table of elements needs at least one level, each once");
        }
        if (couplings.isEmpty() || couplings.stream().distinct().count() != couplings.size()) {
            throw new IllegalArgumentException(
                    "a table of elements needs position, momentum or a function of x, each once");
        }
        for (long n : kept) {
            Superposition.checkLevel(oscillator, n);
        }
        double square = (double) kept.length * kept.length;
        Memory.require(
                "elements between " + kept.length + " levels",
                square * Double.BYTES * (6 + 2.0 * couplings.size()),
                "ask for fewer levels");
        long[] ordered = kept.clone();
        Arrays.sort(ordered);
        return new ElementColumns(oscillator, ordered).table(couplings);
    }

    private int pairs() {
        return kept.length * (kept.length + 1) / 2;
    }

    private Table table(List<Coupling> couplings) {
        LongColumn m = LongColumn.create("level m");
        LongColumn n = LongColumn.create("level n");
        for (int i = 0; i < kept.length; i++) {
            for (int j = i; j < kept.length; j++) {
                m.append(kept[i]);
                n.append(kept[j]);
            }
        }
        Table table = Table.create("elements of " + oscillator.kind(), m, n);
        Elements elements = null;
        for (Coupling coupling : couplings) {
            boolean position = coupling.equals(Coupling.POSITION);
            if (position || coupling.equals(Coupling.MOMENTUM)) {
                elements = elements == null ? levels.elements(kept) : elements;
                add(table, coupling, position ? positions(elements) : momenta(elements));
            } else {
                function(table, coupling);
            }
        }
        return table;
    }

    private Values positions(Elements elements) {
        Values values = new Values(pairs());
        double size = scale.of(Kind.LENGTH);
        int pair = 0;
        for (int i = 0; i < kept.length; i++) {
            for (int j = i; j < kept.length; j++) {
                values.put(pair++, elements.position(i, j), elements.positionBound(), size);
            }
        }
        return values;
    }

    private Values momenta(Elements elements) {
        Values values = new Values(pairs());
        double size = scale.of(Kind.MOMENTUM);
        int pair = 0;
        for (int i = 0; i < kept.length; i++) {
            for (int j = i; j < kept.length; j++) {
                values.put(pair++, elements.momentum(i, j), elements.momentumBound(), size);
            }
        }
        return values;
    }

    private void add(Table table, Coupling coupling, Values values) {
        boolean position = coupling.equals(Coupling.POSITION);
        Unit unit = scale.display(position ? Kind.LENGTH : Kind.MOMENTUM, values.largest());
        add(table, (position ? "" : "Im ") + "⟨m|" + coupling.symbol() + "|n⟩", unit, values);
    }

    private void function(Table table, Coupling coupling) {
        Formula formula = coupling.formula(scale.isNatural());
        Formula scaled = scale.isNatural() ? formula : formula.scaled(scale.length(), scale.time(), 1);
        Values values = new Values(pairs());
        int pair = 0;
        for (int i = 0; i < kept.length; i++) {
            for (int j = i; j < kept.length; j++) {
                Interruption.check();
                Levels.Element element = levels.element(kept[i], kept[j], scaled::value);
                values.put(pair++, element.value(), element.bound(), 1);
            }
        }
        String name = "⟨m|" + coupling.symbol() + "|n⟩";
        add(table, name, unit(formula.dimension(), values.largest()), values);
    }

    /** A readable unit where the dimension is of a kind that has one, else that of the SI. */
    private Unit unit(Dimension dimension, double largest) {
        if (dimension.equals(Dimension.LENGTH)) {
            return scale.display(Kind.LENGTH, largest);
        }
        if (dimension.equals(Dimension.ENERGY)) {
            return scale.display(Kind.ENERGY, largest);
        }
        if (dimension.equals(Dimension.MOMENTUM)) {
            return scale.display(Kind.MOMENTUM, largest);
        }
        return dimension.isNone() ? Units.ONE : new Unit(dimension.unit(), Kind.NUMBER, 1, 0);
    }

    private static void add(Table table, String name, Unit unit, Values values) {
        double[] shown = new double[values.value.length];
        double[] off = new double[shown.length];
        for (int i = 0; i < shown.length; i++) {
            shown[i] = unit.fromSi(values.value[i]);
            // The roundings of the conversion, then outward.
            off[i] = Math.nextUp(unit.fromSi(values.error[i]) * (1 + 0x1p-50) + 4 * Math.ulp(shown[i]));
        }
        String sure = " (" + values.certainty.word() + ")";
        table.addColumns(
                DoubleColumn.create(RunTable.head(name, unit), shown),
                DoubleColumn.create(RunTable.head("± " + name, unit) + sure, off));
    }
}
