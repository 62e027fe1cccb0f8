package ladderwell.kernel.notebook;

/** What stays on a terminal of a text that writes over itself with carriage returns, as a progress line does. */
final class Overwriting {
    private Overwriting() {}

    static String settled(String text) {
        if (text.indexOf('\r') < 0) {
            return text;
        }
        StringBuilder settled = new StringBuilder(text.length());
        for (String line : text.replace("\r\n", "\n").split("(?<=\n)")) {
            String end = line.endsWith("\n") ? "\n" : "";
            StringBuilder now = new StringBuilder();
            for (String piece : line.substring(0, line.length() - end.length()).split("\r")) {
                now.replace(0, Math.min(piece.length(), now.length()), piece);
            }
            settled.append(now).append(end);
        }
        return settled.toString();
    }
}
