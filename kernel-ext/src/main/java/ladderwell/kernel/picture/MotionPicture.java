package ladderwell.kernel.picture;

import com.google.gson.JsonArray;
import com.google.gson.JsonObject;
import java.util.Arrays;
import ladderwell.Density;
import ladderwell.Run;
import tech.tablesaw.plotly.components.Layout;
import tech.tablesaw.plotly.traces.HeatmapTrace;
import tech.tablesaw.plotly.traces.ScatterTrace;

/**
 * The density animation: the density now over the potential, with the classical particle as a ring; below it the whole run
 * as a space-time strip, with a cursor at now.
 */
public final class MotionPicture {
    /** Strip of the axis below zero where the mean position and the turning points are marked, as a part of the scale. */
    private static final double RAIL = 0.1;

    private static final double HEADROOM = 1.06;
    private static final int MILLISECONDS_PER_FRAME = 45;

    private final Motion motion;

    MotionPicture(Motion motion) {
        this.motion = motion;
    }

    /** The picture of a run. @param density frames at the run's own times */
    public static MotionPicture of(String name, Run run, Density density) {
        return new MotionPicture(Motion.of(name, run, density));
    }

    /** What the picture shows, in a sentence. */
    public String description() {
        return motion.description();
    }

    /** The still, as a whole SVG document. */
    public String still() {
        return Filmstrip.of(motion);
    }

    /** The picture as HTML. */
    public String html(Easel easel) {
        Run run = motion.run();
        String verdict = "<b>" + Markup.text(motion.name()) + "</b> " + Markup.text(run.verdict());
        String thinned = thinned(motion.stride(), "frame") + thinned(motion.pointStride(), "position");
        return easel.picture(
                "motion",
                motion.name(),
                drawing(),
                verdict,
                Easel.image(still(), motion.description()),
                Markup.text(run.errorLine() + thinned));
    }

    static String thinned(int stride, String what) {
        return stride == 1 ? "" : " · every " + ordinal(stride) + " " + what + " is shown";
    }

    private static String ordinal(int n) {
        String ending = n % 100 >= 11 && n % 100 <= 13
                ? "th"
                : switch (n % 10) {
                    case 1 -> "st";
                    case 2 -> "nd";
                    case 3 -> "rd";
                    default -> "th";
                };
        return n + ending;
    }

    JsonObject drawing() {
        int frames = motion.frames();
        double peak = motion.peak();
        double[] classicalLine = motion.classicalLine();
        JsonObject data = new JsonObject();
        data.add("x", triple(motion.position(0), motion.position(motion.points() - 1), motion.points()));
        data.add("frames", frames(peak));
        double[] ring = new double[frames];
        double[] ringHeight = new double[frames];
        double[] mean = new double[frames];
        for (int j = 0; j < frames; j++) {
            ring[j] = motion.classicalPosition(j);
            ringHeight[j] = motion.classicalHeight(j);
            mean[j] = motion.meanPosition(j);
        }
        data.add("ring", Packed.of(ring));
        data.add("ringHeight", Packed.of(ringHeight));
        data.add("mean", Packed.of(mean));
        if (classicalLine.length > 0) {
            data.add("orbit", Packed.of(classicalLine));
        }
        data.add("potential", motion.potential().json(motion.lengthScale(), motion.energyScale()));
        data.addProperty("energy", motion.meanEnergy());
        data.addProperty("rail", RAIL * HEADROOM * peak);
        data.addProperty("pace", MILLISECONDS_PER_FRAME);
        data.addProperty("start", frames / 8);
        times(data, frames - 1);
        data.add("words", words());
        JsonObject drawing = new JsonObject();
        drawing.add("data", data);
        drawing.add("now", now(peak));
        drawing.add("strip", strip(classicalLine.length > 0));
        return drawing;
    }

    private JsonObject frames(double peak) {
        Packed packed = new Packed(0, peak, motion.frames() * motion.points());
        for (int j = 0; j < motion.frames(); j++) {
            for (int i = 0; i < motion.points(); i++) {
                packed.add(motion.density(j, i));
            }
        }
        return packed.json();
    }

    private void times(JsonObject data, int last) {
        double end = motion.labTime(last);
        double axisEnd = motion.periods(last).orElse(end);
        JsonArray range = new JsonArray();
        range.add(0);
        range.add(axisEnd);
        data.add("time", range);
        motion.periods(last).ifPresent(periods -> {
            data.addProperty("periods", periods);
            data.addProperty("periodDigits", Math.max(Written.decimals(periods), periods < 100 ? 2 : 1));
        });
        JsonObject clock = new JsonObject();
        clock.addProperty("end", end);
        clock.addProperty("digits", Written.decimals(end));
        clock.addProperty("unit", Written.behind(motion.timeUnit()));
        data.add("clock", clock);
    }

    private JsonObject words() {
        String at = "%{x:.3~g}" + Markup.plot(motion.lengthUnit().isEmpty() ? "" : " " + motion.lengthUnit());
        String per = Markup.plot(motion.lengthUnit().isEmpty() ? "" : " /" + motion.lengthUnit());
        String when =
                motion.periods(0).isPresent() ? " periods" : motion.timeUnit().isEmpty() ? "" : " " + motion.timeUnit();
        JsonObject words = new JsonObject();
        words.addProperty("hover", at + ": %{y:.3~g}" + per + "<extra></extra>");
        words.addProperty(
                "stripHover", at + ", %{y:.3~g}" + Markup.plot(when) + ": %{z:.3~g}" + per + "<extra></extra>");
        words.addProperty("energy", "⟨E⟩<br>" + Written.number(motion.meanEnergy(), 3));
        words.addProperty("potential", motion.energyUnit().isEmpty() ? "V" : "V / " + Markup.plot(motion.energyUnit()));
        return words;
    }

    private JsonObject now(double peak) {
        double highest = HEADROOM * peak;
        Layout layout = Layout.builder()
                .height(236)
                .width(780)
                .margin(Drawing.margin(8, 6))
                .showLegend(false)
                .hoverMode(Layout.HoverMode.CLOSEST)
                .xAxis(Drawing.axis("", motion.position(0), motion.position(motion.points() - 1), 7)
                        .tickSettings(Drawing.noTicks())
                        .build())
                .yAxis(Drawing.axis(
                                Written.axis("density", Written.inverse(motion.lengthUnit())),
                                -RAIL * highest,
                                highest,
                                4)
                        .build())
                .yAxis2(Drawing.right(
                                motion.floor() - RAIL * (motion.top() - motion.floor()),
                                motion.top(),
                                new double[] {Written.rounded(motion.floor(), 3)})
                        .build())
                .build();
        double[] turn = motion.turningPoints();
        double rail = RAIL * highest;
        JsonArray traces = new JsonArray();
        traces.add(Drawing.trace(Drawing.line("density", 2).fill(ScatterTrace.Fill.TO_ZERO_Y)));
        traces.add(Drawing.trace(Drawing.right(Drawing.line("potential", 1))));
        double[] stretches = motion.stretchesAtMeanEnergy();
        double[] heights = new double[stretches.length];
        Arrays.setAll(heights, i -> Double.isNaN(stretches[i]) ? Double.NaN : motion.meanEnergy());
        traces.add(Drawing.with(Drawing.trace(Drawing.right(Drawing.dashes("energy", 1.2))), stretches, heights));
        JsonObject turning = Drawing.with(
                Drawing.trace(Drawing.line("turning", 1.3)),
                new double[] {turn[0], turn[0], Double.NaN, turn[1], turn[1]},
                new double[] {-rail, 0, Double.NaN, -rail, 0});
        traces.add(turning);
        traces.add(Drawing.with(
                Drawing.trace(Drawing.line("mean", 2.6)),
                new double[] {motion.meanPosition(0), motion.meanPosition(0)},
                new double[] {-0.92 * rail, -0.08 * rail}));
        traces.add(Drawing.with(
                Drawing.trace(Drawing.right(Drawing.ring("classical"))),
                new double[] {motion.classicalPosition(0)},
                new double[] {motion.classicalHeight(0)}));
        return Drawing.figure(layout, traces);
    }

    private JsonObject strip(boolean withLine) {
        double end = motion.periods(motion.frames() - 1).orElse(motion.labTime(motion.frames() - 1));
        String time = motion.periods(0).isPresent() ? "time / periods" : Written.axis("time", motion.timeUnit());
        Layout layout = Layout.builder()
                .height(220)
                .width(780)
                .margin(Drawing.margin(10, 42))
                .showLegend(false)
                .hoverMode(Layout.HoverMode.CLOSEST)
                .xAxis(Drawing.axis(
                                Written.axis("position x", motion.lengthUnit()),
                                motion.position(0),
                                motion.position(motion.points() - 1),
                                7)
                        .build())
                .yAxis(Drawing.axis(time, end, 0, 5).build())
                .build();
        JsonArray traces = new JsonArray();
        traces.add(Drawing.trace(HeatmapTrace.builder(new Object[0], new Object[0], new double[0][0])
                .build()
                .asJavascript(0)));
        if (withLine) {
            // A packet of a few pixels would vanish under a full line.
            boolean narrow = 1 / motion.peak() < 0.01 * (motion.position(motion.points() - 1) - motion.position(0));
            traces.add(Drawing.trace(narrow ? Drawing.dots("classical", 1.3) : Drawing.line("classical", 1.3)));
        }
        return Drawing.figure(layout, traces);
    }

    private static JsonArray triple(double from, double to, int points) {
        JsonArray triple = new JsonArray();
        triple.add(from);
        triple.add(to);
        triple.add(points);
        return triple;
    }
}
