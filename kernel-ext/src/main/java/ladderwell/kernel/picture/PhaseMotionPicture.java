package ladderwell.kernel.picture;

import com.google.gson.JsonArray;
import com.google.gson.JsonObject;
import java.util.Base64;
import ladderwell.Density;
import ladderwell.PhaseFilm;
import ladderwell.Run;
import ladderwell.phasespace.PhaseField;
import tech.tablesaw.plotly.components.Layout;
import tech.tablesaw.plotly.traces.HeatmapTrace;

/**
 * The density animation with the Wigner function moving below it on the same scale of positions: what one sees above is the sum over momenta of
 * what one sees below. The classical particle is a ring in both.
 */
public final class PhaseMotionPicture {
    /** A field takes longer to draw than a curve. */
    private static final int MILLISECONDS_PER_FRAME = 80;

    private static final int MOMENTS = 5;
    private static final int SIDE = 148;
    private static final int GAP = 10;
    private static final int WIDTH = 780;
    private static final int HEIGHT = 306;

    private final Motion motion;
    private final PhaseFilm film;
    private final PhaseScale scale;
    private final double peak;

    private PhaseMotionPicture(Motion motion, PhaseFilm film) {
        this.motion = motion;
        this.film = film;
        scale = new PhaseScale(film.run(), film.grid());
        peak = film.peak();
    }

    /** The picture of a run. @param density frames at the run's own times */
    public static PhaseMotionPicture of(String name, Run run, Density density, PhaseFilm film) {
        return new PhaseMotionPicture(Motion.of(name, run, density, PhaseFilm.MOST_FRAMES), film);
    }

    /** What the picture shows, in a sentence. */
    public String description() {
        String density = motion.description();
        return density.substring(0, density.length() - 1) + "; below it the Wigner function moving, " + scale.range()
                + ", values ħW from " + Written.number(least(), 3) + " to " + Written.number(greatest(), 3)
                + ", with the classical orbit as a line.";
    }

    private double least() {
        double least = Double.POSITIVE_INFINITY;
        for (int k = 0; k < film.frames(); k++) {
            least = Math.min(least, film.frame(k).least());
        }
        return least;
    }

    private double greatest() {
        double greatest = Double.NEGATIVE_INFINITY;
        for (int k = 0; k < film.frames(); k++) {
            PhaseField field = film.frame(k);
            for (int i = 0; i < field.grid().nx(); i++) {
                for (double value : field.row(i)) {
                    greatest = Math.max(greatest, value);
                }
            }
        }
        return greatest;
    }

    /** The picture as HTML. */
    public String html(Easel easel) {
        Run run = motion.run();
        String verdict = "<b>" + Markup.text(motion.name()) + "</b> " + Markup.text(run.verdict());
        String below = run.errorLine() + MotionPicture.thinned(motion.stride(), "frame") + " · Wigner "
                + film.grid().nx() + " × " + film.grid().np() + " points, ħW off by ≤ "
                + Written.number(film.bound().size(), 2) + ", "
                + film.bound().kind().word();
        return easel.picture(
                "motion", motion.name(), drawing(), verdict, Easel.image(still(), description()), Markup.text(below));
    }

    JsonObject drawing() {
        JsonObject drawing = new MotionPicture(motion).drawing();
        drawing.remove("strip");
        drawing.getAsJsonObject("data").remove("orbit");
        drawing.getAsJsonObject("data").addProperty("pace", MILLISECONDS_PER_FRAME);
        drawing.add("phase", figure());
        JsonObject data = new JsonObject();
        int nx = film.grid().nx();
        int np = film.grid().np();
        data.add("x", PhasePicture.ends(scale.left(), scale.right(), nx));
        data.add("y", PhasePicture.ends(scale.low(), scale.high(), np));
        byte[] counts = new byte[film.frames() * nx * np];
        for (int k = 0; k < film.frames(); k++) {
            byte[] frame = Base64.getDecoder().decode(PhasePicture.bytes(film.frame(k), peak));
            System.arraycopy(frame, 0, counts, k * nx * np, frame.length);
        }
        data.addProperty("frames", Base64.getEncoder().encodeToString(counts));
        data.addProperty("peak", peak);
        double[] momentum = new double[film.frames()];
        for (int k = 0; k < momentum.length; k++) {
            momentum[k] = scale.classicalMomentum(film.time(k));
        }
        data.add("momentum", Packed.of(momentum));
        JsonObject words = new JsonObject();
        words.addProperty(
                "hover",
                "x %{x:.3~g}" + Markup.plot(Written.behind(scale.lengthUnit())) + "<br>p %{y:.3~g}"
                        + Markup.plot(Written.behind(scale.momentumUnit())) + "<br>ħW %{z:.2~g}<extra></extra>");
        words.addProperty("above", "ħW ≤<br>" + Written.number(greatest(), 2));
        words.addProperty("below", least() < -0.004 * peak ? "dashed:<br>ħW ≥<br>" + Written.number(least(), 2) : "");
        data.add("words", words);
        drawing.add("wigner", data);
        return drawing;
    }

    private JsonObject figure() {
        Layout layout = Layout.builder()
                .height(320)
                .width(WIDTH)
                .margin(Drawing.margin(10, 42))
                .showLegend(false)
                .hoverMode(Layout.HoverMode.CLOSEST)
                .xAxis(Drawing.axis(
                                Written.axis("position x", scale.lengthUnit()),
                                motion.position(0),
                                motion.position(motion.points() - 1),
                                7)
                        .build())
                .yAxis(Drawing.axis(Written.axis("momentum p", scale.momentumUnit()), scale.low(), scale.high(), 6)
                        .build())
                .build();
        JsonArray traces = new JsonArray();
        JsonObject map = Drawing.trace(HeatmapTrace.builder(new Object[0], new Object[0], new double[0][0])
                .build()
                .asJavascript(0));
        map.addProperty("name", "signed");
        traces.add(map);
        traces.add(PhasePicture.contour("below", "dash", -1, peak));
        double[][] orbit = scale.orbit();
        traces.add(Drawing.with(Drawing.trace(Drawing.line("classical", 1.2)), orbit[0], orbit[1]));
        traces.add(Drawing.with(
                Drawing.trace(Drawing.ring("classical")),
                new double[] {scale.classicalPosition(film.time(0))},
                new double[] {scale.classicalMomentum(film.time(0))}));
        return Drawing.figure(layout, traces);
    }

    /** The film strip of the density, and below it five moments in phase space, as a whole SVG document. */
    public String still() {
        StringBuilder svg = new StringBuilder(200_000);
        svg.append(StillInk.head(WIDTH, HEIGHT, description()));
        String strip = Filmstrip.of(motion);
        svg.append(strip, strip.indexOf("</style>") + "</style>".length(), strip.lastIndexOf("</svg>"));
        int last = film.frames() - 1;
        int moments = Math.min(MOMENTS, last + 1);
        double[][] orbit = scale.orbit();
        for (int k = 0; k < moments; k++) {
            int frame = moments == 1 ? 0 : (int) Math.round((double) k * last / (moments - 1));
            int left = 2 + k * (SIDE + GAP);
            PhasePicture.panel(svg, film.frame(frame), peak, scale, left, 126, SIDE);
            PhasePicture.path(svg, scale, orbit, left, 126, SIDE);
            if (!scale.isResting()) {
                PhasePicture.circle(svg, scale, film.time(frame), left, 126, SIDE);
            }
            svg.append("<text class=\"ink\" text-anchor=\"middle\" x=\"")
                    .append(left + SIDE / 2)
                    .append("\" y=\"287\">")
                    .append(Markup.text(motion.shortTime(frame)))
                    .append("</text>");
        }
        svg.append("<text class=\"faint\" x=\"2\" y=\"299\">")
                .append(Markup.text(scale.range() + " · teal positive, striped negative"))
                .append("</text>");
        return svg.append("</svg>").toString();
    }
}
