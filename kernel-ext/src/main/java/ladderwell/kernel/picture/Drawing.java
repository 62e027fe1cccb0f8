package ladderwell.kernel.picture;

import com.google.gson.JsonArray;
import com.google.gson.JsonNull;
import com.google.gson.JsonObject;
import tech.tablesaw.plotly.components.Axis;
import tech.tablesaw.plotly.components.Layout;
import tech.tablesaw.plotly.components.Line;
import tech.tablesaw.plotly.components.Margin;
import tech.tablesaw.plotly.components.Marker;
import tech.tablesaw.plotly.components.Symbol;
import tech.tablesaw.plotly.components.TickSettings;
import tech.tablesaw.plotly.traces.ScatterTrace;

/**
 * Traces and layouts in our look, made with Tablesaw's builders and handed over as data. The name of a trace says what it
 * shows, and the player colours it by that name; positions and values are put in as numbers of our own.
 */
final class Drawing {
    static final int LEFT = 58;
    static final int RIGHT = 66;
    private static final double[] LATER = {0};

    private Drawing() {}

    static Margin margin(int top, int bottom) {
        return Margin.builder().left(LEFT).right(RIGHT).top(top).bottom(bottom).build();
    }

    /** A quiet axis: a line, a few ticks outside, no grid, no zoom. */
    static Axis.AxisBuilder axis(String title, double from, double to, int ticks) {
        return Axis.builder()
                .title(Markup.plot(title))
                .range(from, to)
                .showGrid(false)
                .showZeroLine(false)
                .showLine(true)
                .fixedRange(true)
                .tickSettings(TickSettings.builder()
                        .placement(TickSettings.TickPlacement.OUTSIDE)
                        .length(4)
                        .nTicks(ticks)
                        .build());
    }

    /** The faint scale at the right, for energies. */
    static Axis.AxisBuilder right(double from, double to, double[] ticks) {
        return Axis.builder()
                .title("")
                .range(from, to)
                .side(Axis.Side.right)
                .overlaying(ScatterTrace.YAxis.Y)
                .showGrid(false)
                .showZeroLine(false)
                .showLine(false)
                .fixedRange(true)
                .tickSettings(TickSettings.builder()
                        .placement(TickSettings.TickPlacement.NONE)
                        .length(2)
                        .arrayTicks(ticks)
                        .build());
    }

    static TickSettings noTicks() {
        return TickSettings.builder()
                .placement(TickSettings.TickPlacement.NONE)
                .showTickLabels(false)
                .build();
    }

    static ScatterTrace.ScatterBuilder line(String name, double width) {
        return named(ScatterTrace.builder(LATER, LATER), name)
                .mode(ScatterTrace.Mode.LINE)
                .line(Line.builder().width(width).simplify(false).build());
    }

    static ScatterTrace.ScatterBuilder dashes(String name, double width) {
        return line(name, width)
                .line(Line.builder()
                        .width(width)
                        .dash(Line.Dash.DASH)
                        .simplify(false)
                        .build());
    }

    static ScatterTrace.ScatterBuilder dots(String name, double width) {
        return line(name, width)
                .line(Line.builder()
                        .width(width)
                        .dash(Line.Dash.DOT)
                        .simplify(false)
                        .build());
    }

    /** Small rings joined by a thin line. */
    static ScatterTrace.ScatterBuilder points(String name, double size) {
        return named(ScatterTrace.builder(LATER, LATER), name)
                .mode(ScatterTrace.Mode.LINE_AND_MARKERS)
                .line(Line.builder().width(1).simplify(false).build())
                .marker(Marker.builder()
                        .symbol(Symbol.CIRCLE)
                        .size(size)
                        .line(Line.builder().width(1.4).build())
                        .build());
    }

    static ScatterTrace.ScatterBuilder ring(String name) {
        return named(ScatterTrace.builder(LATER, LATER), name)
                .mode(ScatterTrace.Mode.MARKERS)
                .marker(Marker.builder()
                        .symbol(Symbol.CIRCLE)
                        .size(11)
                        .line(Line.builder().width(2).build())
                        .build());
    }

    private static ScatterTrace.ScatterBuilder named(ScatterTrace.ScatterBuilder trace, String name) {
        return trace.name(name);
    }

    /** The trace measured on the scale at the right. */
    static ScatterTrace.ScatterBuilder right(ScatterTrace.ScatterBuilder trace) {
        return trace.yAxis(ScatterTrace.YAxis.Y2);
    }

    static JsonObject trace(ScatterTrace.ScatterBuilder trace) {
        return trace(trace.build().asJavascript(0));
    }

    /** A trace as data, without the stand-ins for its numbers. */
    static JsonObject trace(String javascript) {
        JsonObject trace = JavascriptLiteral.object(javascript);
        for (String numbers : new String[] {"x", "y", "z"}) {
            trace.remove(numbers);
        }
        return trace;
    }

    /** A trace with numbers of its own; NaN is a gap. */
    static JsonObject with(JsonObject trace, double[] x, double[] y) {
        trace.add("x", numbers(x));
        trace.add("y", numbers(y));
        return trace;
    }

    static JsonArray numbers(double[] values) {
        JsonArray array = new JsonArray();
        for (double value : values) {
            if (Double.isFinite(value)) {
                array.add(Written.rounded(value, 7));
            } else {
                array.add(JsonNull.INSTANCE);
            }
        }
        return array;
    }

    static JsonObject figure(Layout layout, JsonArray traces) {
        JsonObject axes = JavascriptLiteral.object(layout.asJavascript());
        for (String name : axes.keySet()) {
            if (name.matches("[xy]axis\\d*")) {
                complete(axes.getAsJsonObject(name));
            }
        }
        JsonObject figure = new JsonObject();
        figure.add("layout", axes);
        figure.add("traces", traces);
        return figure;
    }

    /** What the builder leaves out or writes as text: it drops settings that equal its own defaults, not the library's. */
    private static void complete(JsonObject axis) {
        boolean right = axis.has("overlaying");
        boolean labels = axis.get("showticklabels").getAsBoolean();
        axis.addProperty("tickmode", axis.has("tickvals") ? "array" : "auto");
        axis.addProperty("ticks", right || !labels ? "" : "outside");
        axis.addProperty("showline", !right);
        axis.addProperty("zeroline", false);
        axis.addProperty("fixedrange", true);
        axis.remove("autorange");
        if (axis.has("nticks")) {
            axis.addProperty("nticks", axis.get("nticks").getAsInt());
        }
        JsonArray range = new JsonArray();
        axis.getAsJsonArray("range").forEach(end -> range.add(end.getAsDouble()));
        axis.add("range", range);
    }
}
