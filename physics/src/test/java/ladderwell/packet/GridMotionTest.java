package ladderwell.packet;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.concurrent.CancellationException;
import java.util.function.DoubleBinaryOperator;
import ladderwell.evidence.Certainty;
import ladderwell.evidence.PhysicsException;
import ladderwell.state.Shape;
import org.junit.jupiter.api.Test;

class GridMotionTest {

    /** A Gaussian packet e^{−(x−x₀)²/4w² + ip(x−x₀)}. */
    private record Gauss(double position, double momentum, double width) implements Shape {
        @Override
        public void sample(double[] x, double[] re, double[] im) {
            for (int i = 0; i < x.length; i++) {
                double d = x[i] - position;
                double size = Math.pow(2 * Math.PI * width * width, -0.25) * Math.exp(-d * d / (4 * width * width));
                re[i] = size * Math.cos(momentum * d);
                im[i] = size * Math.sin(momentum * d);
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
            return Math.abs(momentum) + 11.5 / (2 * width);
        }

        @Override
        public double energy() {
            return 0;
        }

        @Override
        public double bottom() {
            return 0;
        }
    }

    private record Field(DoubleBinaryOperator v, boolean moves) implements PotentialField {
        @Override
        public void values(double[] x, double t, double[] out) {
            for (int i = 0; i < x.length; i++) {
                out[i] = v.applyAsDouble(x[i], t);
            }
        }
    }

    private static double[] times(double end, int frames) {
        double[] times = new double[frames + 1];
        for (int j = 0; j <= frames; j++) {
            times[j] = end * j / frames;
        }
        return times;
    }

    @Test
    void aFreePacketSpreadsAsItsClosedForm() {
        Gauss start = new Gauss(-2, 1.5, 0.8);
        GridMotion motion = GridMotion.of(new Field((x, t) -> 0, false), start, times(6, 4), 1e-9);
        for (int j = 0; j <= 4; j++) {
            double t = 6.0 * j / 4;
            GridFrame frame = motion.frame(j);
            assertEquals(-2 + 1.5 * t, frame.position().mean(), 1e-8);
            double width = 0.8 * Math.hypot(1, t / (2 * 0.64));
            assertEquals(width, Math.sqrt(frame.position().variance()), 1e-8);
            assertEquals(0.5 / 0.8, Math.sqrt(frame.momentum().variance()), 1e-9);
            assertEquals(1, frame.norm(), 1e-11);
        }
        assertTrue(motion.error().size() <= 1e-9);
        assertEquals(Certainty.ESTIMATED, motion.error().kind());
    }

    @Test
    void onAnInvertedOscillatorAPacketSpreadsAsItsClosedForm() {
        GridMotion motion =
                GridMotion.of(new Field((x, t) -> -x * x / 2, false), new Gauss(0.3, 0, 0.7), times(2.5, 5), 1e-9);
        for (int j = 0; j <= 5; j++) {
            double t = 0.5 * j;
            double width = Math.hypot(0.7 * Math.cosh(t), Math.sinh(t) / (2 * 0.7));
            GridFrame frame = motion.frame(j);
            assertEquals(
                    0.3 * Math.cosh(t),
                    frame.position().mean(),
                    2 * width * motion.error().size() + 1e-12);
            assertEquals(width, Math.sqrt(frame.position().variance()), 1e-7);
        }
    }

    @Test
    void theStateItselfIsOffByLessThanTheErrorSays() {
        // a coherent state of H = (p² + x²)/2: phase e^{−it/2} and the closed form of its centre
        double x0 = 2.5;
        double width = Math.sqrt(0.5);
        for (double tolerance : new double[] {1e-4, 1e-7, 1e-10}) {
            GridMotion motion = GridMotion.of(
                    new Field((x, t) -> x * x / 2, false), new Gauss(x0, 0, width), times(20, 3), tolerance);
            double t = 20;
            double x = x0 * Math.cos(t);
            double p = -x0 * Math.sin(t);
            Wave exact =
                    GridFrame.sampled(new Gauss(x, p, width), motion.frame(3).grid());
            // the packet's own phase is 0 at its centre: e^{−it/2 + ixp/2} is left over
            double phase = -t / 2 + x * p / 2;
            for (int i = 0; i < exact.re.length; i++) {
                double re = exact.re[i];
                exact.re[i] = re * Math.cos(phase) - exact.im[i] * Math.sin(phase);
                exact.im[i] = re * Math.sin(phase) + exact.im[i] * Math.cos(phase);
            }
            double off = motion.frame(3).wave().distance(exact);
            assertTrue(off <= motion.error().size(), tolerance + ": " + off + " > " + motion.error());
            assertTrue(motion.error().size() <= tolerance);
        }
    }

    @Test
    void aForcedOscillatorFollowsItsClosedForm() {
        // row by row: x'' = −x + F cos wt from rest
        double f = 0.4;
        double w = 1.7;
        GridMotion motion = GridMotion.of(
                new Field((x, t) -> x * x / 2 - f * x * Math.cos(w * t), true),
                new Gauss(0, 0, Math.sqrt(0.5)),
                times(12, 6),
                1e-9);
        for (int j = 0; j <= 6; j++) {
            double t = 2.0 * j;
            double expected = f * (Math.cos(w * t) - Math.cos(t)) / (1 - w * w);
            assertEquals(
                    expected,
                    motion.frame(j).position().mean(),
                    2 * motion.error().size());
            assertEquals(0.5, motion.frame(j).position().variance(), 1e-8);
        }
    }

    @Test
    void theStepHasOrderFour() {
        Field field = new Field((x, t) -> x * x * x * x / 4 - 0.3 * x * Math.sin(3 * t), true);
        Wave start = GridFrame.sampled(new Gauss(1, 0.5, 0.6), new Grid(-8, 16.0 / 256, 256));
        Wave exact = moved(field, start, 2560);
        double coarse = moved(field, start, 40).distance(exact);
        double fine = moved(field, start, 80).distance(exact);
        double order = Math.log(coarse / fine) / Math.log(2);
        assertTrue(order > 3.7 && order < 5, "order " + order + " from " + coarse + " and " + fine);
    }

    private static Wave moved(Field field, Wave start, int steps) {
        Wave wave = start.copy();
        double h = 2.0 / steps;
        SplitStep step = new SplitStep(wave.grid, field, h);
        for (int s = 0; s < steps; s++) {
            step.step(wave, s * h);
        }
        return wave;
    }

    @Test
    void aFasterPacketThanTheGridKnowsMakesItFiner() {
        // falls from 20 down a slope: from rest to p = 20
        GridMotion motion = GridMotion.of(new Field((x, t) -> 10 * x, false), new Gauss(20, 0, 1), times(2, 2), 1e-8);
        assertEquals(-20, motion.frame(2).momentum().mean(), 1e-6);
        assertTrue(motion.grid().spacing() < motion.frame(0).grid().spacing());
    }

    @Test
    void aJumpThatNoGridResolvesIsRefused() {
        assertThrows(
                PhysicsException.class,
                () -> GridMotion.of(
                        new Field((x, t) -> x > 0 ? 3 : 0, false), new Gauss(-4, 2, 0.5), times(4, 4), 1e-9));
    }

    @Test
    void aFieldWithoutAValueIsNamed() {
        assertTrue(assertThrows(
                        IllegalArgumentException.class,
                        () -> GridMotion.of(
                                new Field((x, t) -> Math.sqrt(x), false), new Gauss(0, 0, 1), times(1, 1), 1e-8))
                .getMessage()
                .contains("no value"));
    }

    @Test
    void anInterruptStopsTheSteps() {
        Thread.currentThread().interrupt();
        assertThrows(
                CancellationException.class,
                () -> GridMotion.of(new Field((x, t) -> x * x / 2, false), new Gauss(3, 0, 1), times(1000, 10), 1e-9));
        assertTrue(!Thread.interrupted(), "the flag is cleared");
    }
}
