package ladderwell.kernel.sentence;

/** The values of Java expressions in braces. */
@FunctionalInterface
public interface Expressions {
    /**
     * The value of an expression.
     *
     * @param place where it stands, for the mistake if there is one
     * @throws MisreadSentence if it has no value
     */
    Object value(String expression, Place place) throws MisreadSentence;
}
