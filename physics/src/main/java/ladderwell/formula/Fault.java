package ladderwell.formula;

/**
 * A point where a formula has no finite value.
 *
 * @param position x
 * @param reason one sentence: "the divisor 'x' is 0 at x = 0"
 * @param start first character of the part of the formula to blame, from 0
 * @param end one past the last character of that part
 */
public record Fault(double position, String reason, int start, int end) {}
