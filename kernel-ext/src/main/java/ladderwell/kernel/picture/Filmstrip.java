package ladderwell.kernel.picture;

/** Seven moments of a motion side by side, as SVG: what stands where nothing may move. */
final class Filmstrip {
    private static final int MOMENTS = 7;
    private static final int WIDTH = 780;
    private static final int PANEL = 104;
    private static final int GAP = 8;
    private static final int LEFT = 2;
    private static final int TOP = 6;
    private static final int BOTTOM = 84;
    private static final int HEIGHT = 120;

    private Filmstrip() {}

    static String of(Motion motion) {
        int last = motion.frames() - 1;
        int moments = Math.min(MOMENTS, last + 1);
        double[][] curves = new double[moments][];
        double peak = 0;
        for (int k = 0; k < moments; k++) {
            curves[k] = curve(motion, frame(k, moments, last));
            for (double value : curves[k]) {
                peak = Math.max(peak, value);
            }
        }
        StringBuilder svg = new StringBuilder(12000);
        svg.append(StillInk.head(WIDTH, HEIGHT, motion.description()));
        String potential = potential(motion);
        for (int k = 0; k < moments; k++) {
            int left = LEFT + k * (PANEL + GAP);
            panel(svg, motion, frame(k, moments, last), left, curves[k], peak, potential);
        }
        String unit = motion.periods(0).isPresent() ? "time in periods" : "time";
        svg.append("<text class=\"faint\" x=\"")
                .append(LEFT)
                .append("\" y=\"117\">")
                .append(unit)
                .append(" · position from ")
                .append(Markup.text(Written.number(motion.position(0), 3)))
                .append(" to ")
                .append(Markup.text(Written.number(motion.position(motion.points() - 1), 3)))
                .append(Markup.text(Written.behind(motion.lengthUnit())))
                .append(" · ring: classical motion</text></svg>");
        return svg.toString();
    }

    private static int frame(int k, int moments, int last) {
        return moments == 1 ? 0 : (int) Math.round((double) k * last / (moments - 1));
    }

    private static void panel(
            StringBuilder svg, Motion motion, int frame, int left, double[] curve, double peak, String potential) {
        svg.append("<svg x=\"")
                .append(left)
                .append("\" y=\"0\" width=\"")
                .append(PANEL)
                .append("\" height=\"100\">");
        StringBuilder line = new StringBuilder();
        for (int i = 0; i < curve.length; i++) {
            line.append(i == 0 ? "M" : "L")
                    .append(i)
                    .append(' ')
                    .append(tenth(BOTTOM - 0.94 * (BOTTOM - TOP) * curve[i] / peak));
        }
        int right = curve.length - 1;
        svg.append("<path class=\"fill\" d=\"")
                .append(line)
                .append("L")
                .append(right)
                .append(' ')
                .append(BOTTOM)
                .append("L0 ")
                .append(BOTTOM)
                .append("z\"/>");
        svg.append(potential);
        svg.append("<path class=\"line\" d=\"").append(line).append("\"/>");
        double x = across(motion, motion.classicalPosition(frame));
        double y = up(motion, motion.classicalHeight(frame));
        svg.append("<circle class=\"ring\" cx=\"")
                .append(tenth(x))
                .append("\" cy=\"")
                .append(tenth(y))
                .append("\" r=\"3.2\"/>");
        svg.append("<text class=\"ink\" text-anchor=\"middle\" x=\"")
                .append(PANEL / 2)
                .append("\" y=\"98\">")
                .append(Markup.text(motion.shortTime(frame)))
                .append("</text></svg>");
    }

    private static String potential(Motion motion) {
        Potential potential = motion.potential();
        StringBuilder path = new StringBuilder("<path class=\"hair\" d=\"");
        String before = "";
        for (int i = 0; i < potential.x().length; i++) {
            String point = tenth(across(motion, potential.x()[i] * motion.lengthScale()))
                    + ' '
                    + tenth(up(motion, potential.height()[i] * motion.energyScale()));
            if (!point.equals(before)) {
                path.append(i == 0 ? "M" : "L").append(point);
            }
            before = point;
        }
        double[] stretches = motion.stretchesAtMeanEnergy();
        String height = tenth(up(motion, motion.meanEnergy()));
        path.append("\"/><path class=\"dash\" d=\"");
        for (int i = 0; i + 1 < stretches.length; i += 3) {
            path.append("M")
                    .append(tenth(across(motion, stretches[i])))
                    .append(' ')
                    .append(height)
                    .append("H")
                    .append(tenth(across(motion, stretches[i + 1])));
        }
        return path.append("\"/>").toString();
    }

    private static double across(Motion motion, double x) {
        double from = motion.position(0);
        double to = motion.position(motion.points() - 1);
        return (x - from) / (to - from) * (PANEL - 1);
    }

    private static double up(Motion motion, double energy) {
        return BOTTOM - (BOTTOM - TOP) * (energy - motion.floor()) / (motion.top() - motion.floor());
    }

    /** The density averaged over each pixel of a panel. */
    private static double[] curve(Motion motion, int frame) {
        double[] sum = new double[PANEL];
        int[] count = new int[PANEL];
        int points = motion.points();
        for (int i = 0; i < points; i++) {
            int pixel = (int) Math.round((double) i * (PANEL - 1) / Math.max(1, points - 1));
            sum[pixel] += motion.density(frame, i);
            count[pixel]++;
        }
        for (int pixel = 0; pixel < PANEL; pixel++) {
            sum[pixel] = count[pixel] > 0 ? sum[pixel] / count[pixel] : pixel > 0 ? sum[pixel - 1] : 0;
        }
        return sum;
    }

    static String tenth(double pixels) {
        double rounded = Math.round(Math.max(-2000, Math.min(2000, pixels)) * 10) / 10.0;
        return rounded == Math.rint(rounded) ? Long.toString((long) rounded) : Double.toString(rounded);
    }
}
