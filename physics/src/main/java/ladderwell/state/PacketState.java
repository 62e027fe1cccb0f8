package ladderwell.state;

import java.util.Locale;
import ladderwell.evidence.PhysicsException;
import ladderwell.level.Levels;

/** Expands a Gaussian packet in the levels of a box or a finite well and proves how far the result is from it. */
final class PacketState {
    /** Wells with at most this many levels keep them all when a packet leaks into the walls. */
    private static final long ALL_KEPT = 2000;

    private final Levels levels;
    private final GaussianPacket packet;
    private final double tolerance;

    PacketState(Levels levels, GaussianPacket packet, double tolerance) {
        this.levels = levels;
        this.packet = packet;
        this.tolerance = tolerance;
    }

    /** All of it must lie between the walls; the tails are folded back (see {@link PacketOverlaps}). */
    Amplitudes inBox() {
        double beyond = packet.weightBeyond();
        double distance =
                beyond > tolerance * tolerance ? Math.sqrt(beyond) : Math.hypot(Math.sqrt(beyond), packet.foldedNorm());
        if (distance > tolerance / 2) {
            throw new IllegalArgumentException(String.format(
                    Locale.ROOT,
                    "a packet of spread %s at %s has weight %.2g beyond the walls of the box, too much for tolerance %s: make it narrower,"
                            + " move it inwards or loosen the tolerance",
                    packet.width(),
                    packet.position(),
                    beyond,
                    tolerance));
        }
        MomentumWindow window = new MomentumWindow(packet, Long.MAX_VALUE, Math.PI, tolerance * tolerance / 32);
        PacketOverlaps overlaps = new PacketOverlaps(levels, packet, window.first(), window.size());
        double[] moments = window.moments();
        double tail = Math.sqrt(moments[0]);
        double error = (distance + tail + overlaps.rounding) * (1 + 1e-9);
        return new Amplitudes(
                new long[] {window.first()},
                new double[][] {overlaps.re},
                new double[][] {overlaps.im},
                error,
                moments,
                window.sum(),
                (distance + tail) * (distance + tail) * (1 + 1e-9));
    }

    /**
     * A packet inside the walls has its overlaps in closed form, wrong by at most 2√2 ∫|g| beyond the walls each; one that leaks needs
     * quadrature.
     */
    Amplitudes inWell() {
        double each = 2 * Math.sqrt(2) * packet.integralBeyond();
        double leak = Math.sqrt(levels.count()) * each * (1 + 1e-9);
        return leak <= tolerance / 8 ? confined(each, leak) : leaking(each, leak);
    }

    private Amplitudes confined(double each, double leak) {
        MomentumWindow window = window();
        PacketOverlaps overlaps = new PacketOverlaps(levels, packet, window.first(), window.size());
        double outside = aboveRim() + Math.sqrt(window.moments()[0]) + leak;
        return kept(window, overlaps.re, overlaps.im, leak + overlaps.rounding, outside, each);
    }

    /**
     * Norm of the packet's part above the rim, from above. A continuum wave of outside wave number q, k = √(q² + k₀²), has at most its
     * outside amplitude inside, so that for k₀ &gt; |p| the packet's transform gives (G²/π) ∫ e^{−2σ²(k−|p|)²} dq, and with k − k₀ ≥ q²/(2k₀ + q) an
     * elementary bound. What lies beyond the walls adds its own transform and its own norm.
     */
    double aboveRim() {
        double rim = Math.sqrt(2 * levels.threshold());
        double distance = rim - Math.abs(packet.momentum()) - 4e-16 * (rim + Math.abs(packet.momentum()));
        if (distance <= 0) {
            return 1;
        }
        double sigma = packet.width();
        double reach = packet.reach();
        double integral = Math.sqrt(Math.PI * rim / distance) / (2 * sigma) + 1 / (2 * sigma * sigma * distance);
        double inside = reach * reach / Math.PI * Math.exp(-2 * sigma * sigma * distance * distance) * integral;
        double beyond = packet.weightBeyond();
        double length = packet.integralBeyond();
        // Transform of what lies beyond: below q by its largest value, above by its norm times dq/dk = k/q; best of two
        // q.
        double plain = 2 * length * length / Math.PI;
        double outside = Math.min(plain + Math.sqrt(1 + rim * rim) * beyond, plain * rim + Math.sqrt(2) * beyond);
        return (Math.sqrt(inside) + Math.sqrt(outside) + Math.sqrt(beyond)) * (1 + 1e-9);
    }

    private Amplitudes leaking(double each, double leak) {
        long count = levels.count();
        boolean all = count <= ALL_KEPT;
        MomentumWindow window = all ? MomentumWindow.all(count) : window();
        LeakingOverlaps overlaps = new LeakingOverlaps(levels, packet, window.first(), window.size());
        double outside = aboveRim() + (all ? 0 : Math.sqrt(window.moments()[0]) + leak);
        return kept(window, overlaps.re, overlaps.im, overlaps.error, outside, each);
    }

    private MomentumWindow window() {
        return new MomentumWindow(packet, levels.count(), 0, tolerance * tolerance / 32);
    }

    /**
     * @param inside norm of the error of the kept amplitudes
     * @param outside proved bound of the norm of all that is not kept
     * @param each bound of what the closed form errs by in one level
     */
    private Amplitudes kept(
            MomentumWindow window, double[] re, double[] im, double inside, double outside, double each) {
        double measured = missingAtMost(re, im, inside);
        double missing = Math.min(measured, outside * outside * (1 + 1e-9));
        double error = (Math.sqrt(missing) + inside) * (1 + 1e-9);
        if (error > tolerance) {
            throw notCarried(missing);
        }
        double count = levels.count();
        double[] moments = new double[Amplitudes.MOMENTS];
        double sum = 0;
        if (window.size() < count) {
            // |c|² ≤ 2 (Gaussian part)² + 2 each², and no moment exceeds the top level's power times the missing
            // weight.
            double power = 1;
            for (int j = 0; j < moments.length; j++) {
                double termwise = 2 * window.moments()[j] + 2 * power * count * each * each + Double.MIN_NORMAL;
                moments[j] = Math.min(termwise, power * missing) * (1 + 1e-9);
                power *= count;
            }
            sum = (window.sum() + count * each) * (1 + 1e-9);
        }
        return new Amplitudes(
                new long[] {window.first()}, new double[][] {re}, new double[][] {im}, error, moments, sum, missing);
    }

    /**
     * What computed overlaps leave of the weight 1, from above: the norm of the overlaps and its computed value differ by at most their
     * error; squares and sum 4 ulp.
     */
    private static double missingAtMost(double[] re, double[] im, double error) {
        double sum = 0;
        double lost = 0;
        for (int i = 0; i < re.length; i++) {
            double square = re[i] * re[i] + im[i] * im[i];
            double next = sum + square;
            double back = next - sum;
            lost += (sum - (next - back)) + (square - back);
            sum = next;
        }
        double missing = Math.max(0, (1 - sum) - lost);
        return Math.min(1, missing + 2 * error + 2 * error * error + 8 * 0x1p-53);
    }

    private PhysicsException notCarried(double missing) {
        return new PhysicsException.NotCarried(
                String.format(
                        Locale.ROOT,
                        "a packet of spread %s at %s with momentum %s, wanted to a norm error of %s,",
                        packet.width(),
                        packet.position(),
                        packet.momentum(),
                        tolerance),
                missing,
                (int) Math.min(Integer.MAX_VALUE, levels.count()),
                "make the packet wider or slower, move it off the walls, make the well deeper, or loosen the tolerance");
    }
}
