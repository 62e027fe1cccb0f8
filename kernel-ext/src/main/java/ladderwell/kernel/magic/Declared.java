package ladderwell.kernel.magic;

/** What a declaration returns: the name it declared, the noun it used, and the value, to be shown as a card. */
public record Declared(String name, String noun, Object value) {}
