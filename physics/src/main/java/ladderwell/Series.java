package ladderwell;

import ladderwell.evidence.Certainty;
import ladderwell.quantity.Kind;

/** One observable along a run, in scaled units: a value and an error for every time. */
public final class Series {
    private final Observable observable;
    private final double[] values;
    private final double[] errors;
    private final Certainty certainty;

    Series(Observable observable, double[] values, double[] errors, Certainty certainty) {
        this.observable = observable;
        this.values = values;
        this.errors = errors;
        this.certainty = certainty;
    }

    /** What it is the values of. */
    public Observable observable() {
        return observable;
    }

    /** Its physical kind; {@link Kind#NUMBER} for plain numbers. */
    public Kind kind() {
        return observable.kind();
    }

    /** Number of times. */
    public int size() {
        return values.length;
    }

    /** The value at the j-th time. */
    public double value(int j) {
        return values[j];
    }

    /** How far the value at the j-th time can be off. */
    public double error(int j) {
        return errors[j];
    }

    /** What kind of error it is. */
    public Certainty certainty() {
        return certainty;
    }

    /** The values, copied. */
    public double[] values() {
        return values.clone();
    }
}
