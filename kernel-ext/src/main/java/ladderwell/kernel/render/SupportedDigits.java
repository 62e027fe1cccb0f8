package ladderwell.kernel.render;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.Optional;
import ladderwell.evidence.Bound;
import ladderwell.kernel.picture.Markup;
import ladderwell.quantity.Digits;
import ladderwell.quantity.Unit;

/**
 * A number to the digits that its bound supports, but no more than {@link #MOST} of them: "7.539822369(1)", the bound in
 * the last place in lighter ink and the kind of certainty as a letter; hovering tells all digits.
 */
record SupportedDigits(double value, Bound bound, String unit) {
    /** Digits on a card; more would be no easier to read and are told on hovering. */
    static final int MOST = 10;

    static SupportedDigits of(double value, Bound bound, Unit unit) {
        return new SupportedDigits(value, bound, unit.symbol());
    }

    /** "0.1582113883(2)" in plain characters; exact numbers in full. */
    private String number() {
        if (!Double.isFinite(value)) {
            return String.valueOf(value);
        }
        if (bound.isExact() || bound.size() < Double.MIN_NORMAL) {
            return Digits.pretty(Digits.shortest(value));
        }
        return Digits.pretty(withinMost().orElseGet(() -> Digits.withBound(value, bound.size())));
    }

    /** Rounded to the most digits shown, if the bound supports more: off by less than 1 in the last of them. */
    private Optional<String> withinMost() {
        if (value == 0) {
            return Optional.empty();
        }
        BigDecimal exact = new BigDecimal(value);
        BigDecimal rounded = exact.round(new MathContext(MOST, RoundingMode.HALF_EVEN));
        rounded = rounded.setScale(rounded.scale() + MOST - rounded.precision());
        BigDecimal unit = BigDecimal.ONE.scaleByPowerOfTen(-rounded.scale());
        if (!bound.isKnown()
                || new BigDecimal(bound.size())
                                .add(exact.subtract(rounded).abs())
                                .compareTo(unit)
                        > 0) {
            return Optional.empty();
        }
        int top = MOST - 1 - rounded.scale();
        if (top >= -4 && top < 7) {
            return Optional.of(rounded.toPlainString() + "(1)");
        }
        return Optional.of(rounded.scaleByPowerOfTen(-top).toPlainString() + "(1)e" + top);
    }

    private String behind() {
        return unit.isEmpty() ? "" : " " + unit;
    }

    /** "7.539822369(1) Mrad/s g". */
    String plain() {
        return number() + behind() + (bound.isExact() ? "" : " " + bound.kind().letter());
    }

    /** The same with the ± in lighter ink and the letter explained. */
    String html() {
        String number = Markup.text(number());
        int open = number.indexOf('(');
        int close = number.indexOf(')', open);
        if (open >= 0 && close > open) {
            number = number.substring(0, open) + "<span class=\"lw-pm\">" + number.substring(open, close + 1)
                    + "</span>" + number.substring(close + 1);
        }
        String told = bound.isExact() || !Double.isFinite(value)
                ? ""
                : " title=\""
                        + Markup.text(Digits.pretty(Digits.shortest(value)) + " ± " + size() + behind() + ", "
                                + bound.kind().word())
                        + "\"";
        return "<span" + told + ">" + number + Markup.text(behind()) + "</span>"
                + (bound.isExact() ? "" : letter(bound));
    }

    private String size() {
        return bound.isKnown() ? Digits.pretty(Digits.upward(bound.size(), 2)) : "unknown";
    }

    static String letter(Bound bound) {
        return " <span class=\"lw-sure\" title=\"" + bound.kind().word() + "\">"
                + bound.kind().letter() + "</span>";
    }
}
