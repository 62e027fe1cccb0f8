/**
 * A session of Java snippets: evaluate, complete, inspect, interrupt. Rests on the JDK's own JShell, run in this very
 * process so that values are objects and not their texts. Knows nothing of notebooks' protocols or of physics.
 *
 * <p>Reading order: {@link ladderwell.kernel.session.JavaSession} and {@link ladderwell.kernel.session.JavaEnd}; then
 * {@code Pieces} (a text cut into snippets), {@code SnippetControl} (running one snippet and stopping it), {@code
 * Traceback} (what the user reads when it fails), {@code Suggestions} and {@code Documentation}.
 */
@NullMarked
package ladderwell.kernel.session;

import org.jspecify.annotations.NullMarked;
