package ladderwell.formula;

import java.util.List;
import java.util.Optional;
import java.util.function.Predicate;
import ladderwell.quantity.Constants;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Unit;
import ladderwell.quantity.Units;

/**
 * The unit behind a number. The rules:
 *
 * <ul>
 *   <li>A name right behind a number is a unit: 3 eV, 2nm. A factor needs a *: 2*a.
 *   <li>A whole power behind a unit belongs to it: 2 nm^2 is 2 nm², (2 nm)^2 is 4 nm².
 *   <li>Further units may follow with * and /, as long as they are no declared names: 2 eV/nm*x is (2 eV/nm)·x.
 *   <li>A unit may follow the number by a /: 1/nm. The whole is one number: x/2 nm is x/(2 nm).
 *   <li>A number behind /cm or /m alone is a wavenumber and stands for an energy, see {@link Amount}.
 * </ul>
 */
final class UnitReader {

    /** A number with its unit in SI, and the first token behind it. */
    record Read(double value, Dimension dimension, int next) {}

    private final String text;
    private final List<Token> tokens;
    private final Predicate<String> declared;
    private int at;
    private double value;
    private Dimension dimension = Dimension.NONE;
    private boolean lone = true;

    UnitReader(String text, List<Token> tokens, int at, Predicate<String> declared) {
        this.text = text;
        this.tokens = tokens;
        this.at = at;
        this.declared = declared;
    }

    /** In natural units there are none. */
    Optional<Read> none() {
        Token token = tokens.get(at);
        if (token.kind() == Token.Kind.NAME
                && !declared.test(token.text())
                && unit(token.text()).isPresent()) {
            throw new FormulaException(
                    "in natural units a number has no unit; leave out '" + token.text() + "'",
                    text,
                    token.start(),
                    token.end());
        }
        return Optional.empty();
    }

    /**
     * The unit from the token on, if there is one.
     *
     * @param number what stands before it
     * @param afterSlash whether the number is itself a divisor: x/2/nm is not x/(2/nm)
     */
    Optional<Read> read(double number, boolean afterSlash) {
        value = number;
        int first = at;
        Token token = tokens.get(at);
        if (token.kind() == Token.Kind.NAME && !token.is("and") && !token.is("or")) {
            leading(token);
        } else if (afterSlash || !follows("/")) {
            return Optional.empty();
        }
        while (follows("/") || follows("*")) {
            boolean below = tokens.get(at).is("/");
            at++;
            apply(tokens.get(at), below ? -1 : 1, first);
        }
        return Optional.of(new Read(value, dimension, at));
    }

    private void leading(Token token) {
        String name = token.text();
        Optional<Unit> unit = unit(name);
        boolean isHbar = isHbar(name);
        if (unit.isEmpty()
                && !isHbar
                && !declared.test(name)
                && tokens.get(at + 1).is("/")) {
            // units with a prefix only as a whole: Mrad/s
            Optional<Unit> whole = unit(name + "/" + tokens.get(at + 2).text());
            if (whole.isPresent()) {
                value = whole.orElseThrow().toSi(value)
                        * Amount.factor(whole.orElseThrow().kind());
                dimension = dimensionOf(whole.orElseThrow(), token);
                at += 3;
                lone = false;
                return;
            }
        }
        if (unit.isEmpty() && !isHbar) {
            String near = declared.test(name)
                    ? ""
                    : Units.nearest(name)
                            .filter(symbol -> unit(symbol).isPresent())
                            .map(symbol -> "; did you mean the unit '" + symbol + "'?")
                            .orElse("");
            throw new FormulaException(
                    "a name behind a number is its unit, and '" + name + "' is none; write * for a product" + near,
                    text,
                    token.start(),
                    token.end());
        }
        if (!isHbar && declared.test(name)) {
            throw new FormulaException(
                    "'" + name + "' is a unit and a declared name; write * before it for the name, or rename it",
                    text,
                    token.start(),
                    token.end());
        }
        apply(token, 1, at);
    }

    /** Whether the mark and an undeclared unit stand here. */
    private boolean follows(String mark) {
        if (!tokens.get(at).is(mark)) {
            return false;
        }
        Token token = tokens.get(at + 1);
        return token.kind() == Token.Kind.NAME
                && !declared.test(token.text())
                && unit(token.text()).isPresent()
                && !tokens.get(at + 2).is("(");
    }

    private void apply(Token token, int sign, int first) {
        at++;
        int power = sign * exponent();
        if (isHbar(token.text())) {
            multiply(Constants.HBAR, Dimension.ACTION, power, token);
        } else {
            Unit unit = unit(token.text()).orElseThrow();
            boolean wavenumber = power == -1
                    && lone
                    && (unit.equals(Units.CENTIMETRE) || unit.equals(Units.METRE))
                    && !follows("/")
                    && !follows("*");
            if (wavenumber) {
                Unit per = unit.equals(Units.METRE) ? Units.PER_METRE : Units.PER_CENTIMETRE;
                value = per.toSi(value) * Amount.factor(Kind.WAVENUMBER);
                dimension = Dimension.ENERGY;
            } else if (power == 1) {
                value = unit.toSi(value) * Amount.factor(unit.kind());
                dimension = product(dimensionOf(unit, token), 1, token);
            } else {
                multiply(unit.factor() * Amount.factor(unit.kind()), dimensionOf(unit, token), power, token);
            }
        }
        lone = false;
    }

    private Dimension dimensionOf(Unit unit, Token token) {
        try {
            return Dimension.of(unit.kind());
        } catch (IllegalArgumentException e) {
            FormulaException located = new FormulaException(
                    "'" + token.text() + "' has no place in a formula; give a length, a time, an energy or another"
                            + " measured quantity",
                    text,
                    token.start(),
                    token.end());
            located.initCause(e);
            throw located;
        }
    }

    private void multiply(double factor, Dimension one, int power, Token token) {
        // dividing by the power of a unit keeps 2 /nm the nearest number
        double scale = Op.wholePower(factor, Math.abs(power));
        value = power < 0 ? value / scale : value * scale;
        dimension = product(one, power, token);
    }

    private Dimension product(Dimension one, int power, Token token) {
        try {
            return dimension.times(one.power(power));
        } catch (IllegalArgumentException e) {
            FormulaException located = new FormulaException(
                    "powers of units beyond 1000 are not known",
                    text,
                    token.start(),
                    tokens.get(at - 1).end());
            located.initCause(e);
            throw located;
        }
    }

    /** A whole power behind the unit, or 1. */
    private int exponent() {
        if (!tokens.get(at).is("^")) {
            return 1;
        }
        Token mark = tokens.get(at);
        boolean minus = tokens.get(at + 1).is("-");
        int digits = at + (minus ? 2 : 1);
        Token power = tokens.get(Math.min(digits, tokens.size() - 1));
        if (power.kind() != Token.Kind.NUMBER || !power.text().matches("[0-9]{1,3}")) {
            throw new FormulaException(
                    "a power behind a unit belongs to the unit and is a whole number; write (2 nm)^… for another power",
                    text,
                    mark.start(),
                    power.end());
        }
        at = digits + 1;
        int size = Integer.parseInt(power.text());
        return minus ? -size : size;
    }

    private static boolean isHbar(String name) {
        return name.equals("hbar") || name.equals("ħ") || name.equals("ℏ");
    }

    private static Optional<Unit> unit(String name) {
        return Units.parse(name);
    }
}
