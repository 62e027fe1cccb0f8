package ladderwell;

import ladderwell.motion.PhasedState;
import ladderwell.quantity.Digits;
import ladderwell.quantity.Quantity;

/** What a motion does, in one line; each number with its error, and no claim beyond what is known. */
final class Verdict {
    private Verdict() {}

    /** For a run on levels. */
    static String of(Run run, PhasedState phased) {
        State state = run.state();
        if (phased.amplitudes().levels() == 1) {
            return "stationary: one level, nothing moves";
        }
        Oscillator oscillator = state.oscillator();
        if (oscillator instanceof Harmonic) {
            String period = time(run, 2 * Math.PI);
            if (state instanceof Coherent coherent && coherent.mean() > 0) {
                return "follows the classical motion for ever with its shape unchanged, period " + period
                        + ", spread over swing " + rounded(0.5 / Math.sqrt(coherent.mean()));
            }
            return "returns exactly after every period of " + period + " (equal level spacing)";
        }
        if (oscillator instanceof Box) {
            return "returns exactly after " + time(run, Box.REVIVAL_TIME) + " (levels of the box go with n²); "
                    + bestReturn(run);
        }
        if (phased.amplitudes().levels() == 2) {
            long a = phased.amplitudes().first(0);
            long b = phased.lastLevel();
            double spacing =
                    oscillator.levels().energyHigh(b) - oscillator.levels().energyHigh(a);
            return "two levels: returns exactly after every beat of " + time(run, 2 * Math.PI / spacing);
        }
        return "no common period is claimed for these levels; " + bestReturn(run);
    }

    /** For a run on a grid. */
    static String onGrid(Run run) {
        return (run.state().oscillator().moves() ? "in a potential that moves; " : "no levels carry this motion; ")
                + bestReturn(run);
    }

    /** For a run in a window of number states. */
    static String inWindow(Run run) {
        return run.state().oscillator().moves() ? "driven; " + bestReturn(run) : bestReturn(run);
    }

    /** The best return among the run's own times, after the state has first moved away. */
    private static String bestReturn(Run run) {
        Series back = run.series(Observable.RETURN_PROBABILITY);
        boolean away = false;
        int best = -1;
        for (int j = 0; j < back.size(); j++) {
            away |= back.value(j) < 0.5;
            if (away && (best < 0 || back.value(j) > back.value(best))) {
                best = j;
            }
        }
        if (best < 0) {
            return "within this run the return probability never falls below one half";
        }
        return "best return at the run's own times: probability "
                + Digits.pretty(Digits.withBound(round(back.value(best)), Math.max(back.error(best), 5e-5)))
                + " at " + time(run, run.time(best));
    }

    private static double round(double probability) {
        return Math.rint(probability * 1e4) / 1e4;
    }

    private static String time(Run run, double scaled) {
        if (run.state().oscillator().scale().isNatural()) {
            return rounded(scaled);
        }
        Quantity time = run.labTime(scaled);
        return rounded(time.value()) + " " + time.unit().symbol();
    }

    /** Six digits of a number known to a few units in its last place, with what the rounding leaves open. */
    private static String rounded(double value) {
        return Digits.pretty(Digits.withBound(value, 2e-6 * value));
    }
}
