/**
 * How sure a number is, and the record of how it came about.
 *
 * <p>A {@link ladderwell.evidence.Bound} says how far a number can be from the exact answer and with what
 * {@link ladderwell.evidence.Certainty}; bounds widen as they combine and never narrow. A
 * {@link ladderwell.evidence.Tolerance} is what was allowed. A {@link ladderwell.evidence.Record} holds what was asked,
 * what ran and how sure the outcome is, as canonical JSON: the same bytes for the same input on every machine. A
 * {@link ladderwell.evidence.PhysicsException} says why there is no number.
 *
 * <p>Reading order: {@link ladderwell.evidence.Certainty}, {@link ladderwell.evidence.Bound},
 * {@link ladderwell.evidence.Tolerance}, {@link ladderwell.evidence.Record}, {@link ladderwell.evidence.Version},
 * {@link ladderwell.evidence.PhysicsException}.
 */
@NullMarked
package ladderwell.evidence;

import org.jspecify.annotations.NullMarked;
