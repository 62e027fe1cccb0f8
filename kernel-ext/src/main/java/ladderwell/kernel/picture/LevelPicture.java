package ladderwell.kernel.picture;

import com.google.gson.JsonArray;
import com.google.gson.JsonObject;
import ladderwell.Oscillator;
import tech.tablesaw.plotly.components.Layout;

/** Potential, levels and wave functions of an oscillator, labels at the right. */
public final class LevelPicture {
    private static final int HEIGHT = 330;
    private static final int WIDTH = 780;
    private static final int TOP = 8;
    private static final int BOTTOM = 42;

    private final LevelDiagram diagram;

    private LevelPicture(LevelDiagram diagram) {
        this.diagram = diagram;
    }

    /** The picture of these levels; of many, the lowest that can be told apart. */
    public static LevelPicture of(String name, Oscillator oscillator, long... levels) {
        return new LevelPicture(LevelDiagram.of(name, oscillator, levels));
    }

    /** What the picture shows, in a sentence. */
    public String description() {
        return diagram.description();
    }

    /** Number of levels drawn. */
    public int levels() {
        return diagram.count();
    }

    /** The picture as HTML. */
    public String html(Easel easel) {
        return easel.picture("levels", diagram.name(), drawing(), "", Easel.image(still(), diagram.description()), "");
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
                label.addProperty("text", diagram.label(k));
                label.addProperty("y", diagram.energy(k));
                labels.add(label);
            }
            hover.add(diagram.label(k) + ": " + Written.number(diagram.energy(k), 6)
                    + Markup.plot(Written.behind(diagram.energyUnit())));
        }
        traces.add(Drawing.with(Drawing.trace(Drawing.dashes("level", 1)), x, y));
        for (int k = 0; k < diagram.count(); k++) {
            traces.add(Drawing.trace(Drawing.line("wave", 1.6)));
        }
        JsonObject words = new JsonObject();
        words.add("hover", hover);
        JsonObject data = new JsonObject();
        JsonArray range = new JsonArray();
        range.add(from);
        range.add(to);
        range.add(LevelDiagram.POINTS);
        data.add("x", range);
        data.add("waves", waves());
        data.add("potential", diagram.potential().json(diagram.lengthScale(), diagram.energyScale()));
        data.add("labels", labels);
        data.add("words", words);
        JsonObject drawing = Drawing.figure(layout, traces);
        drawing.add("data", data);
        return drawing;
    }

    private JsonObject waves() {
        double[] all = new double[diagram.count() * LevelDiagram.POINTS];
        for (int k = 0; k < diagram.count(); k++) {
            System.arraycopy(diagram.lifted(k), 0, all, k * LevelDiagram.POINTS, LevelDiagram.POINTS);
        }
        return Packed.of(all);
    }

    /** The still, as a whole SVG document. */
    public String still() {
        StringBuilder svg = new StringBuilder(16000);
        svg.append(StillInk.head(WIDTH, HEIGHT, diagram.description()));
        double left = Drawing.LEFT;
        double right = WIDTH - Drawing.RIGHT;
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
            svg.append("<path class=\"line\" d=\"")
                    .append(path(x, diagram.lifted(k), 3))
                    .append("\"/>");
        }
        svg.append("</svg>");
        for (int k = 0; k < diagram.count(); k++) {
            if (diagram.labelled(k, HEIGHT - TOP - BOTTOM)) {
                svg.append("<text class=\"ochre\" x=\"")
                        .append((int) right + 6)
                        .append("\" y=\"")
                        .append(Filmstrip.tenth(TOP + up(diagram.energy(k)) + 4))
                        .append("\">")
                        .append(diagram.label(k))
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
                .append("</text></svg>");
        return svg.toString();
    }

    private double up(double energy) {
        return (HEIGHT - TOP - BOTTOM) * (diagram.top() - energy) / (diagram.top() - diagram.bottom());
    }

    private String path(double[] x, double[] y, int stride) {
        double across = WIDTH - Drawing.LEFT - Drawing.RIGHT;
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
