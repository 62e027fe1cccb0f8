package ladderwell.kernel.session;

/**
 * A way to go on at the cursor.
 *
 * @param text what replaces the text between the start of the suggestions and the cursor
 * @param kind class, function, instance, keyword or module
 */
public record Suggestion(String text, String kind) {}
