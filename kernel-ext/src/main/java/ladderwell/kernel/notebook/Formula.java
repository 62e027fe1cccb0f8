package ladderwell.kernel.notebook;

import java.util.Set;
import org.commonmark.node.CustomNode;
import org.commonmark.parser.beta.InlineContentParser;
import org.commonmark.parser.beta.InlineContentParserFactory;
import org.commonmark.parser.beta.InlineParserState;
import org.commonmark.parser.beta.ParsedInline;
import org.commonmark.parser.beta.Position;
import org.commonmark.parser.beta.Scanner;

/**
 * A formula between {@code $} or {@code $$} in Markdown. It is kept as it was typed, so that its {@code _} and {@code *}
 * do not become emphasis. A {@code $} begins a formula where no blank follows, and ends one where no blank stands before
 * and no digit follows: {@code $5 and $6} is no formula.
 */
final class Formula extends CustomNode {
    private final String text;

    Formula(String text) {
        this.text = text;
    }

    /** The formula with its dollars. */
    String text() {
        return text;
    }

    static final class Factory implements InlineContentParserFactory {
        @Override
        public Set<Character> getTriggerCharacters() {
            return Set.of('$');
        }

        @Override
        public InlineContentParser create() {
            return Factory::parse;
        }

        private static ParsedInline parse(InlineParserState state) {
            Scanner scanner = state.scanner();
            Position start = scanner.position();
            int dollars = scanner.matchMultiple('$');
            if (dollars > 2 || dollars == 1 && Character.isWhitespace(scanner.peek())) {
                return ParsedInline.none();
            }
            while (scanner.find('$') >= 0) {
                char before = (char) scanner.peekPreviousCodePoint();
                int closing = scanner.matchMultiple('$');
                if (before == '\\') {
                    continue;
                }
                boolean ends = dollars == 2
                        ? closing == 2
                        : closing == 1 && !Character.isWhitespace(before) && !Character.isDigit(scanner.peek());
                if (ends) {
                    String text = scanner.getSource(start, scanner.position()).getContent();
                    return ParsedInline.of(new Formula(text), scanner.position());
                }
            }
            return ParsedInline.none();
        }
    }
}
