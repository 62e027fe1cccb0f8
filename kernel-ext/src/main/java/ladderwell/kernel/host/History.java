package ladderwell.kernel.host;

import io.github.spencerpark.jupyter.messages.request.HistoryRequest;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Pattern;

/** The cells run since the kernel started, with their results as plain text. */
final class History {
    /** The only session there is; clients ask for the present one as 0. */
    private static final int SESSION = 1;

    private final List<Entry> entries = new ArrayList<>();

    private record Entry(int line, String input, Optional<String> output) {}

    synchronized void add(int line, String input, Optional<String> output) {
        entries.add(new Entry(line, input, output));
    }

    /** The entries that a request asks for, in the form in which they are sent. */
    synchronized List<Object> find(HistoryRequest request) {
        return chosen(request).stream()
                .<Object>map(entry -> List.of(SESSION, entry.line, content(entry, request.includeOutput())))
                .toList();
    }

    private static Object content(Entry entry, boolean withOutput) {
        if (!withOutput) {
            return entry.input;
        }
        List<Object> both = new ArrayList<>();
        both.add(entry.input);
        both.add(entry.output.orElse(null));
        return both;
    }

    private List<Entry> chosen(HistoryRequest request) {
        if (request instanceof HistoryRequest.Tail tail) {
            return last(entries, tail.getMaxReturnLength());
        }
        if (request instanceof HistoryRequest.Range range) {
            boolean here = range.getSessionIndex() == 0 || range.getSessionIndex() == SESSION;
            int stop = range.getStop() == 0 ? Integer.MAX_VALUE : range.getStop();
            return entries.stream()
                    .filter(entry -> here && entry.line >= range.getStart() && entry.line < stop)
                    .toList();
        }
        if (request instanceof HistoryRequest.Search search) {
            Pattern pattern = glob(search.getPattern() == null ? "*" : search.getPattern());
            List<Entry> found = entries.stream()
                    .filter(entry -> pattern.matcher(entry.input).matches())
                    .toList();
            if (search.filterUnique()) {
                Map<String, Entry> latest = new LinkedHashMap<>();
                for (Entry entry : found) {
                    latest.remove(entry.input);
                    latest.put(entry.input, entry);
                }
                found = List.copyOf(latest.values());
            }
            return search.getMaxReturnLength() > 0 ? last(found, search.getMaxReturnLength()) : found;
        }
        return List.of();
    }

    private static List<Entry> last(List<Entry> list, int count) {
        return list.subList(Math.max(0, list.size() - Math.max(0, count)), list.size());
    }

    /** A pattern of the kind {@code *} any text, {@code ?} any character. */
    private static Pattern glob(String pattern) {
        StringBuilder regex = new StringBuilder();
        pattern.codePoints().forEach(c -> {
            switch (c) {
                case '*' -> regex.append(".*");
                case '?' -> regex.append('.');
                default -> regex.append(Pattern.quote(Character.toString(c)));
            }
        });
        return Pattern.compile(regex.toString(), Pattern.DOTALL);
    }
}
