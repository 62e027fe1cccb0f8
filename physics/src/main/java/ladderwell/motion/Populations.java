package ladderwell.motion;

import ladderwell.evidence.Bound;
import ladderwell.evidence.Certainty;
import ladderwell.level.Levels;
import ladderwell.state.Amplitudes;

/** What phases never change: populations, mean and variance of the level number, mean energy. @units scaled */
public final class Populations {
    private final PhasedState state;
    private final double meanLevel;
    private final double levelVariance;
    private final double meanEnergy;
    private final Bound meanLevelBound;
    private final Bound levelVarianceBound;
    private final Bound meanEnergyBound;

    private Populations(PhasedState state, double[] level, double[] energy, Bound[] bounds) {
        this.state = state;
        this.meanLevel = level[0];
        this.levelVariance = level[1];
        this.meanEnergy = energy[0];
        this.meanLevelBound = bounds[0];
        this.levelVarianceBound = bounds[1];
        this.meanEnergyBound = bounds[2];
    }

    /** Reads them from the state at time 0. */
    public static Populations of(PhasedState state) {
        Amplitudes amplitudes = state.amplitudes();
        double delta = amplitudes.normError();
        double[] level = centred(amplitudes, n -> n);
        double[] energy = centred(amplitudes, state.levels()::energyHigh);
        double tail0 = amplitudes.tailMoment(0);
        double centre = level[0];
        double levelMean = meanError(level, delta) + amplitudes.tailMoment(1) + centre * tail0;
        double levelVariance =
                squareError(level, delta) + amplitudes.tailMoment(2) + centre * centre * tail0 + levelMean * levelMean;
        boolean ladder = state.levels().kind() == Levels.Kind.HARMONIC;
        double levelError = 0;
        for (int s = 0; s < amplitudes.segments(); s++) {
            levelError =
                    Math.max(levelError, state.levels().energyError(amplitudes.first(s) + amplitudes.length(s) - 1));
        }
        // On the harmonic ladder E = n + ½, so the level's tail moment is the energy's; elsewhere no moment bound is
        // proved.
        boolean proved = state.complete() || ladder;
        double energyMean =
                meanError(energy, delta) + levelError + (ladder ? amplitudes.tailMoment(1) + (centre + 1) * tail0 : 0);
        return new Populations(state, level, energy, new Bound[] {
            new Bound(amplitudes.certainty(), levelMean),
            new Bound(amplitudes.certainty(), levelVariance),
            new Bound(proved ? state.certainty() : Certainty.ESTIMATED, energyMean)
        });
    }

    private interface Value {
        double of(long n);
    }

    /**
     * Mean and variance about the mean, and what their errors need: [mean, variance, ‖(v−mean)²ψ‖, largest |v−mean|,
     * number of terms].
     */
    private static double[] centred(Amplitudes amplitudes, Value value) {
        double norm = 0;
        double centre = value.of(amplitudes.first(0) + amplitudes.length(0) / 2);
        double first = 0;
        for (int s = 0; s < amplitudes.segments(); s++) {
            for (int i = 0; i < amplitudes.length(s); i++) {
                double weight = weight(amplitudes, s, i);
                norm += weight;
                first += weight * (value.of(amplitudes.first(s) + i) - centre);
            }
        }
        double mean = centre + first / norm;
        double second = 0;
        double fourth = 0;
        double largest = 0;
        long terms = 0;
        for (int s = 0; s < amplitudes.segments(); s++) {
            for (int i = 0; i < amplitudes.length(s); i++) {
                double weight = weight(amplitudes, s, i);
                double off = value.of(amplitudes.first(s) + i) - mean;
                second += weight * off * off;
                fourth += weight * off * off * off * off;
                largest = Math.max(largest, Math.abs(off));
                terms++;
            }
        }
        return new double[] {mean, second / norm, Math.sqrt(fourth), largest, terms};
    }

    private static double weight(Amplitudes amplitudes, int s, int i) {
        double re = amplitudes.re(s, i);
        double im = amplitudes.im(s, i);
        return re * re + im * im;
    }

    /** Error of the mean of v inside the kept levels: 2‖(v−mean)ψ‖δ + max²…, plus the rounding of the sums. */
    private static double meanError(double[] c, double delta) {
        double spread = Math.sqrt(c[1]);
        return 2.01 * spread * delta + 2 * c[3] * delta * delta + c[4] * 0x1p-52 * (spread + 1) + 4 * Math.ulp(c[0]);
    }

    private static double squareError(double[] c, double delta) {
        return 2.01 * c[2] * delta
                + 2 * c[3] * c[3] * delta * delta
                + c[1] * delta * 2.01
                + c[4] * 0x1p-51 * (c[1] + 1);
    }

    /** ⟨n⟩. */
    public double meanLevel() {
        return meanLevel;
    }

    /** Error of ⟨n⟩. */
    public Bound meanLevelBound() {
        return meanLevelBound;
    }

    /** Var n. */
    public double levelVariance() {
        return levelVariance;
    }

    /** Error of Var n. */
    public Bound levelVarianceBound() {
        return levelVarianceBound;
    }

    /** ⟨E⟩. */
    public double meanEnergy() {
        return meanEnergy;
    }

    /** Error of ⟨E⟩. */
    public Bound meanEnergyBound() {
        return meanEnergyBound;
    }

    /** P_n; 0 for a level that is not kept. */
    public double population(long n) {
        Amplitudes amplitudes = state.amplitudes();
        for (int s = 0; s < amplitudes.segments(); s++) {
            long i = n - amplitudes.first(s);
            if (i >= 0 && i < amplitudes.length(s)) {
                return weight(amplitudes, s, (int) i);
            }
        }
        return 0;
    }

    /** Error of P_n: |c_n| is off by at most δ. */
    public Bound populationBound(long n) {
        double delta = state.amplitudes().normError();
        double p = population(n);
        return new Bound(state.amplitudes().certainty(), (2 * Math.sqrt(p) + delta) * delta + 4 * Math.ulp(p));
    }
}
