package ladderwell.formula;

import static java.util.Objects.requireNonNull;

import java.util.Collections;
import java.util.Map;
import java.util.TreeMap;
import ladderwell.quantity.Quantity;

/** The named parameters that a formula may use, each with its value. Immutable. */
public final class Parameters {

    private static final Parameters NONE = new Parameters(Map.of());

    private final Map<String, Amount> values;

    private Parameters(Map<String, Amount> values) {
        this.values = Collections.unmodifiableMap(new TreeMap<>(values));
    }

    /** No parameters. */
    public static Parameters none() {
        return NONE;
    }

    /**
     * Parameters from quantities.
     *
     * @throws IllegalArgumentException if a name cannot be one, or a quantity has no place in a formula
     */
    public static Parameters of(Map<String, Quantity> quantities) {
        Parameters all = NONE;
        for (Map.Entry<String, Quantity> entry : new TreeMap<>(quantities).entrySet()) {
            all = all.with(entry.getKey(), entry.getValue());
        }
        return all;
    }

    /** These and one more; a parameter of the same name is replaced. */
    public Parameters with(String name, Quantity value) {
        return with(name, Amount.of(value));
    }

    /**
     * These and one more, as text: with("a", "2 eV/angstrom^4").
     *
     * @throws FormulaException if the text is no number with a unit
     */
    public Parameters with(String name, String value) {
        return with(name, Amount.read(value));
    }

    /**
     * These and one more; a parameter of the same name is replaced.
     *
     * @throws IllegalArgumentException if the name is taken by the formula language or is no name
     */
    public Parameters with(String name, Amount value) {
        requireNonNull(value, "value");
        if (!Token.isName(name)) {
            throw new IllegalArgumentException("'" + name
                    + "' cannot be the name of a parameter; a name is a letter followed by letters, digits and _");
        }
        if (Parser.isTaken(name)) {
            throw new IllegalArgumentException(
                    "'" + name + "' has a meaning of its own in formulas; give the parameter another name");
        }
        Map<String, Amount> more = new TreeMap<>(values);
        more.put(name, value);
        return new Parameters(more);
    }

    /** The values by name, in order of the names. */
    public Map<String, Amount> values() {
        return values;
    }

    /** As a map. */
    @Override
    public String toString() {
        return values.toString();
    }
}
