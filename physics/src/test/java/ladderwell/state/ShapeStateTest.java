package ladderwell.state;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import ladderwell.evidence.PhysicsException;
import ladderwell.level.Levels;
import org.junit.jupiter.api.Test;

class ShapeStateTest {
    /** A Gaussian packet at rest; counts the points it is sampled at. */
    private static final class Packet implements Shape {
        private final double position;
        private final double width;
        private final double energy;
        private long sampled;

        Packet(double position, double width, double energy) {
            this.position = position;
            this.width = width;
            this.energy = energy;
        }

        @Override
        public void sample(double[] x, double[] re, double[] im) {
            sampled += x.length;
            double peak = Math.pow(2 * Math.PI * width * width, -0.25);
            for (int i = 0; i < x.length; i++) {
                double d = x[i] - position;
                re[i] = peak * Math.exp(-d * d / (4 * width * width));
            }
        }

        @Override
        public double left() {
            return position - 11.5 * width;
        }

        @Override
        public double right() {
            return position + 11.5 * width;
        }

        @Override
        public double[] breaks() {
            return new double[0];
        }

        @Override
        public double wave() {
            return 11.5 / (2 * width);
        }

        @Override
        public double energy() {
            return energy;
        }

        @Override
        public double bottom() {
            return 0;
        }
    }

    private static PhysicsException.TooLarge refusal(Packet packet, double tolerance) {
        return assertThrows(
                PhysicsException.TooLarge.class,
                () -> Amplitudes.expanded(Levels.polynomial(0, 0, 0, 0, 1), packet, tolerance));
    }

    @Test
    void aPacketThatNeedsTooManyLevelsIsRefusedAfterAFewOfThem() {
        Packet packet = new Packet(30, 0.5, 811_354);
        assertTrue(refusal(packet, 1e-8).getMessage().contains("more than 2000 levels"));
        // Four blocks or so of levels, not one hundred and twenty-five: each samples some 40 000 points.
        assertTrue(packet.sampled < 800_000, "it was sampled at " + packet.sampled + " points");
        Packet lower = new Packet(10, 0.5, 10_151);
        refusal(lower, 1e-8);
        assertTrue(lower.sampled < 300_000, "it was sampled at " + lower.sampled + " points");
    }

    @Test
    void aPacketOnManyLevelsThatFitIsNotRefused() {
        Packet packet = new Packet(30, 0.02, 811_354);
        Amplitudes amplitudes = Amplitudes.expanded(Levels.polynomial(0, 0, 0, 0, 1), packet, 1e-3);
        assertTrue(amplitudes.levels() > 150, "only " + amplitudes.levels() + " levels");
        double sum = 0;
        for (int i = 0; i < amplitudes.length(0); i++) {
            sum += amplitudes.re(0, i) * amplitudes.re(0, i) + amplitudes.im(0, i) * amplitudes.im(0, i);
        }
        assertEquals(1, sum, 1e-6);
    }
}
