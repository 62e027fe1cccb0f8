package ladderwell.kernel.picture;

import com.google.gson.JsonArray;
import com.google.gson.JsonElement;
import com.google.gson.JsonObject;
import java.util.Optional;
import java.util.Set;
import tech.tablesaw.plotly.components.Figure;
import tech.tablesaw.plotly.components.Layout;
import tech.tablesaw.plotly.traces.Trace;

/** A Tablesaw figure that a cell made itself, shown in the page instead of in a browser tab. */
public final class FigurePicture {
    /** What the library that travels with the page can draw. */
    private static final Set<String> DRAWN = Set.of(
            "scatter",
            "bar",
            "box",
            "heatmap",
            "histogram",
            "histogram2d",
            "contour",
            "pie",
            "violin",
            "histogram2dcontour");

    private final JsonObject drawing;
    private final String title;
    private final int traces;
    private final Optional<String> obstacle;

    private FigurePicture(JsonObject drawing, String title, int traces, Optional<String> obstacle) {
        this.drawing = drawing;
        this.title = title;
        this.traces = traces;
        this.obstacle = obstacle;
    }

    /** The picture of a figure. A figure that cannot be drawn here is described and says why. */
    public static FigurePicture of(Figure figure) {
        Trace[] traces = figure.getTraces() == null ? new Trace[0] : figure.getTraces();
        try {
            Layout layout = figure.getLayout() == null ? Layout.builder().build() : figure.getLayout();
            JsonObject drawing = new JsonObject();
            JsonObject page = JavascriptLiteral.object(layout.asJavascript());
            for (String name : page.keySet()) {
                // The builder asks for evenly stepped ticks without a step, which the library takes as one tick per
                // unit.
                if (page.get(name) instanceof JsonObject axis && axis.has("tickmode") && !axis.has("dtick")) {
                    axis.addProperty("tickmode", axis.has("tickvals") ? "array" : "auto");
                }
            }
            drawing.add("layout", page);
            JsonArray all = new JsonArray();
            Optional<String> obstacle = Optional.empty();
            for (int i = 0; i < traces.length; i++) {
                JsonObject trace = JavascriptLiteral.object(traces[i].asJavascript(i));
                JsonElement type = trace.get("type");
                if (type != null && !DRAWN.contains(type.getAsString())) {
                    obstacle = Optional.of("a trace of type " + type.getAsString()
                            + " is not among those that the library in the page draws");
                }
                all.add(trace);
            }
            drawing.add("traces", all);
            String title = layout.getTitle() == null ? "" : layout.getTitle();
            return new FigurePicture(drawing, title, traces.length, obstacle);
        } catch (IllegalArgumentException e) {
            return new FigurePicture(
                    new JsonObject(),
                    "",
                    traces.length,
                    Optional.of("its description could not be read, " + e.getMessage()));
        }
    }

    /** What it is, in a sentence. */
    public String description() {
        String what = "Figure" + (title.isEmpty() ? "" : " “" + title + "”") + " with " + traces
                + (traces == 1 ? " trace" : " traces");
        return obstacle.map(reason -> what + ", not drawn: " + reason + ".").orElse(what + ".");
    }

    /** The picture as HTML. */
    public String html(Easel easel) {
        if (obstacle.isPresent()) {
            return "<p>" + Markup.text(description()) + "</p>";
        }
        String still = "<p class=\"lw-still\">" + Markup.text(description()) + " It is drawn by a script.</p>";
        return easel.picture("figure", PictureKey.of(Markup.script(drawing), 0), drawing, "", still, "");
    }
}
