package ladderwell.kernel.cell;

import java.util.List;
import java.util.Optional;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * A small language with the habits of the real one, to test what carries it. {@code %count NAME: NUMBER} declares an
 * Integer, {@code %word NAME: TEXT} a String, {@code %wait} waits to be interrupted, {@code %slowly NAME} declares
 * what it has when interrupted, {@code %break} throws, {@code %chat TEXT} prints and displays. A number may be a Java
 * expression in braces.
 */
public final class SmallSentences implements Sentences {
    private static final Pattern COUNT = Pattern.compile("count (\\S+): (?:\\{(.*)}|(\\d+)|(\\w+) plus (\\d+))");
    private static final Pattern WORD = Pattern.compile("word (\\S+): (.*)");

    @Override
    public void run(String text, SentenceContext context) throws SentenceFailure {
        for (String line : text.lines().toList()) {
            String sentence = line.strip().replaceFirst("^%(?!%)", "");
            if (!sentence.isEmpty() && !sentence.startsWith("%%")) {
                runOne(sentence, context);
            }
        }
    }

    private void runOne(String sentence, SentenceContext context) throws SentenceFailure {
        Matcher count = COUNT.matcher(sentence);
        Matcher word = WORD.matcher(sentence);
        try {
            if (count.matches()) {
                declareCount(count, context);
            } else if (word.matches()) {
                context.names().declare("word", word.group(1), String.class, word.group(2));
                context.emit(word.group(2));
            } else if (sentence.startsWith("chat ")) {
                context.output().stdout(sentence.substring(5));
                context.output().display(MimeBundle.plain("shown"), Optional.of("chat"));
                context.output().update(MimeBundle.plain("shown anew"), "chat");
            } else if (sentence.equals("wait")) {
                Thread.sleep(600_000);
            } else if (sentence.startsWith("slowly ")) {
                while (!Thread.interrupted()) {
                    Thread.onSpinWait();
                }
                context.names().declare("count", sentence.substring(7), Integer.class, 1);
                context.emit("what there was");
            } else if (sentence.equals("break")) {
                throw new StackOverflowError("broken on purpose");
            } else {
                String message = "line " + context.firstLine() + ": no sentence \"" + sentence + "\"; expected count";
                throw new SentenceFailure(message, List.of("%" + sentence, " ^"));
            }
        } catch (InterruptedException e) {
            throw new IllegalStateException("interrupted", e);
        } catch (IllegalArgumentException e) {
            throw new SentenceFailure(String.valueOf(e.getMessage()), List.of("%" + sentence), e);
        }
    }

    private static void declareCount(Matcher count, SentenceContext context) throws SentenceFailure {
        int value;
        if (count.group(2) != null) {
            value = ((Number) context.evaluate(count.group(2))).intValue();
        } else if (count.group(3) != null) {
            value = Integer.parseInt(count.group(3));
        } else {
            Names.Named other = context.names()
                    .find(count.group(4))
                    .orElseThrow(() -> new IllegalArgumentException("no name " + count.group(4)));
            value = (Integer) other.value() + Integer.parseInt(count.group(5));
        }
        context.names().declare("count", count.group(1), Integer.class, value);
        context.emit(value);
    }

    @Override
    public Completion complete(String text, int cursor, Names names) {
        int start = Math.max(text.lastIndexOf('%', cursor), text.lastIndexOf('\n', cursor - 1)) + 1;
        String typed = text.substring(start, cursor);
        List<Completion.Candidate> fitting = List.of("count", "word").stream()
                .filter(noun -> noun.startsWith(typed))
                .map(noun -> new Completion.Candidate(noun, "keyword"))
                .toList();
        return new Completion(start, cursor, fitting);
    }

    @Override
    public Optional<MimeBundle> inspect(String text, int cursor, int detail, Names names) {
        return text.contains("count") ? Optional.of(MimeBundle.plain("count: a whole number")) : Optional.empty();
    }
}
