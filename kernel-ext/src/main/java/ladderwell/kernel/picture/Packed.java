package ladderwell.kernel.picture;

import com.google.gson.JsonObject;
import java.util.Base64;

/**
 * Numbers as 16-bit counts between a lowest and a highest value, in one base64 text: a third of the size of written
 * numbers, and decoded once.
 *
 * @accuracy half a count, (high − low) / 131070
 */
final class Packed {
    static final int COUNTS = 65535;

    private final double low;
    private final double high;
    private final byte[] counts;
    private int at;

    /** Room for this many numbers. */
    Packed(double low, double high, int size) {
        this.low = low;
        this.high = high;
        this.counts = new byte[2 * size];
    }

    static JsonObject of(double[] values) {
        double low = values[0];
        double high = values[0];
        for (double value : values) {
            low = Math.min(low, value);
            high = Math.max(high, value);
        }
        Packed packed = new Packed(low, high, values.length);
        packed.add(values);
        return packed.json();
    }

    void add(double[] values) {
        for (double value : values) {
            add(value);
        }
    }

    void add(double value) {
        double part = high > low ? (value - low) / (high - low) : 0;
        int count = (int) Math.round(Math.max(0, Math.min(1, part)) * COUNTS);
        counts[at++] = (byte) count;
        counts[at++] = (byte) (count >> 8);
    }

    JsonObject json() {
        JsonObject block = new JsonObject();
        block.addProperty("low", low);
        block.addProperty("high", high);
        block.addProperty("counts", Base64.getEncoder().encodeToString(counts));
        return block;
    }
}
