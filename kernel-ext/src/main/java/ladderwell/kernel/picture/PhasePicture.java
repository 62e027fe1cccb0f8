package ladderwell.kernel.picture;

import com.google.gson.JsonArray;
import com.google.gson.JsonObject;
import java.util.Base64;
import ladderwell.PhaseSpace;
import ladderwell.phasespace.PhaseField;
import ladderwell.phasespace.PhaseGrid;
import tech.tablesaw.plotly.components.Layout;
import tech.tablesaw.plotly.traces.HeatmapTrace;
import tech.tablesaw.plotly.traces.ScatterTrace;

/**
 * A Wigner or Husimi function at one instant: the field with its contours, dashed where it is negative, the classical orbit over it, and its two
 * marginals beside it.
 */
public final class PhasePicture {
    private static final int SIDE = 400;
    private static final int MARGINAL = 84;
    private static final int GAP = 8;
    private static final int TOP = 8;
    private static final int BOTTOM = 44;
    private static final int WIDTH = 780;

    /** Contours at these parts of the largest value. */
    private static final double FIRST_CONTOUR = 0.1;

    private static final double CONTOUR_STEP = 0.3;

    private final String name;
    private final PhaseSpace space;
    private final PhaseField field;
    private final PhaseScale scale;
    private final double peak;

    private PhasePicture(String name, PhaseSpace space, boolean husimi) {
        this.name = name;
        this.space = space;
        field = husimi ? space.husimi() : space.wigner();
        scale = new PhaseScale(space.run(), space.grid());
        peak = field.peak();
    }

    /** The picture of a state in phase space. @param husimi whether of its Husimi function */
    public static PhasePicture of(String name, PhaseSpace space, boolean husimi) {
        return new PhasePicture(name, space, husimi);
    }

    private boolean isWigner() {
        return field.kind() == PhaseField.Kind.WIGNER;
    }

    private String what() {
        return isWigner() ? "Wigner function" : "Husimi function";
    }

    private String letter() {
        return isWigner() ? "W" : "Q";
    }

    /** The instant in words. */
    public String instant() {
        String lab = Written.number(space.labTime().value(), 5)
                + Written.behind(space.labTime().unit().symbol());
        return PhaseScale.instant(space.periods(), lab);
    }

    /** What is found, in a line. */
    public String verdict() {
        return isWigner()
                ? space.verdict()
                : "ħQ up to " + Written.number(peak, 4) + ", mean over coherent states of width "
                        + Written.number(space.width() * scale.lengthScale(), 3)
                        + Written.behind(scale.lengthUnit());
    }

    /** Size, method and error, in a line. */
    public String errorLine() {
        return space.errorLine();
    }

    /** What the picture shows, in a sentence. */
    public String description() {
        String classical = scale.isResting()
                ? "the line is the classical orbit at the mean energy"
                : "the line is the classical orbit, the ring the classical particle at position "
                        + Written.number(scale.classicalPosition(space.time()), 3) + " and momentum "
                        + Written.number(scale.classicalMomentum(space.time()), 3);
        return what() + " of " + name + " at " + instant() + ": " + scale.range() + ", values ħ" + letter() + " from "
                + Written.number(field.least(), 3) + " to " + Written.number(greatest(), 3) + "; " + classical + ".";
    }

    private double greatest() {
        double greatest = Double.NEGATIVE_INFINITY;
        for (int i = 0; i < field.grid().nx(); i++) {
            for (double value : field.row(i)) {
                greatest = Math.max(greatest, value);
            }
        }
        return greatest;
    }

    /** The picture as HTML. */
    public String html(Easel easel) {
        String verdict = "<b>" + Markup.text(name) + "</b> at " + Markup.text(instant() + ": " + verdict());
        return easel.picture(
                "phase", name, drawing(), verdict, Easel.image(still(), description()), Markup.text(errorLine()));
    }

    /** A signed field as bytes, one for a point: 128 is zero, momenta row by row. */
    static String bytes(PhaseField field, double peak) {
        PhaseGrid grid = field.grid();
        byte[] counts = new byte[grid.nx() * grid.np()];
        for (int i = 0; i < grid.nx(); i++) {
            double[] row = field.row(i);
            for (int j = 0; j < grid.np(); j++) {
                counts[j * grid.nx() + i] = (byte) (128 + Math.round(127 * row[j] / peak));
            }
        }
        return Base64.getEncoder().encodeToString(counts);
    }

    static JsonArray ends(double from, double to, int points) {
        JsonArray ends = new JsonArray();
        ends.add(from);
        ends.add(to);
        ends.add(points);
        return ends;
    }

    JsonObject drawing() {
        PhaseGrid grid = field.grid();
        Layout layout = Layout.builder()
                .height(TOP + MARGINAL + GAP + SIDE + BOTTOM)
                .width(WIDTH)
                .margin(Drawing.margin(TOP, BOTTOM))
                .showLegend(false)
                .hoverMode(Layout.HoverMode.CLOSEST)
                .xAxis(Drawing.axis(Written.axis("position x", scale.lengthUnit()), scale.left(), scale.right(), 6)
                        .build())
                .yAxis(Drawing.axis(Written.axis("momentum p", scale.momentumUnit()), scale.low(), scale.high(), 6)
                        .build())
                .build();
        JsonArray traces = new JsonArray();
        traces.add(named(
                Drawing.trace(HeatmapTrace.builder(new Object[0], new Object[0], new double[0][0])
                        .build()
                        .asJavascript(0)),
                isWigner() ? "signed" : "field"));
        traces.add(contour("above", "solid", 1, peak));
        traces.add(contour("below", "dash", -1, peak));
        double[][] orbit = scale.orbit();
        traces.add(Drawing.with(Drawing.trace(Drawing.line("classical", 1.3)), orbit[0], orbit[1]));
        traces.add(Drawing.with(
                Drawing.trace(Drawing.ring("classical")),
                ring(scale.classicalPosition(space.time())),
                ring(scale.classicalMomentum(space.time()))));
        double[] overMomenta = field.overMomenta();
        double[] overPositions = field.overPositions();
        double highest = 0;
        for (double value : overMomenta) {
            highest = Math.max(highest, value);
        }
        double widest = 0;
        for (double value : overPositions) {
            widest = Math.max(widest, value);
        }
        traces.add(beside(Drawing.trace(Drawing.line("density", 1.6).fill(ScatterTrace.Fill.TO_ZERO_Y)), "x", "y3"));
        traces.add(beside(Drawing.trace(Drawing.line("density", 1.6).fill(ScatterTrace.Fill.TO_ZERO_X)), "x2", "y"));
        JsonObject drawing = Drawing.figure(layout, traces);
        axes(drawing.getAsJsonObject("layout"), highest, widest);
        JsonObject data = new JsonObject();
        data.add("x", ends(scale.left(), scale.right(), grid.nx()));
        data.add("y", ends(scale.low(), scale.high(), grid.np()));
        data.addProperty("field", bytes(field, peak));
        data.addProperty("peak", peak);
        data.add("overMomenta", Packed.of(overMomenta));
        data.add("overPositions", Packed.of(overPositions));
        data.addProperty("side", SIDE);
        data.addProperty("marginal", MARGINAL);
        data.addProperty("gap", GAP);
        JsonObject words = new JsonObject();
        words.addProperty(
                "hover",
                "x %{x:.3~g}" + Markup.plot(Written.behind(scale.lengthUnit())) + "<br>p %{y:.3~g}"
                        + Markup.plot(Written.behind(scale.momentumUnit())) + "<br>ħ" + letter()
                        + " %{z:.2~g}<extra></extra>");
        words.addProperty("above", "ħ" + letter() + " ≤ " + Written.number(greatest(), 2));
        words.addProperty(
                "below",
                field.least() < -0.004 * peak
                        ? "dashed:<br>ħ" + letter() + " ≥ " + Written.number(field.least(), 2)
                        : "");
        words.addProperty("classical", "○ classical");
        data.add("words", words);
        drawing.add("data", data);
        return drawing;
    }

    private double[] ring(double at) {
        return scale.isResting() ? new double[0] : new double[] {at};
    }

    private static JsonObject named(JsonObject trace, String name) {
        trace.addProperty("name", name);
        return trace;
    }

    private static JsonObject beside(JsonObject trace, String x, String y) {
        trace.addProperty("xaxis", x);
        trace.addProperty("yaxis", y);
        return trace;
    }

    /** Contours on one side of zero at a tenth, four and seven tenths of the peak. */
    static JsonObject contour(String name, String dash, int sign, double peak) {
        JsonObject line = new JsonObject();
        line.addProperty("width", 0.8);
        line.addProperty("dash", dash);
        JsonObject contours = new JsonObject();
        double near = sign * FIRST_CONTOUR * peak;
        double far = sign * (FIRST_CONTOUR + 2 * CONTOUR_STEP) * peak;
        contours.addProperty("start", Math.min(near, far));
        contours.addProperty("end", Math.max(near, far));
        contours.addProperty("size", CONTOUR_STEP * peak);
        contours.addProperty("coloring", "none");
        JsonObject trace = new JsonObject();
        trace.addProperty("type", "contour");
        trace.addProperty("name", name);
        trace.addProperty("autocontour", false);
        trace.addProperty("showscale", false);
        trace.add("contours", contours);
        trace.add("line", line);
        return trace;
    }

    private static void axes(JsonObject layout, double highest, double widest) {
        JsonObject right = layout.getAsJsonObject("xaxis").deepCopy();
        JsonObject above = layout.getAsJsonObject("yaxis").deepCopy();
        for (JsonObject axis : new JsonObject[] {right, above}) {
            axis.addProperty("title", "");
            axis.addProperty("showticklabels", false);
            axis.addProperty("ticks", "");
            axis.addProperty("showline", false);
        }
        right.add("range", range(0, 1.04 * widest));
        right.addProperty("anchor", "y");
        above.add("range", range(0, 1.04 * highest));
        above.addProperty("anchor", "x");
        layout.add("xaxis2", right);
        layout.add("yaxis3", above);
    }

    private static JsonArray range(double from, double to) {
        JsonArray range = new JsonArray();
        range.add(from);
        range.add(to);
        return range;
    }

    /** The still, as a whole SVG document. */
    public String still() {
        int height = TOP + SIDE + BOTTOM;
        StringBuilder svg = new StringBuilder(60_000);
        svg.append(StillInk.head(WIDTH, height, description()));
        panel(svg, field, peak, scale, Drawing.LEFT, TOP, SIDE);
        double[][] orbit = scale.orbit();
        path(svg, scale, orbit, Drawing.LEFT, TOP, SIDE);
        if (!scale.isResting()) {
            circle(svg, scale, space.time(), Drawing.LEFT, TOP, SIDE);
        }
        double x = Drawing.LEFT + SIDE + 24;
        String[] lines = {
            what() + " at " + instant(),
            "teal: up to ħ" + letter() + " = " + Written.number(greatest(), 3),
            field.least() < -0.004 * peak
                    ? "striped: down to ħ" + letter() + " = " + Written.number(field.least(), 3)
                    : "",
            "line: classical orbit" + (scale.isResting() ? " at the mean energy" : ", ring: classical particle")
        };
        int y = TOP + 14;
        for (String line : lines) {
            if (!line.isEmpty()) {
                svg.append("<text class=\"ink\" x=\"")
                        .append((int) x)
                        .append("\" y=\"")
                        .append(y)
                        .append("\">")
                        .append(Markup.text(line))
                        .append("</text>");
                y += 18;
            }
        }
        svg.append("<text class=\"faint\" x=\"")
                .append(Drawing.LEFT)
                .append("\" y=\"")
                .append(height - 22)
                .append("\">")
                .append(Markup.text(scale.range()))
                .append("</text>");
        return svg.append("</svg>").toString();
    }

    /** The field as an image in a thin frame. */
    static void panel(StringBuilder svg, PhaseField field, double peak, PhaseScale scale, int left, int top, int side) {
        svg.append("<image preserveAspectRatio=\"none\" x=\"")
                .append(left)
                .append("\" y=\"")
                .append(top)
                .append("\" width=\"")
                .append(side)
                .append("\" height=\"")
                .append(side)
                .append("\" href=\"")
                .append(Raster.source(side, side, (u, v) -> PhaseScale.between(field, peak, u, v)))
                .append("\"/><path class=\"hair\" d=\"M")
                .append(left)
                .append(' ')
                .append(top)
                .append("v")
                .append(side)
                .append("h")
                .append(side)
                .append("\"/>");
    }

    private static double across(PhaseScale scale, double x, int left, int side) {
        return left + (x - scale.left()) / (scale.right() - scale.left()) * side;
    }

    private static double down(PhaseScale scale, double p, int top, int side) {
        return top + side - (p - scale.low()) / (scale.high() - scale.low()) * side;
    }

    /** The classical orbit, as far as it lies in the panel. */
    static void path(StringBuilder svg, PhaseScale scale, double[][] orbit, int left, int top, int side) {
        svg.append("<path class=\"ring\" style=\"stroke-width:1\" d=\"");
        boolean on = false;
        for (int i = 0; i < orbit[0].length; i++) {
            double x = across(scale, orbit[0][i], left, side);
            double y = down(scale, orbit[1][i], top, side);
            boolean inside = x >= left && x <= left + side && y >= top && y <= top + side;
            if (inside) {
                svg.append(on ? "L" : "M")
                        .append(Filmstrip.tenth(x))
                        .append(' ')
                        .append(Filmstrip.tenth(y));
            }
            on = inside;
        }
        svg.append("\"/>");
    }

    static void circle(StringBuilder svg, PhaseScale scale, double time, int left, int top, int side) {
        svg.append("<circle class=\"ring\" r=\"4\" cx=\"")
                .append(Filmstrip.tenth(across(scale, scale.classicalPosition(time), left, side)))
                .append("\" cy=\"")
                .append(Filmstrip.tenth(down(scale, scale.classicalMomentum(time), top, side)))
                .append("\"/>");
    }
}
