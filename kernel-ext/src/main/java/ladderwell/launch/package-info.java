/**
 * What {@code java -jar} starts. This package is compiled for Java 8, so that a Java that is too old for everything else
 * can still say so; it refers to the rest by name only.
 */
package ladderwell.launch;
