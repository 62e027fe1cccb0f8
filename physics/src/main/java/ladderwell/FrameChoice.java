package ladderwell;

import java.util.Optional;
import ladderwell.mode.Jump;
import ladderwell.operator.LadderPolynomial;

/**
 * Whether a displaced frame pays for a coherent state: where its number window would be wide and neither the nonlinearity nor dephasing bends the
 * fluctuation into a crescent before the end. A wrong guess costs time only: the run then leaves the frame.
 *
 * @param mostLevels levels of the fluctuation from which on the number window is the better place
 */
record FrameChoice(int mostLevels) {
    /** Fewer quanta than this fit in a small window anyhow. */
    private static final double LEAST_QUANTA = 30;

    private static final double WIDTH = 14;
    /** How far the middle of a crescent may lie behind its ends, in units of the fluctuation. */
    private static final double SAG = 1;

    private static final int MOST_LEVELS = 400;

    static Optional<FrameChoice> of(Evolution evolution, LadderMode mode) {
        if (!(evolution.state() instanceof Coherent coherent)) {
            return Optional.empty();
        }
        double mean = coherent.mean();
        double window = WIDTH * Math.sqrt(mean) + 10;
        if (mean < LEAST_QUANTA) {
            return drivenFar(evolution, mode);
        }
        double time = evolution.scaledDuration();
        double loss = 0;
        double dephasing = 0;
        double unit = mode.scale().isNatural() ? 1 : mode.scale().angularFrequency();
        for (Jump jump : mode.mode().jumps()) {
            double rate = jump.rate().perSecond() / unit;
            if (jump.name().equals("loss")) {
                loss += rate;
            } else if (jump.name().equals("dephasing")) {
                dephasing += rate;
            }
        }
        double acting = loss > 0 ? Math.min(time, 1 / loss) : time;
        double bend = bend(mode, mean);
        double turned = bend * bend * acting * acting * mean + dephasing * acting;
        double sag = Math.sqrt(mean) / 2 * turned;
        if (sag > SAG) {
            return Optional.empty();
        }
        return Optional.of(new FrameChoice((int) Math.min(MOST_LEVELS, Math.max(24, window / 1.5))));
    }

    /** From near the vacuum, a drive may take a mode to many quanta: the largest displacement of the mean field decides. */
    private static Optional<FrameChoice> drivenFar(Evolution evolution, LadderMode mode) {
        Coherent coherent = (Coherent) evolution.state();
        double time = evolution.scaledDuration();
        double most = 0;
        var orbit = mode.orbit(coherent.position(), coherent.momentum(), 0);
        for (int i = 0; i <= LOOKS; i++) {
            double t = time * i / LOOKS;
            double x = orbit.position(t);
            double p = orbit.momentum(t);
            most = Math.max(most, (x * x + p * p) / 2);
        }
        return most > FAR ? Optional.of(new FrameChoice(MOST_LEVELS)) : Optional.empty();
    }

    /** Mean-field quanta from which on a run from near the vacuum is followed in a frame. */
    private static final double FAR = 1000;

    private static final int LOOKS = 200;

    /** How much the frequency changes from one quantum to the next: the second difference of ⟨n|H|n⟩. */
    private static double bend(LadderMode mode, double mean) {
        LadderPolynomial h = mode.hamiltonian().at(0).diagonalPart();
        long n = Math.round(Math.max(1, mean));
        return Math.abs(h.diagonal(n + 1)
                .minus(h.diagonal(n).times(2))
                .plus(h.diagonal(n - 1))
                .value());
    }
}
