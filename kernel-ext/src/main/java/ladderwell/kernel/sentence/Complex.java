package ladderwell.kernel.sentence;

/**
 * A complex number as it was typed.
 *
 * @param re real part, finite
 * @param im imaginary part, finite
 */
public record Complex(double re, double im) {}
