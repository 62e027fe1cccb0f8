package ladderwell.level;

import java.util.Arrays;

/** The checks that the three kinds of levels share: level numbers, points, lists of levels. */
final class Points {
    /** Four matrices of this size take half a gigabyte. */
    private static final int LARGEST_LIST = 4000;

    private Points() {}

    static void checkLevel(long n, long count) {
        if (n < 0) {
            throw new IllegalArgumentException("level " + n + " does not exist: levels count from 0");
        }
        if (n >= count) {
            throw new IllegalArgumentException("level " + n + " does not exist: the last level is " + (count - 1));
        }
    }

    static void check(long first, int rows, long count, double[] x) {
        if (rows < 1) {
            throw new IllegalArgumentException("a table of wave functions needs at least one level, got " + rows);
        }
        checkLevel(first, count);
        // Not first + rows, which may pass the largest long.
        if (rows - 1 > count - 1 - first) {
            throw new IllegalArgumentException("levels " + first + " and " + (rows - 1)
                    + " more do not all exist: the last level is " + (count - 1));
        }
        for (double point : x) {
            if (!(Math.abs(point) <= Double.MAX_VALUE)) {
                throw new IllegalArgumentException("wave functions need finite positions, got " + point);
            }
        }
    }

    static void checkEnergy(double energy) {
        if (!(Math.abs(energy) <= Double.MAX_VALUE)) {
            throw new IllegalArgumentException("levels are counted below a finite energy, got " + energy);
        }
    }

    static void checkDrop(double drop) {
        if (!(drop > 0 && drop <= Double.MAX_VALUE)) {
            throw new IllegalArgumentException("the value to drop below must be positive and finite, got " + drop);
        }
    }

    static void checkList(long[] levels, long count) {
        if (levels.length > LARGEST_LIST) {
            throw new IllegalArgumentException("transition elements between " + levels.length
                    + " levels are too many, at most " + LARGEST_LIST + " fit");
        }
        long[] sorted = levels.clone();
        Arrays.sort(sorted);
        for (int i = 0; i < sorted.length; i++) {
            checkLevel(sorted[i], count);
            if (i > 0 && sorted[i] == sorted[i - 1]) {
                throw new IllegalArgumentException("level " + sorted[i] + " appears twice in the list");
            }
        }
    }
}
