package ladderwell.formula;

import static ladderwell.formula.Algebra.add;
import static ladderwell.formula.Algebra.call;
import static ladderwell.formula.Algebra.divide;
import static ladderwell.formula.Algebra.multiply;
import static ladderwell.formula.Algebra.negate;

import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.TreeSet;
import java.util.function.BinaryOperator;
import ladderwell.quantity.Constants;

/**
 * Text → tree, with the dimension of every part checked on the way. Binding, loosest first: or; and; comparisons; + −;
 * * /; sign; ^ (from the right). The rules for units are in {@link UnitReader}.
 */
final class Parser {

    /** Brackets in brackets, signs and powers that may be nested. */
    static final int DEEPEST = 100;

    static final int LONGEST = 20_000;

    /** Factors of one product; a derivative has as many terms, each of as many factors. */
    static final int MOST_FACTORS = 128;

    /** Values of one min or max; each pair may cross. */
    static final int MOST_CHOICES = 32;

    private static final Set<String> WORDS = Set.of("x", "t", "pi", "hbar", "and", "or");

    /** What a name other than a parameter stands for. */
    record Leaf(Node node, Dimension dimension) {}

    /** Position and time in natural units. */
    static final Map<String, Leaf> NATURAL_COORDINATES = coordinates(Dimension.NONE, Dimension.NONE);

    /** Position and time in lab units. */
    static final Map<String, Leaf> LAB_COORDINATES = coordinates(Dimension.LENGTH, Dimension.TIME);

    /** A part that has no value for some arguments. */
    record Hazard(Node argument, String words, int start, int end) {}

    /** What was read. */
    record Result(Node node, Dimension dimension, List<Hazard> hazards, Set<String> parameters) {}

    /** A part of the formula: its tree, what it measures, whether it is a condition, and its place. */
    private record Part(Node node, Dimension dimension, boolean condition, int start, int end) {}

    private final String text;
    private final Parameters parameters;
    private final boolean natural;
    private final Map<String, Leaf> variables;
    private final List<Token> tokens;
    private final List<Hazard> hazards = new ArrayList<>();
    private final Set<String> used = new TreeSet<>();
    private int at;
    private int nested;

    /**
     * A reader of one formula.
     *
     * @param natural numbers without units, ħ = 1
     * @param variables the names that are neither parameters nor constants, in the order to tell them in
     */
    Parser(String text, Parameters parameters, boolean natural, Map<String, Leaf> variables) {
        this.text = text;
        this.parameters = parameters;
        this.natural = natural;
        this.variables = variables;
        if (text.length() > LONGEST) {
            throw new FormulaException(
                    "a formula may have " + LONGEST + " characters, not " + text.length(),
                    text,
                    LONGEST,
                    text.length());
        }
        tokens = Token.read(text);
    }

    private static Map<String, Leaf> coordinates(Dimension position, Dimension time) {
        Map<String, Leaf> both = new LinkedHashMap<>();
        both.put("x", new Leaf(Node.X, position));
        both.put("t", new Leaf(Node.T, time));
        return Collections.unmodifiableMap(both);
    }

    static boolean isTaken(String name) {
        return WORDS.contains(name) || Op.function(name).isPresent();
    }

    Result parse() {
        if (peek().kind() == Token.Kind.END) {
            throw new FormulaException("the formula is empty; expected one such as 0.5*x^2", text, 0, 0);
        }
        Part all = either();
        Token rest = peek();
        if (rest.kind() != Token.Kind.END) {
            throw rest.is(")")
                    ? error("this bracket closes nothing", rest)
                    : error("'" + rest.text() + "' is too much here; expected + - * / ^ or the end", rest);
        }
        value(all);
        return new Result(all.node, all.dimension, List.copyOf(hazards), used);
    }

    private Token peek() {
        return tokens.get(at);
    }

    private Token next() {
        return tokens.get(at++);
    }

    private FormulaException error(String reason, Token token) {
        return new FormulaException(reason, text, token.start(), token.end());
    }

    private FormulaException error(String reason, Part part) {
        return new FormulaException(reason, text, part.start, part.end);
    }

    private Part either() {
        Part left = both();
        while (peek().is("or")) {
            next();
            left = joined(Op.OR, left, both(), "or");
        }
        return left;
    }

    private Part both() {
        Part left = comparison();
        while (peek().is("and")) {
            next();
            left = joined(Op.AND, left, comparison(), "and");
        }
        return left;
    }

    private Part joined(Op op, Part a, Part b, String word) {
        condition(a, "'" + word + "'");
        condition(b, "'" + word + "'");
        return new Part(deep(call(op, a.node, b.node), a.start, b.end), Dimension.NONE, true, a.start, b.end);
    }

    /** One comparison, or a chain: 0 &lt; x &lt; 2. */
    private Part comparison() {
        Part left = sum();
        Part all = left;
        boolean first = true;
        while (peek().is("<") || peek().is("<=") || peek().is(">") || peek().is(">=")) {
            String mark = next().text();
            Part right = sum();
            value(left);
            value(right);
            scalar(left, "a comparison");
            scalar(right, "a comparison");
            if (!left.dimension.fits(right.dimension)) {
                throw new FormulaException(
                        left.dimension.word() + " cannot be compared with " + right.dimension.word(),
                        text,
                        left.start,
                        right.end);
            }
            Op op = mark.endsWith("=") ? Op.LESS_EQUAL : Op.LESS;
            Node test = mark.startsWith("<") ? call(op, left.node, right.node) : call(op, right.node, left.node);
            Node node = first ? test : call(Op.AND, all.node, test);
            all = new Part(deep(node, all.start, right.end), Dimension.NONE, true, all.start, right.end);
            left = right;
            first = false;
        }
        return all;
    }

    private Part sum() {
        Part first = product();
        if (!peek().is("+") && !peek().is("-")) {
            return first;
        }
        value(first);
        List<Node> terms = new ArrayList<>(List.of(first.node));
        Dimension dimension = first.dimension;
        Part last = first;
        while (peek().is("+") || peek().is("-")) {
            boolean minus = next().is("-");
            last = product();
            value(last);
            if (!dimension.fits(last.dimension)) {
                throw new FormulaException(
                        minus
                                ? last.dimension.word() + " cannot be subtracted from " + dimension.word()
                                : dimension.word() + " cannot be added to " + last.dimension.word(),
                        text,
                        last.start,
                        last.end);
            }
            dimension = dimension.or(last.dimension);
            terms.add(minus ? negate(last.node) : last.node);
        }
        Node node = add(terms.toArray(new Node[0]));
        return new Part(deep(node, first.start, last.end), dimension, false, first.start, last.end);
    }

    private Part product() {
        Part first = signed();
        if (!peek().is("*") && !peek().is("/")) {
            return first;
        }
        value(first);
        List<Node> factors = new ArrayList<>(List.of(first.node));
        Dimension dimension = first.dimension;
        int end = first.end;
        while (peek().is("*") || peek().is("/")) {
            Token mark = next();
            if (peek().is("*")) {
                throw error("a power is written with ^, not with **", peek());
            }
            Part right = signed();
            value(right);
            end = right.end;
            if (mark.is("*")) {
                factors.add(right.node);
                dimension = combined(Dimension::times, dimension, right, first.start);
            } else {
                scalar(right, "a divisor");
                hazard(right.node, "the divisor", right.start, right.end);
                Node above = multiply(factors.toArray(new Node[0]));
                factors.clear();
                factors.add(deep(divide(above, right.node), first.start, end));
                dimension = combined(Dimension::over, dimension, right, first.start);
            }
        }
        Node node = multiply(factors.toArray(new Node[0]));
        return new Part(deep(node, first.start, end), dimension, false, first.start, end);
    }

    private Dimension combined(BinaryOperator<Dimension> rule, Dimension left, Part right, int start) {
        try {
            return rule.apply(left, right.dimension);
        } catch (IllegalArgumentException e) {
            FormulaException located =
                    new FormulaException("powers of units beyond 1000 are not known", text, start, right.end);
            located.initCause(e);
            throw located;
        }
    }

    private Part signed() {
        Token token = peek();
        if (token.is("-") || token.is("+")) {
            next();
            enter(token);
            Part inner = signed();
            nested--;
            value(inner);
            Node node = token.is("-") ? negate(inner.node) : inner.node;
            return new Part(deep(node, token.start(), inner.end), inner.dimension, false, token.start(), inner.end);
        }
        return power();
    }

    private void enter(Token token) {
        if (++nested > DEEPEST) {
            throw error("the formula is nested deeper than " + DEEPEST + " levels", token);
        }
    }

    private Part power() {
        Part base = operand();
        if (!peek().is("^")) {
            notSideBySide();
            return base;
        }
        Token mark = next();
        enter(mark);
        Part exponent = signed();
        nested--;
        value(base);
        value(exponent);
        plain(exponent, "an exponent");
        scalar(exponent, "an exponent");
        if (base.node.usesLetter()) {
            operatorPower(exponent);
        }
        Dimension dimension;
        if (base.dimension.isNone() && !base.dimension.equals(Dimension.ANY)) {
            dimension = Dimension.NONE;
        } else {
            if (!exponent.node.isFixed()) {
                throw error(
                        base.dimension.word() + " cannot be raised to a power that varies; divide it by its unit first",
                        exponent);
            }
            double value = exponent.node.value(0, 0);
            try {
                dimension = base.dimension.power(value);
            } catch (IllegalArgumentException e) {
                FormulaException located = error(
                        base.dimension.word() + " to the power " + value
                                + " has no unit; expected a whole power or a small fraction",
                        exponent);
                located.initCause(e);
                throw located;
            }
        }
        if (!exponent.node.isFixed() || exponent.node.value(0, 0) < 0) {
            hazard(base.node, "the base of the power", base.start, base.end);
        }
        Node node = Algebra.power(base.node, exponent.node);
        return new Part(deep(node, base.start, exponent.end), dimension, false, base.start, exponent.end);
    }

    private void operatorPower(Part exponent) {
        double value = exponent.node.isFixed() ? exponent.node.value(0, 0) : Double.NaN;
        if (!(value >= 0 && value <= Polynomial.HIGHEST && value == Math.rint(value))) {
            throw error(
                    "an operator is raised to a whole power from 0 to " + Polynomial.HIGHEST
                            + (exponent.node.isFixed() ? "" : ", one that does not vary"),
                    exponent);
        }
    }

    private void notSideBySide() {
        Token token = peek();
        boolean operand = token.kind() == Token.Kind.NUMBER
                || token.is("(")
                || token.kind() == Token.Kind.NAME && !token.is("and") && !token.is("or");
        if (operand) {
            throw error("two factors stand side by side; write * between them", token);
        }
    }

    private Part operand() {
        Token token = next();
        switch (token.kind()) {
            case NUMBER:
                return number(token);
            case NAME:
                return named(token);
            case END:
                throw error("the formula ends where a number, a name or a bracket is expected", token);
            default:
                break;
        }
        if (!token.is("(")) {
            throw error("'" + token.text() + "' stands where a number, a name or a bracket is expected", token);
        }
        enter(token);
        if (peek().is(")")) {
            throw new FormulaException("these brackets are empty", text, token.start(), peek().end());
        }
        Part inner = either();
        nested--;
        if (!peek().is(")")) {
            throw peek().kind() == Token.Kind.END
                    ? error("this bracket is never closed", token)
                    : error("'" + peek().text() + "' is too much here; expected + - * / ^ or )", peek());
        }
        return new Part(inner.node, inner.dimension, inner.condition, token.start(), next().end());
    }

    private Part number(Token token) {
        double value = Double.parseDouble(token.text().replace('−', '-'));
        if (Double.isInfinite(value)) {
            throw error("the number '" + token.text() + "' is too large; the largest is about 1.8e308", token);
        }
        boolean afterSlash = at >= 2 && tokens.get(at - 2).is("/");
        UnitReader units = new UnitReader(text, tokens, at, this::isDeclared);
        Optional<UnitReader.Read> unit = natural ? units.none() : units.read(value, afterSlash);
        if (unit.isEmpty()) {
            return new Part(
                    Node.constant(value),
                    value == 0 ? Dimension.ANY : Dimension.NONE,
                    false,
                    token.start(),
                    token.end());
        }
        UnitReader.Read read = unit.orElseThrow();
        at = read.next();
        if (!Double.isFinite(read.value())) {
            throw new FormulaException(
                    "this quantity is too large to compute with",
                    text,
                    token.start(),
                    tokens.get(at - 1).end());
        }
        return new Part(
                Node.constant(read.value()),
                read.dimension(),
                false,
                token.start(),
                tokens.get(at - 1).end());
    }

    private boolean isDeclared(String name) {
        return variables.containsKey(name)
                || isTaken(name) && !name.equals("x") && !name.equals("t")
                || parameters.values().containsKey(name);
    }

    private Part named(Token token) {
        String name = token.text();
        Optional<Op> function = Op.function(name);
        if (function.isPresent()) {
            return function(token, function.orElseThrow());
        }
        Part part = leaf(token);
        if (peek().is("(")) {
            throw new FormulaException(
                    "'" + name + "' is no function; write " + name + "*(…) for a product",
                    text,
                    token.start(),
                    peek().end());
        }
        return part;
    }

    private Part leaf(Token token) {
        String name = token.text();
        Amount amount = parameters.values().get(name);
        Leaf variable = variables.get(name);
        if (amount != null && variable != null) {
            throw error(
                    "'" + name + "' is an operator here and also a parameter; give the parameter another name", token);
        }
        if (amount != null) {
            used.add(name);
            return part(
                    token,
                    Node.parameter(name, amount.value()),
                    amount.value() == 0 && amount.dimension().isNone() ? Dimension.ANY : amount.dimension());
        }
        if (variable != null) {
            return part(token, variable.node, variable.dimension);
        }
        if (name.equals("pi") || name.equals("π")) {
            return part(token, Node.constant(Math.PI), Dimension.NONE);
        }
        if (name.equals("hbar") || name.equals("ħ") || name.equals("ℏ")) {
            return natural
                    ? part(token, Node.ONE, Dimension.NONE)
                    : part(token, Node.parameter("hbar", Constants.HBAR), Dimension.ACTION);
        }
        throw error(Names.unknown(name, peek().is("("), natural, variables.keySet(), parameters), token);
    }

    private Part part(Token token, Node node, Dimension dimension) {
        return new Part(node, dimension, false, token.start(), token.end());
    }

    private Part function(Token token, Op op) {
        String name = op.function();
        if (!peek().is("(")) {
            throw error("'" + name + "' is a function; write " + Names.signature(op), token);
        }
        Token open = next();
        enter(open);
        List<Part> args = new ArrayList<>();
        if (!peek().is(")")) {
            args.add(either());
            while (peek().is(",")) {
                next();
                args.add(either());
            }
        }
        nested--;
        if (!peek().is(")")) {
            throw peek().kind() == Token.Kind.END
                    ? error("the bracket of " + name + " is never closed", open)
                    : error("'" + peek().text() + "' is too much here; expected + - * / ^ , or )", peek());
        }
        int end = next().end();
        boolean many = op == Op.MIN || op == Op.MAX;
        if (many ? args.size() < 2 : args.size() != op.arguments()) {
            throw new FormulaException(
                    name + " takes "
                            + (many
                                    ? "two or more values"
                                    : op.arguments() + (op.arguments() == 1 ? " value" : " values"))
                            + ", not " + args.size() + ": " + Names.signature(op),
                    text,
                    token.start(),
                    end);
        }
        if (args.size() > MOST_CHOICES) {
            throw new FormulaException(
                    name + " takes at most " + MOST_CHOICES + " values, not " + args.size(), text, token.start(), end);
        }
        Dimension dimension = check(op, args);
        // exp of an imaginary number is a rotating factor; all else is real
        if (op != Op.EXP || args.get(0).node.usesLadder()) {
            args.forEach(arg -> scalar(arg, name));
        }
        hazards(op, args);
        Node[] nodes = args.stream().map(Part::node).toArray(Node[]::new);
        return new Part(deep(call(op, nodes), token.start(), end), dimension, false, token.start(), end);
    }

    private Dimension check(Op op, List<Part> args) {
        Part first = args.get(0);
        if (op == Op.IF) {
            condition(first, "the first place of if");
            value(args.get(1));
            value(args.get(2));
            return same(op, args.subList(1, 3));
        }
        args.forEach(this::value);
        return switch (op) {
            case MIN, MAX -> same(op, args);
            case GAUSS -> {
                same(op, args);
                yield Dimension.NONE;
            }
            case ABS -> first.dimension;
            case SIGN, STEP -> Dimension.NONE;
            case SQRT -> {
                try {
                    yield first.dimension.power(0.5);
                } catch (IllegalArgumentException e) {
                    FormulaException located = error("the root of " + first.dimension.word() + " has no unit", first);
                    located.initCause(e);
                    throw located;
                }
            }
            default -> {
                plain(first, op.function());
                yield Dimension.NONE;
            }
        };
    }

    private Dimension same(Op op, List<Part> args) {
        Dimension dimension = args.get(0).dimension;
        for (Part arg : args.subList(1, args.size())) {
            if (!dimension.fits(arg.dimension)) {
                throw error(
                        op.function() + " needs values of one kind; this one is " + arg.dimension.word()
                                + ", the one before it " + dimension.word(),
                        arg);
            }
            dimension = dimension.or(arg.dimension);
        }
        return dimension;
    }

    private void hazards(Op op, List<Part> args) {
        Part first = args.get(0);
        switch (op) {
            case LOG -> hazard(first.node, "the argument of log", first.start, first.end);
            case SQRT -> hazard(first.node, "the argument of sqrt", first.start, first.end);
            case TAN -> hazard(call(Op.COS, first.node), "the cosine under tan", first.start, first.end);
            case GAUSS -> hazard(args.get(2).node, "the width of gauss", args.get(2).start, args.get(2).end);
            default -> {}
        }
    }

    private void hazard(Node argument, String words, int start, int end) {
        String what = words + " '" + text.substring(start, end) + "'";
        if (argument.isFixed()) {
            double value = argument.value(0, 0);
            boolean root = words.endsWith("sqrt");
            if (value == 0 && !root || value < 0 && (root || words.endsWith("log"))) {
                throw new FormulaException(what + (value == 0 ? " is 0" : " is negative"), text, start, end);
            }
            return;
        }
        hazards.add(new Hazard(argument, what, start, end));
    }

    private void value(Part part) {
        if (part.condition) {
            throw error("this is a condition, which has a place only in if(condition, value, value)", part);
        }
    }

    private void scalar(Part part, String where) {
        if (part.node.usesLetter()) {
            throw error(
                    where + " takes real numbers, parameters and t, and '" + text.substring(part.start, part.end) + "' "
                            + (part.node.usesLadder() ? "holds an operator" : "is not real"),
                    part);
        }
    }

    private void condition(Part part, String where) {
        if (!part.condition) {
            throw error(where + " needs a condition such as x < 0", part);
        }
    }

    private void plain(Part part, String what) {
        if (!part.dimension.isNone()) {
            throw error(what + " needs a plain number, and this is " + part.dimension.word(), part);
        }
    }

    /** Trees are walked by recursion later on: no deeper than the stack of any thread bears. */
    private Node deep(Node node, int start, int end) {
        if (node.depth > 3 * DEEPEST) {
            throw new FormulaException(
                    "the formula is nested too deeply; name parts of it as parameters", text, start, end);
        }
        if (node.op == Op.MULTIPLY && node.args.length > MOST_FACTORS) {
            throw new FormulaException(
                    "a product may have " + MOST_FACTORS + " factors, not " + node.args.length
                            + "; write powers with ^",
                    text,
                    start,
                    end);
        }
        return node;
    }
}
