package ladderwell.kernel.render;

import com.google.gson.Gson;
import com.google.gson.reflect.TypeToken;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import ladderwell.Fact;
import ladderwell.Oscillator;
import ladderwell.Run;
import ladderwell.State;
import ladderwell.evidence.Bound;
import ladderwell.kernel.cell.MimeBundle;
import ladderwell.kernel.picture.Markup;
import ladderwell.quantity.Digits;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Scale;
import ladderwell.quantity.Unit;

/** Cards: one bold line and the numbers that the trade asks for, of an oscillator, a state or a run. */
final class CardRendering {
    private CardRendering() {}

    /** One line of a card. */
    private record Line(String name, String symbol, String html, String plain) {
        static Line of(Fact fact) {
            SupportedDigits digits = SupportedDigits.of(
                    fact.value().value(), fact.bound(), fact.value().unit());
            return new Line(fact.name(), fact.symbol(), digits.html(), digits.plain());
        }

        static Line words(String name, String words) {
            return new Line(name, "", Markup.text(words), words);
        }
    }

    static MimeBundle oscillator(String head, Oscillator oscillator) {
        return card(head + ": " + oscillator.kind(), oscillator.formula(), facts(oscillator.facts()), "");
    }

    static MimeBundle state(String head, State state) {
        return card(head + ": " + state.kind(), state.origin(), facts(state.facts()), "");
    }

    static MimeBundle run(String head, Run run) {
        Quantity duration = run.evolution().duration();
        List<Line> lines = new ArrayList<>();
        lines.add(Line.words("duration", duration(run)));
        lines.add(Line.words("frames", Long.toString(run.evolution().frames())));
        lines.add(Line.words("method", run.method()));
        lines.add(Line.words("kept", run.size()));
        Bound error = run.stateError();
        String size = "≤ " + (error.isKnown() ? Digits.pretty(Digits.upward(error.size(), 2)) : "unknown");
        lines.add(new Line(
                "error of the state",
                run.errorSymbol(),
                Markup.text(size) + SupportedDigits.letter(error),
                size + " " + error.kind().letter()));
        MimeBundle card =
                card(head + ": " + run.state().kind() + " for " + duration, run.verdict(), lines, run.errorLine());
        return new MimeBundle(card.data(), Map.of("ladderwell", record(run)));
    }

    /** The duration as it was asked for, and in lab units where that was periods. */
    private static String duration(Run run) {
        Quantity asked = run.evolution().duration();
        Scale scale = run.state().oscillator().scale();
        if (asked.kind() != Kind.PERIODS) {
            return asked.toString();
        }
        double si = run.evolution().scaledDuration() * scale.time();
        Unit unit = scale.display(Kind.TIME, Math.abs(si));
        return asked + " = " + Digits.pretty(Digits.significant(unit.fromSi(si), 5))
                + (unit.symbol().isEmpty() ? "" : " " + unit.symbol());
    }

    /** The record of a run as metadata, so that what is shown can be made again and checked. */
    static Map<String, Object> record(Run run) {
        Map<String, Object> record =
                new Gson().fromJson(run.record().json(), new TypeToken<LinkedHashMap<String, Object>>() {}.getType());
        return Map.of("record", record);
    }

    private static List<Line> facts(List<Fact> facts) {
        return facts.stream().map(Line::of).toList();
    }

    private static MimeBundle card(String head, String verdict, List<Line> lines, String errorLine) {
        StringBuilder html = new StringBuilder(2000);
        html.append(PageStyle.ELEMENT)
                .append("<div class=\"lw-sheet lw-card\">\n<div class=\"lw-head\">")
                .append(Markup.text(head))
                .append("</div>\n");
        if (!verdict.isEmpty()) {
            html.append("<div class=\"lw-verdict\">")
                    .append(Markup.text(verdict))
                    .append("</div>\n");
        }
        html.append("<table class=\"lw-table\"><tbody>\n");
        PlainTable plain = new PlainTable(false, false, false);
        for (Line line : lines) {
            html.append("<tr><td>")
                    .append(Markup.text(line.name()))
                    .append(
                            line.symbol().isEmpty()
                                    ? ""
                                    : "<span class=\"lw-symbol\">" + Markup.text(line.symbol()) + "</span>")
                    .append("</td><td>")
                    .append(line.html())
                    .append("</td></tr>\n");
            plain.row(line.name(), line.symbol(), line.plain());
        }
        html.append("</tbody></table>\n");
        if (!errorLine.isEmpty()) {
            html.append("<div class=\"lw-error\">")
                    .append(Markup.text(errorLine))
                    .append("</div>\n");
        }
        html.append("</div>");
        String text = head + (verdict.isEmpty() ? "" : "\n" + verdict) + "\n" + plain.text()
                + (errorLine.isEmpty() ? "" : "\n" + errorLine);
        return MimeBundle.plain(text).with(MimeBundle.HTML, html.toString());
    }
}
