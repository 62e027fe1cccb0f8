package ladderwell.kernel.picture;

import com.google.gson.JsonArray;
import com.google.gson.JsonObject;
import java.util.Locale;
import ladderwell.Oscillator;
import tech.tablesaw.plotly.components.Layout;

/** Potential, levels and wave functions of an oscillator, labels at the right; beside them the spacings of the levels. */
public final class LevelPicture {
    private static final int HEIGHT = 330;
    private static final int WIDTH = 780;
    private static final int TOP = 8;
    private static final int BOTTOM = 42;

    /** Margin at the right where the spacings stand there. */
    private static final int BESIDE = 16;

    /** The share of the width that the levels take beside the spacings, and where the spacings begin. */
    private static final double LEVELS_END = 0.67;

    private static final double SPACINGS_BEGIN = 0.825;

    private final LevelDiagram diagram;
    private final Spacings spacings;

    private LevelPicture(LevelDiagram diagram, Spacings spacings) {
        this.diagram = diagram;
        this.spacings = spacings;
    }

    /** The picture of these levels; of many, the lowest that can be told apart. */
    public static LevelPicture of(String name, Oscillator oscillator, long... levels) {
        return new LevelPicture(LevelDiagram.of(name, oscillator, levels), Spacings.of(oscillator, levels));
    }

    /** What the picture shows, in a sentence. */
    public String description() {
        String words = spacings.words();
        return words.isEmpty() ? diagram.description() : diagram.description() + " " + capital(words) + ".";
    }

    private static String capital(String words) {
        return words.substring(0, 1).toUpperCase(Locale.ROOT) + words.substring(1);
    }

    /** Two spacings make a line. */
    private boolean hasSpacings() {
        return spacings.count() > 1;
    }

    /** Number of levels drawn. */
    public int levels() {
        return diagram.count();
    }

    /** The picture as HTML. */
    public String html(Easel easel) {
        String words = spacings.words();
        String verdict = words.isEmpty() ? "" : "<b>" + Markup.text(diagram.name()) + "</b> " + Markup.text(words);
        return easel.picture("levels", diagram.name(), drawing(), verdict, Easel.image(still(), description()), "");
    }

    JsonObject drawing() {
        double from = diagram.from();
        double to = diagram.to();
        Layout layout = Layout.builder()
                .height(HEIGHT)
                .width(WIDTH)
                .margin(Drawing.margin(TOP, BOTTOM))
                .showLegend(false)
                .hoverMode(Layout.HoverMode.CLOSEST)
                .xAxis(Drawing.axis(Written.axis("position x", diagram.lengthUnit()), from, to, 7)
                        .build())
                .yAxis(Drawing.axis(Written.axis("energy", diagram.energyUnit()), diagram.bottom(), diagram.top(), 6)
                        .build())
                .build();
        JsonArray traces = new JsonArray();
        traces.add(Drawing.trace(Drawing.line("potential", 1)));
        double[] x = new double[3 * diagram.count()];
        double[] y = new double[x.length];
        JsonArray labels = new JsonArray();
        JsonArray hover = new JsonArray();
        for (int k = 0; k < diagram.count(); k++) {
            x[3 * k] = from;
            x[3 * k + 1] = to;
            x[3 * k + 2] = Double.NaN;
            y[3 * k] = diagram.energy(k);
            y[3 * k + 1] = diagram.energy(k);
            y[3 * k + 2] = Double.NaN;
            if (diagram.labelled(k, HEIGHT - TOP - BOTTOM)) {
                JsonObject label = new JsonObject();
                label.addProperty("text", diagram.label(k, HEIGHT - TOP - BOTTOM));
                label.addProperty("y", diagram.energy(k));
                labels.add(label);
            }
            hover.add(diagram.label(k) + ": " + Written.number(diagram.energy(k), 6)
                    + Markup.plot(Written.behind(diagram.energyUnit())));
        }
        traces.add(Drawing.with(Drawing.trace(Drawing.dashes("level", 1)), x, y));
        for (int k = 0; k < diagram.curves(); k++) {
            traces.add(Drawing.trace(Drawing.line("wave", 1.6)));
        }
        if (hasSpacings()) {
            traces.add(spacingTrace());
        }
        JsonObject words = new JsonObject();
        words.add("hover", hover);
        words.add("spacings", spacings.hover());
        JsonObject data = new JsonObject();
        JsonArray range = new JsonArray();
        range.add(from);
        range.add(to);
        range.add(LevelDiagram.POINTS);
        data.add("x", range);
        if (diagram.curves() > 0) {
            data.add("waves", waves());
        }
        data.add("potential", diagram.potential().json(diagram.lengthScale(), diagram.energyScale()));
        data.add("labels", labels);
        data.add("words", words);
        JsonObject drawing = Drawing.figure(layout, traces);
        if (hasSpacings()) {
            beside(drawing.getAsJsonObject("layout"));
        }
        drawing.add("data", data);
        return drawing;
    }

    private JsonObject spacingTrace() {
        JsonObject trace =
                Drawing.with(Drawing.trace(Drawing.points("spacing", 6)), spacings.levels(), spacings.gaps());
        trace.addProperty("xaxis", "x2");
        trace.addProperty("yaxis", "y3");
        if (spacings.isErrorSeen()) {
            trace.add("error_y", spacings.errorBars());
        }
        return trace;
    }

    /** Makes room at the right and puts the axes of the spacings there. */
    private void beside(JsonObject layout) {
        layout.getAsJsonObject("margin").addProperty("r", BESIDE);
        JsonObject across = layout.getAsJsonObject("xaxis");
        JsonObject number = across.deepCopy();
        JsonObject size = layout.getAsJsonObject("yaxis").deepCopy();
        across.add("domain", range(0, LEVELS_END));
        number.add("domain", range(SPACINGS_BEGIN, 1));
        number.addProperty("anchor", "y3");
        number.addProperty("title", "n");
        number.add("range", range(firstNumber(), lastNumber()));
        number.addProperty("tickmode", "linear");
        number.addProperty("tick0", 0);
        number.addProperty("dtick", numberStep());
        size.addProperty("anchor", "x2");
        size.addProperty("title", Markup.plot(Written.axis("Eₙ₊₁ − Eₙ", spacings.unit())));
        size.add("range", range(0, spacings.top()));
        size.addProperty("nticks", 5);
        layout.add("xaxis2", number);
        layout.add("yaxis3", size);
    }

    private double firstNumber() {
        return spacings.level(0) - 0.06 * (1 + spacings.level(spacings.count() - 1) - spacings.level(0));
    }

    private double lastNumber() {
        long last = spacings.level(spacings.count() - 1);
        return last + 0.06 * (1 + last - spacings.level(0));
    }

    /** 1, 2, 5, 10 …: so that about four numbers stand below the spacings. */
    private long numberStep() {
        long across = spacings.level(spacings.count() - 1) - spacings.level(0);
        long ten = 1;
        while (across / ten > 40) {
            ten *= 10;
        }
        for (long step : new long[] {1, 2, 5}) {
            if (across / (step * ten) <= 4) {
                return step * ten;
            }
        }
        return 10 * ten;
    }

    private static JsonArray range(double from, double to) {
        JsonArray range = new JsonArray();
        range.add(from);
        range.add(to);
        return range;
    }

    private JsonObject waves() {
        double[] all = new double[diagram.curves() * LevelDiagram.POINTS];
        for (int k = 0; k < diagram.curves(); k++) {
            System.arraycopy(diagram.lifted(k), 0, all, k * LevelDiagram.POINTS, LevelDiagram.POINTS);
        }
        return Packed.of(all);
    }

    /** The still, as a whole SVG document. */
    public String still() {
        StringBuilder svg = new StringBuilder(16000);
        svg.append(StillInk.head(WIDTH, HEIGHT, description()));
        double left = Drawing.LEFT;
        double right = right();
        svg.append("<svg x=\"")
                .append(Drawing.LEFT)
                .append("\" y=\"")
                .append(TOP)
                .append("\" width=\"")
                .append((int) (right - left))
                .append("\" height=\"")
                .append(HEIGHT - TOP - BOTTOM)
                .append("\">");
        Potential potential = diagram.potential();
        double[] px = potential.x().clone();
        double[] py = potential.height().clone();
        for (int i = 0; i < px.length; i++) {
            px[i] *= diagram.lengthScale();
            py[i] *= diagram.energyScale();
        }
        svg.append("<path class=\"hair\" d=\"").append(path(px, py, 1)).append("\"/>");
        double[] x = new double[LevelDiagram.POINTS];
        for (int i = 0; i < x.length; i++) {
            x[i] = diagram.from() + (diagram.to() - diagram.from()) * i / (x.length - 1);
        }
        for (int k = 0; k < diagram.count(); k++) {
            double[] at = {diagram.energy(k), diagram.energy(k)};
            svg.append("<path class=\"dash\" d=\"")
                    .append(path(new double[] {x[0], x[x.length - 1]}, at, 1))
                    .append("\"/>");
            if (k < diagram.curves()) {
                svg.append("<path class=\"line\" d=\"")
                        .append(path(x, diagram.lifted(k), 3))
                        .append("\"/>");
            }
        }
        svg.append("</svg>");
        for (int k = 0; k < diagram.count(); k++) {
            if (diagram.labelled(k, HEIGHT - TOP - BOTTOM)) {
                svg.append("<text class=\"ochre\" x=\"")
                        .append((int) right + 6)
                        .append("\" y=\"")
                        .append(Filmstrip.tenth(TOP + up(diagram.energy(k)) + 4))
                        .append("\">")
                        .append(diagram.label(k, HEIGHT - TOP - BOTTOM))
                        .append("</text>");
            }
        }
        svg.append("<text class=\"faint\" x=\"")
                .append(Drawing.LEFT)
                .append("\" y=\"")
                .append(HEIGHT - 20)
                .append("\">")
                .append(Markup.text(Written.axis("energy", diagram.energyUnit())))
                .append(" from ")
                .append(Markup.text(Written.number(diagram.bottom(), 3)))
                .append(" to ")
                .append(Markup.text(Written.number(diagram.top(), 3)))
                .append(" · ")
                .append(Markup.text(Written.axis("position x", diagram.lengthUnit())))
                .append(" from ")
                .append(Markup.text(Written.number(diagram.from(), 3)))
                .append(" to ")
                .append(Markup.text(Written.number(diagram.to(), 3)))
                .append("</text>");
        if (hasSpacings()) {
            stillSpacings(svg);
        }
        return svg.append("</svg>").toString();
    }

    /** Right end of the levels, in pixels. */
    private double right() {
        return hasSpacings() ? Drawing.LEFT + LEVELS_END * (WIDTH - Drawing.LEFT - BESIDE) : WIDTH - Drawing.RIGHT;
    }

    private void stillSpacings(StringBuilder svg) {
        double from = Drawing.LEFT + SPACINGS_BEGIN * (WIDTH - Drawing.LEFT - BESIDE);
        double to = WIDTH - BESIDE;
        double high = HEIGHT - TOP - BOTTOM;
        StringBuilder line = new StringBuilder();
        for (int i = 0; i < spacings.count(); i++) {
            double x = from + (to - from) * (spacings.level(i) - firstNumber()) / (lastNumber() - firstNumber());
            double y = TOP + high * (1 - spacings.gap(i) / spacings.top());
            line.append(i == 0 ? "M" : "L")
                    .append(Filmstrip.tenth(x))
                    .append(' ')
                    .append(Filmstrip.tenth(y));
            svg.append("<circle class=\"dash\" style=\"stroke-dasharray:none\" r=\"2.6\" cx=\"")
                    .append(Filmstrip.tenth(x))
                    .append("\" cy=\"")
                    .append(Filmstrip.tenth(y))
                    .append("\"/>");
        }
        svg.append("<path class=\"hair\" d=\"").append(line).append("\"/>");
        svg.append("<path class=\"hair\" d=\"M")
                .append(Filmstrip.tenth(from))
                .append(' ')
                .append(TOP)
                .append("V")
                .append(HEIGHT - BOTTOM)
                .append("H")
                .append(Filmstrip.tenth(to))
                .append("\"/>");
        svg.append("<text class=\"faint\" text-anchor=\"end\" x=\"")
                .append((int) to)
                .append("\" y=\"")
                .append(HEIGHT - BOTTOM + 16)
                .append("\">")
                .append(Markup.text(
                        "spacing to " + Written.number(spacings.top(), 3) + Written.behind(spacings.unit())))
                .append("</text>");
        svg.append("<text class=\"faint\" text-anchor=\"end\" x=\"")
                .append((int) to)
                .append("\" y=\"")
                .append(HEIGHT - BOTTOM + 32)
                .append("\">n from ")
                .append(spacings.level(0))
                .append(" to ")
                .append(spacings.level(spacings.count() - 1))
                .append("</text>");
    }

    private double up(double energy) {
        return (HEIGHT - TOP - BOTTOM) * (diagram.top() - energy) / (diagram.top() - diagram.bottom());
    }

    private String path(double[] x, double[] y, int stride) {
        double across = right() - Drawing.LEFT;
        StringBuilder path = new StringBuilder();
        for (int i = 0; i < x.length; i += stride) {
            path.append(i == 0 ? "M" : "L")
                    .append(Filmstrip.tenth((x[i] - diagram.from()) / (diagram.to() - diagram.from()) * across))
                    .append(' ')
                    .append(Filmstrip.tenth(up(y[i])));
        }
        return path.toString();
    }
}
