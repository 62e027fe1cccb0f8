package ladderwell.kernel.picture;

import com.google.gson.JsonArray;
import com.google.gson.JsonObject;
import java.util.ArrayList;
import java.util.List;
import ladderwell.Oscillator;

/**
 * The potential as a line to be drawn, in scaled units: points along the curve, with both ends of every jump. Heights above
 * {@code top} are cut there, walls included.
 */
record Potential(double[] x, double[] height) {
    /** Points on which a smooth potential is drawn. */
    private static final int POINTS = 161;

    static Potential of(Oscillator oscillator, double from, double to, double top) {
        List<double[]> line = new ArrayList<>();
        double[] heights = new double[POINTS];
        double least = top;
        for (int i = 0; i < POINTS; i++) {
            heights[i] = Math.min(oscillator.potential(from + (to - from) * i / (POINTS - 1)), top);
            least = Math.min(least, heights[i]);
        }
        double before = 0;
        for (int i = 0; i < POINTS; i++) {
            double x = from + (to - from) * i / (POINTS - 1);
            double height = heights[i];
            if (i > 0 && Math.abs(height - before) > (top - least) / 8) {
                jump(oscillator, from + (to - from) * (i - 1) / (POINTS - 1), x, top, line);
            }
            line.add(new double[] {x, height});
            before = height;
        }
        return new Potential(
                line.stream().mapToDouble(p -> p[0]).toArray(),
                line.stream().mapToDouble(p -> p[1]).toArray());
    }

    /** Halves the interval until a jump is as steep as a wall; a potential that is only steep gets a few more points. */
    private static void jump(Oscillator oscillator, double left, double right, double top, List<double[]> line) {
        double a = left;
        double b = right;
        double low = Math.min(oscillator.potential(a), top);
        double high = Math.min(oscillator.potential(b), top);
        for (int i = 0; i < 50; i++) {
            double middle = (a + b) / 2;
            double height = Math.min(oscillator.potential(middle), top);
            if (Math.abs(height - low) < Math.abs(height - high)) {
                a = middle;
                low = height;
            } else {
                b = middle;
                high = height;
            }
        }
        line.add(new double[] {a, low});
        line.add(new double[] {b, high});
    }

    JsonObject json(double length, double energy) {
        JsonArray xs = new JsonArray();
        JsonArray heights = new JsonArray();
        for (int i = 0; i < x.length; i++) {
            xs.add(Written.rounded(x[i] * length, 7));
            heights.add(Written.rounded(height[i] * energy, 5));
        }
        JsonObject json = new JsonObject();
        json.add("x", xs);
        json.add("v", heights);
        return json;
    }
}
