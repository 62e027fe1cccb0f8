package ladderwell.kernel.sentence;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import ladderwell.formula.Amount;
import ladderwell.formula.FormulaException;
import ladderwell.quantity.Digits;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Unit;
import ladderwell.quantity.Units;

/** Reads the value of one key. */
final class Values {
    /** Stands for the value of an expression that was not evaluated; anything may be made of it. */
    static final Object UNKNOWN = new Object();

    /** Longest text that can be the symbol of a unit. */
    private static final int LONGEST_UNIT = 24;

    private static final Pattern RANGE = Pattern.compile("([0-9]+)\\.\\.([0-9]+)");

    private static final long LONGEST_RANGE = 100_000;

    private final Key key;
    private final List<Term> terms;
    private final Beyond beyond;

    /** What the sentence knows of terms that follow a complete value. */
    interface Beyond {
        /** What is wrong with such a term. */
        MisreadSentence mistake(Term term, String complete);

        /** Whether the term is the start of a new entry, which a comma should part from the value. */
        boolean isEntry(Term term);
    }

    /** @param terms the terms of the value, at least one */
    Values(Key key, List<Term> terms, Beyond beyond) {
        this.key = key;
        this.terms = terms;
        this.beyond = beyond;
    }

    /** A quantity. @param natural what is in natural units, so that its values have no unit; empty for lab units */
    Quantity quantity(Optional<String> natural) throws MisreadSentence {
        Term first = terms.get(0);
        if (first.result().isPresent() && first.result().get() instanceof Quantity quantity) {
            refuseMore(terms, 1);
            checkUnit(quantity.unit(), first.place(), quantity.toString(), natural);
            return quantity;
        }
        Scanned scanned = real(first);
        List<Term> unitTerms = new ArrayList<>();
        scanned.rest().ifPresent(unitTerms::add);
        unitTerms.addAll(terms.subList(1, terms.size()));
        boolean bare = unitTerms.isEmpty() || (scanned.rest().isEmpty() && beyond.isEntry(unitTerms.get(0)));
        if (bare && (natural.isEmpty() || unitTerms.isEmpty())) {
            return first.isUnknown()
                    ? Quantity.of(1, Units.si(key.kinds().get(0)))
                    : withoutUnit(scanned.value(), first, natural);
        }
        Unit unit = unit(unitTerms, first.text());
        String number = first.text()
                .substring(
                        0,
                        first.text().length()
                                - scanned.rest().map(r -> r.text().length()).orElse(0));
        checkUnit(unit, unitTerms.get(0).place(), number + " " + unit.plain(), natural);
        return made(scanned.value(), unit, first.place().to(unitTerms.get(0).place()));
    }

    private Quantity withoutUnit(double number, Term term, Optional<String> natural) throws MisreadSentence {
        if (natural.isPresent()) {
            return made(number, key.kinds().get(0) == Kind.ANGLE ? Units.RADIAN : Units.ONE, term.place());
        }
        throw new MisreadSentence(
                "the unit is missing after " + Words.quoted(term.text()) + "; " + key.word() + " takes "
                        + key.expected(),
                term.place());
    }

    private Quantity made(double number, Unit unit, Place place) throws MisreadSentence {
        try {
            return Quantity.of(number, unit);
        } catch (IllegalArgumentException e) {
            throw new MisreadSentence(String.valueOf(e.getMessage()), place, e);
        }
    }

    private void checkUnit(Unit unit, Place place, String typed, Optional<String> natural) throws MisreadSentence {
        Kind kind = unit.kind();
        boolean scaleFree = kind == Kind.ANGLE || kind == Kind.PERIODS || kind == Kind.SQUEEZING;
        if (natural.isPresent() && !scaleFree) {
            if (kind != Kind.NUMBER) {
                throw new MisreadSentence(
                        natural.get() + " is in natural units, so " + key.word() + " is a plain number; leave out "
                                + Words.quoted(unit.plain()),
                        place);
            }
        } else if (!key.kinds().contains(kind)) {
            throw new MisreadSentence(
                    Words.quoted(typed) + " is " + kind.word() + "; " + key.word() + " takes " + key.expected(), place);
        }
    }

    private Unit unit(List<Term> found, String number) throws MisreadSentence {
        Term first = found.get(0);
        if (!first.word() || beyond.isEntry(first)) {
            throw beyond.mistake(first, number);
        }
        // Only "kg m/s" is written in two words.
        for (int words = Math.min(2, found.size()); words > 0; words--) {
            String symbol = words == 1
                    ? first.text()
                    : first.text() + " " + found.get(1).text();
            Optional<Unit> unit = symbol.length() > LONGEST_UNIT ? Optional.empty() : Units.parse(symbol);
            if (unit.isPresent()) {
                refuseMore(found, words);
                return unit.get();
            }
        }
        String typed = first.text();
        if (typed.startsWith("_") || typed.startsWith("'")) {
            throw new MisreadSentence("a number is written without separators, as in 1000", first.place());
        }
        if (typed.length() > 1 && typed.charAt(0) == '/' && Character.isDigit(typed.charAt(1))) {
            throw new MisreadSentence("a fraction is written as a decimal, such as 0.5", first.place());
        }
        throw new MisreadSentence(
                Words.quoted(typed) + " is no unit; " + key.word() + " takes " + key.expected()
                        + Words.didYouMean(nearestUnit(typed)),
                first.place());
    }

    private Optional<String> nearestUnit(String typed) {
        List<String> symbols = key.kinds().stream()
                .flatMap(kind -> Units.symbols(kind).stream())
                .toList();
        if (typed.length() > LONGEST_UNIT) {
            return Optional.empty();
        }
        Optional<String> usual = Units.nearest(typed);
        return symbols.stream()
                .filter(symbol -> symbol.equalsIgnoreCase(typed))
                .findFirst()
                .or(() -> usual.filter(symbols::contains))
                .or(() -> Words.nearest(typed, symbols))
                .or(() -> usual);
    }

    /** A number with a unit of any make: "2 eV/angstrom^4", or an expression that gives a number or a quantity. */
    Amount amount() throws MisreadSentence {
        if (terms.stream().anyMatch(Term::isUnknown)) {
            return Amount.number(1);
        }
        StringBuilder text = new StringBuilder();
        for (Term term : terms) {
            if (term.result().isPresent() && term.result().get() instanceof Quantity quantity) {
                refuseMore(terms, 1);
                return Amount.of(quantity);
            }
            if (term.result().isPresent()) {
                text.append(Digits.shortest(resulting(term, term.result().get())));
            } else if (term.word()) {
                text.append(term.text());
            } else {
                throw notExpected(term);
            }
            text.append(' ');
        }
        Place place = terms.get(0).place().to(terms.get(terms.size() - 1).place());
        try {
            return Amount.read(text.toString().strip());
        } catch (FormulaException e) {
            throw new MisreadSentence(
                    key.word() + " takes " + key.expected() + ", not "
                            + Words.quoted(text.toString().strip()) + ": " + e.reason(),
                    place,
                    e);
        }
    }

    /** A real number without a unit. */
    double number() throws MisreadSentence {
        return plain(terms);
    }

    private double plain(List<Term> value) throws MisreadSentence {
        Term first = value.get(0);
        Scanned scanned = real(first);
        if (scanned.rest().isEmpty() && value.size() == 1) {
            return scanned.value();
        }
        Term more = scanned.rest().orElseGet(() -> value.get(1));
        if (more.word()
                && more.text().length() <= LONGEST_UNIT
                && Units.parse(more.text()).isPresent()) {
            throw new MisreadSentence(
                    key.word() + " is a plain number; leave out the unit " + Words.quoted(more.text()), more.place());
        }
        throw scanned.rest().isPresent() ? notExpected(first) : beyond.mistake(more, first.text());
    }

    /** A whole number within the limits of the key. */
    long count() throws MisreadSentence {
        return whole(terms.get(0), number());
    }

    /** One of the words that the key takes, in any case; an expression may give it. */
    String choice() throws MisreadSentence {
        Term term = terms.get(0);
        if (term.isUnknown()) {
            return key.choices().get(0);
        }
        String typed = Words.plain(term.result().map(String::valueOf).orElse(term.text()))
                .strip();
        if (!key.choices().contains(typed)) {
            throw new MisreadSentence(
                    key.word() + " takes " + key.expected() + ", not " + Words.quoted(term.text())
                            + Words.didYouMean(
                                    typed.length() > LONGEST_UNIT
                                            ? Optional.empty()
                                            : Words.nearest(typed, key.choices())),
                    term.place());
        }
        refuseMore(terms, 1);
        return typed;
    }

    /** Whole numbers. */
    List<Long> counts() throws MisreadSentence {
        List<Long> all = new ArrayList<>();
        for (Term term : terms) {
            Matcher range = RANGE.matcher(term.word() ? term.text() : "");
            if (range.matches()) {
                addRange(term, range, all);
            } else {
                all.add(whole(term, plain(List.of(term))));
            }
        }
        return all;
    }

    /** A stretch of whole numbers such as 0..5, both ends included. */
    private void addRange(Term term, Matcher range, List<Long> all) throws MisreadSentence {
        long from = whole(term, plain(List.of(part(term, range.start(1), range.end(1)))));
        long to = whole(term, plain(List.of(part(term, range.start(2), range.end(2)))));
        if (to < from || to - from >= LONGEST_RANGE) {
            throw new MisreadSentence(
                    Words.quoted(term.text())
                            + (to < from
                                    ? " runs downward; expected the lower number first, as in 0..5"
                                    : " holds more than " + LONGEST_RANGE + " numbers"),
                    term.place());
        }
        for (long n = from; n <= to; n++) {
            all.add(n);
        }
    }

    private static Term part(Term term, int from, int to) {
        int start = term.place().start();
        return new Term(term.text().substring(from, to), new Place(start + from, start + to), Optional.empty(), true);
    }

    private long whole(Term term, double real) throws MisreadSentence {
        if (term.isUnknown()) {
            return Math.max(1, key.least());
        }
        if (real != Math.rint(real)) {
            throw notExpected(term);
        }
        long whole = exact(term, real);
        if (whole < key.least() || whole > key.most()) {
            String range = whole < key.least() ? "at least " + key.least() : "at most " + key.most();
            throw new MisreadSentence(key.word() + " must be " + range + ", not " + whole, term.place());
        }
        return whole;
    }

    /** Digits are read as they stand; what was written with a power of ten, such as 1e17, is the nearest double. */
    private long exact(Term term, double real) throws MisreadSentence {
        if (term.result().isPresent()
                && (term.result().get() instanceof Long || term.result().get() instanceof Integer)) {
            return ((Number) term.result().get()).longValue();
        }
        try {
            return Long.parseLong(term.text().replace('−', '-'));
        } catch (NumberFormatException e) {
            if (Math.abs(real) >= 0x1p63) {
                throw new MisreadSentence(
                        key.word() + " " + Words.quoted(term.text())
                                + " is too large; whole numbers reach to about 9.2e18",
                        term.place());
            }
            return (long) real;
        }
    }

    /** One complex number; blanks around its signs do no harm. */
    Complex complex() throws MisreadSentence {
        Term all = terms.get(0);
        for (Term next : terms.subList(1, terms.size())) {
            boolean continues = all.word()
                    && next.word()
                    && (NumberText.isSign(next.text().charAt(0))
                            || NumberText.isSign(all.text().charAt(all.text().length() - 1)));
            if (!continues) {
                throw beyond.mistake(next, all.text());
            }
            all = new Term(all.text() + next.text(), all.place().to(next.place()), Optional.empty(), true);
        }
        return complex(all);
    }

    /** Complex numbers. */
    List<Complex> complexes() throws MisreadSentence {
        List<Complex> all = new ArrayList<>();
        for (Term term : terms) {
            all.add(complex(term));
        }
        return all;
    }

    private Complex complex(Term term) throws MisreadSentence {
        if (!term.word()) {
            return new Complex(real(term).value(), 0);
        }
        refuseSpecial(term);
        String text = term.text();
        double[] parts = new double[2];
        boolean[] seen = new boolean[2];
        for (int at = 0; at < text.length(); ) {
            if (at > 0 && !NumberText.isSign(text.charAt(at))) {
                throw notExpected(term);
            }
            NumberText number = NumberText.at(text, at);
            int end = number.end();
            double value = number.value();
            if (end == at) {
                // A sign alone, or nothing, before i.
                end += NumberText.isSign(text.charAt(at)) ? 1 : 0;
                value = end > at && text.charAt(at) != '+' ? -1 : 1;
            } else {
                checkSize(text.substring(at, end), value, term);
            }
            int part = end < text.length() && text.charAt(end) == 'i' ? 1 : 0;
            if (seen[part] || (part == 0 && number.end() == at)) {
                throw notExpected(term);
            }
            seen[part] = true;
            parts[part] = value;
            at = end + part;
        }
        return new Complex(parts[0], parts[1]);
    }

    /** A number at the start of a term, and what stands behind it in the same word. */
    private record Scanned(double value, Optional<Term> rest) {}

    private Scanned real(Term term) throws MisreadSentence {
        if (term.isUnknown()) {
            return new Scanned(1, Optional.empty());
        }
        if (term.result().isPresent()) {
            return new Scanned(resulting(term, term.result().get()), Optional.empty());
        }
        if (!term.word()) {
            throw notExpected(term);
        }
        refuseSpecial(term);
        NumberText number = NumberText.at(term.text(), 0);
        if (number.end() == 0) {
            throw notExpected(term);
        }
        checkSize(term.text().substring(0, number.end()), number.value(), term);
        return new Scanned(
                number.value(),
                number.end() == term.text().length() ? Optional.empty() : Optional.of(term.from(number.end())));
    }

    private double resulting(Term term, Object result) throws MisreadSentence {
        boolean plain = result instanceof Quantity quantity && quantity.kind() == Kind.NUMBER;
        if (!plain && !(result instanceof Number)) {
            String name = result.getClass().getSimpleName();
            throw new MisreadSentence(
                    Words.quoted(term.text()) + " gives "
                            + (result instanceof Quantity quantity
                                    ? quantity.kind().word() + ", " + quantity
                                    : Words.article(name.isEmpty() ? "object" : name))
                            + "; " + key.word() + " takes " + key.expected(),
                    term.place());
        }
        double value = plain ? ((Quantity) result).value() : ((Number) result).doubleValue();
        if (!Double.isFinite(value)) {
            throw new MisreadSentence(
                    key.word() + " must be a finite number; " + Words.quoted(term.text()) + " is " + value,
                    term.place());
        }
        return value;
    }

    private static void checkSize(String typed, double value, Term term) throws MisreadSentence {
        if (Double.isInfinite(value)) {
            throw new MisreadSentence(
                    Words.quoted(typed) + " is too large for a number; the largest is about 1.8e308", term.place());
        }
        if (value == 0 && NumberText.saysNonzero(typed)) {
            throw new MisreadSentence(
                    Words.quoted(typed) + " is too small for a number; the smallest is about 5e-324", term.place());
        }
    }

    private void refuseSpecial(Term term) throws MisreadSentence {
        String text = term.text();
        String word = (NumberText.isSign(text.charAt(0)) ? text.substring(1) : text);
        String lower = word.length() > 12 ? "" : word.toLowerCase(Locale.ROOT);
        if (lower.equals("nan") || lower.equals("inf") || lower.equals("infinity") || lower.equals("∞")) {
            throw new MisreadSentence(
                    key.word() + " must be finite, not " + Words.quoted(text) + "; expected " + key.expected(),
                    term.place());
        }
    }

    private MisreadSentence notExpected(Term term) {
        return new MisreadSentence(
                key.word() + " takes " + key.expected() + ", not " + Words.quoted(term.text()), term.place());
    }

    private void refuseMore(List<Term> found, int complete) throws MisreadSentence {
        if (found.size() > complete) {
            throw beyond.mistake(found.get(complete), found.get(complete - 1).text());
        }
    }
}
