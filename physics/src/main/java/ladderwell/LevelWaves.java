package ladderwell;

import ladderwell.evidence.Bound;
import ladderwell.level.Levels;
import ladderwell.motion.PhasedState;
import ladderwell.numeric.HermiteFunctions;
import ladderwell.phasespace.Displaced;
import ladderwell.phasespace.NumberWave;
import ladderwell.phasespace.PhaseState;
import ladderwell.phasespace.SampledWave;
import ladderwell.state.Amplitudes;

/** A state on levels at one instant, as a function of position: oscillator functions where the levels are harmonic, else the levels' own. */
final class LevelWaves {
    /** Above this many quanta a coherent state is its closed form. */
    private static final double CLOSED_FORM_ABOVE = 1e4;

    private static final double DROP = 1e-14;

    private final Levels levels;
    private final long[] first;
    private final double[][] re;
    private final double[][] im;

    private LevelWaves(Levels levels, long[] first, double[][] re, double[][] im) {
        this.levels = levels;
        this.first = first;
        this.re = re;
        this.im = im;
    }

    static PhaseState of(State state, PhasedState run, double time) {
        if (state instanceof Coherent coherent
                && state.oscillator() instanceof Harmonic
                && coherent.mean() > CLOSED_FORM_ABOVE) {
            double swing = Math.sqrt(2 * coherent.mean());
            double angle = coherent.phaseAngle() - time;
            double off = swing * (4 * Math.ulp(1.0) + 2 * Math.ulp(Math.abs(time) + Math.abs(coherent.phaseAngle())));
            return Displaced.coherent(swing * Math.cos(angle), swing * Math.sin(angle), off);
        }
        Amplitudes amplitudes = run.amplitudes();
        PhasedState now = PhasedState.of(run.levels(), amplitudes, new double[] {time});
        int count = amplitudes.segments();
        long[] first = new long[count];
        double[][] re = new double[count][];
        double[][] im = new double[count][];
        for (int s = 0; s < count; s++) {
            first[s] = amplitudes.first(s);
            double[][] rowRe = new double[1][amplitudes.length(s)];
            double[][] rowIm = new double[1][amplitudes.length(s)];
            now.phases(s).fill(0, 1, rowRe, rowIm);
            re[s] = rowRe[0];
            im[s] = rowIm[0];
        }
        Bound error = new Bound(now.certainty(), now.error());
        if (state.oscillator() instanceof Ladder) {
            if (now.lastLevel() > HermiteFunctions.LAST_INDEX) {
                throw new IllegalArgumentException("levels up to " + now.lastLevel()
                        + " are too many for a phase-space picture, at most " + HermiteFunctions.LAST_INDEX
                        + " are summed");
            }
            return new NumberWave(first, re, im, error);
        }
        if (state.oscillator() instanceof PotentialWell well
                && well.potential().period().isPresent()) {
            throw new IllegalArgumentException(
                    "the positions of this oscillator go round, and a Wigner function of the "
                            + "line has no meaning there; expected an oscillator on the line");
        }
        if (!run.levels().hasWaveFunctions()) {
            throw new IllegalArgumentException("the levels of this oscillator have no real wave functions, so that "
                    + "there is no phase-space picture of them");
        }
        return new LevelWaves(run.levels(), first, re, im).wave(state.oscillator(), now.lastLevel(), error);
    }

    private PhaseState wave(Oscillator oscillator, long last, Bound error) {
        double[] extent = levels.extent(last, DROP);
        double left = Math.max(oscillator.left(), extent[0]);
        double right = Math.min(oscillator.right(), extent[1]);
        double kinetic = Math.max(levels.energyHigh(last) - Shapes.bottom(oscillator, left, right), 0);
        double sum = 0;
        for (int s = 0; s < re.length; s++) {
            for (int i = 0; i < re[s].length; i++) {
                sum += Math.hypot(re[s][i], im[s][i]);
            }
        }
        Bound samples = Bound.estimated(sum * (levels.waveFunctionError(last) + 4e-16 / Math.sqrt(right - left)));
        return SampledWave.of(this::sample, left, right, Math.sqrt(2 * kinetic) + 6 / (right - left), error, samples);
    }

    private void sample(double[] x, double[] outRe, double[] outIm) {
        java.util.Arrays.fill(outRe, 0);
        java.util.Arrays.fill(outIm, 0);
        for (int s = 0; s < first.length; s++) {
            double[][] table = levels.waveFunctions(first[s], re[s].length, x);
            for (int i = 0; i < table.length; i++) {
                double a = re[s][i];
                double b = im[s][i];
                double[] row = table[i];
                for (int j = 0; j < x.length; j++) {
                    outRe[j] = Math.fma(a, row[j], outRe[j]);
                    outIm[j] = Math.fma(b, row[j], outIm[j]);
                }
            }
        }
    }
}
