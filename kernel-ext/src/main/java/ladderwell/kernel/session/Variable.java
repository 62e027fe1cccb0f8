package ladderwell.kernel.session;

import java.util.Optional;

/**
 * A variable of the session.
 *
 * @param name its name
 * @param type its declared type
 * @param value its value, empty for null
 */
public record Variable(String name, Class<?> type, Optional<Object> value) {}
