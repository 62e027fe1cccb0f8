package ladderwell.kernel.session;

/**
 * Where a snippet came from, carried through JShell as the snippet's identity.
 *
 * @param cell the number of the cell
 * @param line the line of the cell at which the snippet begins
 * @param count a number that makes it unique
 */
record SnippetId(int cell, int line, int count) {
    @Override
    public String toString() {
        return cell + "." + line + "." + count;
    }

    static SnippetId parse(String text) {
        String[] parts = text.split("\\.");
        return new SnippetId(Integer.parseInt(parts[0]), Integer.parseInt(parts[1]), Integer.parseInt(parts[2]));
    }
}
