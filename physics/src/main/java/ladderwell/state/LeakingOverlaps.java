package ladderwell.state;

import java.util.ArrayList;
import java.util.List;
import ladderwell.level.Levels;
import ladderwell.level.StandingWave;
import ladderwell.numeric.DoubleDouble;
import ladderwell.numeric.LegendreRule;

/**
 * Overlaps ∫ g φ_n of a packet with well levels by Gauss–Legendre panels, the walls between panels and the exponential tails included.
 *
 * <p>Panels have half width h = 2^−m and whole multiples of 2h as edges, so every centre and the walls are exact doubles. A phase at a node is
 * the exactly reduced phase at the centre plus k s with |k s| ≤ 16, s the node's offset: nothing is lost at large momenta.
 *
 * <p>Error of a panel: for an integrand bounded by M on the Bernstein ellipse ρ the rule of 32 nodes errs by at most h (64/15) M ρ^{−62} / (1 −
 * ρ^{−2}) (Trefethen, Approximation Theory and Approximation Practice, theorem 19.3). With h ≤ σ and h (|p| + k₀) ≤ 16, at ρ = 6 M is below e^{52}
 * times the packet's peak: 1e-25 of it, far below rounding.
 */
final class LeakingOverlaps {
    private static final int NODES = 32;

    /** Beyond this many σ the packet's weight and integral are below 1e-34. */
    private static final double EXTENT = 18;

    /** Node evaluations that are still made: about a second. */
    private static final double LARGEST_WORK = 3e8;

    /**
     * Rounding of one overlap relative to ∫ |g| times √2 for the wave: phases k s and p s 16 each, packet 12, wave 8, weights 2, sums of a
     * panel 32 and of panels 4; both parts, so times √2 · √2.
     */
    private static final double ROUNDING = 2 * 90 * 0x1p-53;

    final double[] re;
    final double[] im;

    /** Guaranteed norm of the error of all overlaps. */
    final double error;

    private final Levels levels;
    private final double[] offset = new double[NODES];
    private final double[] weight = new double[NODES];

    /** Panels: centre, and the packet at its nodes times the weights. */
    private record Panel(double centre, double[] re, double[] im) {}

    LeakingOverlaps(Levels levels, GaussianPacket packet, long first, int count) {
        this.levels = levels;
        re = new double[count];
        im = new double[count];
        double fastest = Math.abs(packet.momentum()) + Math.sqrt(2 * levels.threshold());
        double half = Math.scalb(1.0, Math.getExponent(Math.min(Math.min(packet.width(), 16 / fastest), 0.25)));
        double reach = EXTENT * packet.width();
        double panels = reach / half + 2;
        if (panels * NODES * count > LARGEST_WORK) {
            throw new IllegalArgumentException(
                    "a packet of spread " + packet.width() + " and momentum " + packet.momentum()
                            + " leaks through the walls of a well with " + levels.count()
                            + " levels: its overlaps are too many to integrate; move it off the walls or loosen the tolerance");
        }
        double[][] rule = LegendreRule.of(NODES);
        for (int j = 0; j < NODES; j++) {
            offset[j] = half * rule[0][j];
            weight[j] = half * rule[1][j];
        }
        long from = (long) Math.floor((packet.position() - reach) / (2 * half));
        long to = (long) Math.ceil((packet.position() + reach) / (2 * half));
        List<Panel> all = new ArrayList<>();
        for (long i = from; i < to; i++) {
            all.add(panel(packet, (2 * i + 1) * half));
        }
        for (int i = 0; i < count; i++) {
            integrate(all, first + i, i);
        }
        double each = ROUNDING * packet.reach() + 1e-24;
        error = each * Math.sqrt(count) * (1 + 1e-9);
    }

    private Panel panel(GaussianPacket packet, double centre) {
        double sigma = packet.width();
        double peak = 1 / Math.sqrt(Math.sqrt(2 * Math.PI * sigma * sigma));
        DoubleDouble from = DoubleDouble.sum(centre, -packet.position());
        // e^{i p (x − x₀)} at the centre: the wave of n = −1 turned back.
        StandingWave turn = new StandingWave(-1, DoubleDouble.of(packet.momentum()));
        double cosHigh = turn.cosine(from.hi());
        double sinHigh = -turn.sine(from.hi());
        double small = packet.momentum() * from.lo();
        double cosCentre = cosHigh - small * sinHigh;
        double sinCentre = sinHigh + small * cosHigh;
        double[] panelRe = new double[NODES];
        double[] panelIm = new double[NODES];
        for (int j = 0; j < NODES; j++) {
            double scaled = (from.hi() + offset[j]) / (2 * sigma);
            double size = weight[j] * peak * Math.exp(-scaled * scaled);
            double cosNode = Math.cos(packet.momentum() * offset[j]);
            double sinNode = Math.sin(packet.momentum() * offset[j]);
            panelRe[j] = size * (cosCentre * cosNode - sinCentre * sinNode);
            panelIm[j] = size * (sinCentre * cosNode + cosCentre * sinNode);
        }
        return new Panel(centre, panelRe, panelIm);
    }

    private void integrate(List<Panel> panels, long n, int row) {
        DoubleDouble waveNumber = new DoubleDouble(levels.energyHigh(n), levels.energyLow(n))
                .times(2)
                .sqrt();
        double k = waveNumber.hi();
        double decay = levels.decay(n);
        double amplitude = Math.sqrt(2 / (1 + 2 / decay));
        StandingWave wave = new StandingWave(n, waveNumber);
        double[] cosNode = new double[NODES];
        double[] sinNode = new double[NODES];
        double[] grow = new double[NODES];
        for (int j = 0; j < NODES; j++) {
            cosNode[j] = Math.cos(k * offset[j]);
            sinNode[j] = Math.sin(k * offset[j]);
            grow[j] = Math.exp(decay * offset[j]);
        }
        double edge = amplitude * k / Math.sqrt(2 * levels.threshold());
        double sumRe = 0;
        double lostRe = 0;
        double sumIm = 0;
        double lostIm = 0;
        for (Panel panel : panels) {
            double partRe = 0;
            double partIm = 0;
            double out = Math.abs(panel.centre) - 0.5;
            if (out < 0) {
                double s = amplitude * wave.sine(panel.centre);
                double c = amplitude * wave.cosine(panel.centre);
                for (int j = 0; j < NODES; j++) {
                    double value = s * cosNode[j] - c * sinNode[j];
                    partRe += panel.re[j] * value;
                    partIm += panel.im[j] * value;
                }
            } else {
                boolean right = panel.centre > 0;
                double sign = right || (n & 1) == 0 ? 1 : -1;
                double centre = sign * edge * Math.exp(-decay * out);
                for (int j = 0; j < NODES; j++) {
                    // Nodes lie symmetric: the mirror node has the inverse factor.
                    double value = centre * grow[right ? NODES - 1 - j : j];
                    partRe += panel.re[j] * value;
                    partIm += panel.im[j] * value;
                }
            }
            double next = sumRe + partRe;
            double back = next - sumRe;
            lostRe += (sumRe - (next - back)) + (partRe - back);
            sumRe = next;
            next = sumIm + partIm;
            back = next - sumIm;
            lostIm += (sumIm - (next - back)) + (partIm - back);
            sumIm = next;
        }
        re[row] = sumRe + lostRe;
        im[row] = sumIm + lostIm;
    }
}
