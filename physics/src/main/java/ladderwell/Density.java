package ladderwell;

import ladderwell.evidence.Bound;

/** |ψ(x, t)|² on a grid, for every time of a run, in scaled units. @shape [times][points], points evenly spaced */
public final class Density {
    /** Points where none are asked for. */
    public static final int DEFAULT_POINTS = 400;

    private final Run run;
    private final double[] positions;
    private final double[][] values;
    private final Bound bound;
    private final String method;

    Density(Run run, double[] positions, double[][] values, Bound bound, String method) {
        this.run = run;
        this.positions = positions;
        this.values = values;
        this.bound = bound;
        this.method = method;
    }

    /** The run it was read from: times, oscillator, classical orbit. */
    public Run run() {
        return run;
    }

    /** Number of times. */
    public int times() {
        return values.length;
    }

    /** Number of grid points. */
    public int points() {
        return positions.length;
    }

    /** The i-th position, scaled. */
    public double position(int i) {
        return positions[i];
    }

    /** |ψ|² at the j-th time and i-th point, per scaled length. */
    public double value(int j, int i) {
        return values[j][i];
    }

    /** One frame, the array itself for hot loops; read only. */
    public double[] frame(int j) {
        return values[j];
    }

    /** How far any value can be off. */
    public Bound bound() {
        return bound;
    }

    /** How the values were made: "sum over levels" or "closed form of a coherent state". */
    public String method() {
        return method;
    }

    /** The largest value of all frames, for a scale that stays fixed. */
    public double peak() {
        double peak = 0;
        for (double[] frame : values) {
            for (double value : frame) {
                peak = Math.max(peak, value);
            }
        }
        return peak;
    }
}
