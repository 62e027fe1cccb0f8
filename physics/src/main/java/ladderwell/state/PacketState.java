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
        double distance = beyond > tolerance * tolerance ? Math.sqrt(beyond) : Math.hypot(Math.sqrt(beyond), packet.foldedNorm());
        if (distance > tolerance / 4) {
            throw new IllegalArgumentException(String.format(
                    Locale.ROOT,
                    "a packet of spread %s at %s has weight %.2g beyond the walls of the box, too much for tolerance %s: make it narrower,"
                            + " move it inwards or loosen the tolerance",
                    packet.width(),
                    packet.position(),
                    beyond,
                    tolerance));
        }
        MomentumWindow window = new MomentumWindow(packet, Long.MAX_VALUE, Math.PI, tolerance * tolerance / 16);
        PacketOverlaps overlaps = overlaps(window);
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

    private PacketOverlaps overlaps(MomentumWindow window) {
        return new PacketOverlaps(levels, packet, window.first(), Math.toIntExact(window.last() - window.first() + 1));
    }

    /**
     * A packet inside the walls has its overlaps in closed form, wrong by at most 2√2 ∫|g| beyond the walls each; one that leaks needs
     * quadrature.
     */
    Amplitudes inWell() {
        double each = 2 * Math.sqrt(2) * packet.integralBeyond();
        double leak = Math.sqrt(levels.count()) * each * (1 + 1e-9);
        return leak <= tolerance / 8 ? confined(each, leak) : leaking();
    }

    private Amplitudes confined(double each, double leak) {
        MomentumWindow window = new MomentumWindow(packet, levels.count(), 0, tolerance * tolerance / 32);
        PacketOverlaps overlaps = overlaps(window);
        double tail = Math.sqrt(window.moments()[0]);
        double proved = (aboveRim() + tail + leak + overlaps.rounding) * (1 + 1e-9);
        Carried carried = new Carried(overlaps.re, overlaps.im, leak + overlaps.rounding);
        double error = Math.min(proved, carried.normError());
        double missing = Math.min(proved * proved, carried.missingAtMost());
        if (error > tolerance) {
            throw notCarried(carried);
        }
        // |c|² ≤ 2 (Gaussian part)² + 2 each²; the leak of every level counts, discarded or not.
        double[] moments = new double[Amplitudes.MOMENTS];
        double levelPower = levels.count();
        boolean all = window.last() - window.first() + 1 == levels.count();
        for (int j = 0; !all && j < moments.length; j++) {
            moments[j] = (2 * window.moments()[j] + 2 * levelPower * each * each) * (1 + 1e-9) + Double.MIN_NORMAL;
            levelPower *= levels.count();
        }
        double sum = all ? 0 : window.sum() + levels.count() * each * (1 + 1e-9);
        return new Amplitudes(
                new long[] {window.first()},
                new double[][] {overlaps.re},
                new double[][] {overlaps.im},
                error,
                moments,
                sum,
                missing);
    }

    /**
     * Norm of the packet's part above the rim, from above. A continuum wave of outside wave number q, k = √(q² + k₀²), has at most its
     * outside amplitude inside, so that for k₀ &gt; |p| the packet's transform gives (G²/π) ∫ e^{−2σ²(k−|p|)²} dq, and with k − k₀ ≥ q²/(2k₀ + q) an
     * elementary bound. What lies beyond the walls adds its own transform and its own norm.
     */
    private double aboveRim() {
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
        double outside = 2 * length * length / Math.PI + Math.sqrt(1 + rim * rim) * beyond;
        return (Math.sqrt(inside) + Math.sqrt(outside) + Math.sqrt(beyond)) * (1 + 1e-9);
    }

    private Amplitudes leaking() {
        long count = levels.count();
        long first = 0;
        long last = count - 1;
        if (count > ALL_KEPT) {
            MomentumWindow window = new MomentumWindow(packet, count, 0, tolerance * tolerance / 32);
            first = window.first();
            last = window.last();
        }
        LeakingOverlaps overlaps = new LeakingOverlaps(levels, packet, first, Math.toIntExact(last - first + 1));
        Carried carried = new Carried(overlaps.re, overlaps.im, overlaps.error);
        if (carried.normError() > tolerance) {
            throw notCarried(carried);
        }
        double[] moments = new double[Amplitudes.MOMENTS];
        double sum = 0;
        if (last - first + 1 < count) {
            double power = 1;
            for (int j = 0; j < moments.length; j++) {
                moments[j] = power * carried.missingAtMost();
                power *= count;
            }
            sum = Math.sqrt(count * carried.missingAtMost());
        }
        return new Amplitudes(
                new long[] {first},
                new double[][] {overlaps.re},
                new double[][] {overlaps.im},
                carried.normError(),
                moments,
                sum,
                carried.missingAtMost());
    }

    private PhysicsException notCarried(Carried carried) {
        return new PhysicsException.NotCarried(
                String.format(
                        Locale.ROOT,
                        "a packet of spread %s at %s with momentum %s, wanted to a norm error of %s,",
                        packet.width(),
                        packet.position(),
                        packet.momentum(),
                        tolerance),
                carried.missingAtMost(),
                (int) Math.min(Integer.MAX_VALUE, levels.count()),
                "make the packet wider or slower, move it off the walls, make the well deeper, or loosen the tolerance");
    }

    /** The weight that computed overlaps carry, and what is left of 1, with the overlaps' error booked. */
    private static final class Carried {
        private final double missing;
        private final double error;

        Carried(double[] re, double[] im, double error) {
            double sum = 0;
            double lost = 0;
            for (int i = 0; i < re.length; i++) {
                double square = re[i] * re[i] + im[i] * im[i];
                double next = sum + square;
                lost += (sum - next) + square;
                sum = next;
            }
            missing = Math.max(0, (1 - sum) - lost);
            this.error = error;
        }

        /** Weight outside the overlaps, from above: ‖c‖ and its computed value differ by at most the error; squares 4 ulp. */
        double missingAtMost() {
            return Math.min(1, missing + 2 * error + 2 * error * error + 8 * 0x1p-53);
        }

        /** Norm of what is outside, plus the error of what is inside. */
        double normError() {
            return (Math.sqrt(missingAtMost()) + error) * (1 + 1e-9);
        }
    }
}
