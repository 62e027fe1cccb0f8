package ladderwell.kernel.notebook;

import com.google.gson.JsonObject;
import com.google.gson.JsonParseException;
import com.google.gson.JsonParser;
import com.google.gson.Strictness;
import com.google.gson.stream.JsonReader;
import java.io.IOException;
import java.io.StringReader;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.StandardCharsets;
import java.nio.file.AccessDeniedException;
import java.nio.file.AtomicMoveNotSupportedException;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.nio.file.StandardOpenOption;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Files in and out: what can go wrong is said in one sentence, and a file is never left half written. */
final class NotebookFile {
    /** JSON nested deeper than any notebook is; deeper text could exhaust the stack. */
    private static final int DEEPEST = 500;

    private static final Pattern PLACE = Pattern.compile("line (\\d+) column (\\d+)");

    private NotebookFile() {}

    static String text(Path file) throws NotebookException {
        if (Files.isDirectory(file)) {
            throw new NotebookException(file + " is a folder; expected a notebook file");
        }
        try {
            String text = StandardCharsets.UTF_8
                    .newDecoder()
                    .decode(ByteBuffer.wrap(Files.readAllBytes(file)))
                    .toString();
            return text.startsWith("\ufeff") ? text.substring(1) : text;
        } catch (NoSuchFileException e) {
            throw new NotebookException("there is no file " + file, e);
        } catch (AccessDeniedException e) {
            throw new NotebookException(file + " cannot be read: access is denied", e);
        } catch (CharacterCodingException e) {
            throw new NotebookException(file + " is not UTF-8 text, so it is no notebook", e);
        } catch (IOException | OutOfMemoryError e) {
            throw new NotebookException(file + " cannot be read: " + reason(e), e);
        }
    }

    static JsonObject object(String text, String name) throws NotebookException {
        if (text.isBlank()) {
            throw new NotebookException(name + " is empty; expected a notebook");
        }
        checkDepth(text, name);
        try (JsonReader reader = new JsonReader(new StringReader(text))) {
            reader.setStrictness(Strictness.STRICT);
            if (!(JsonParser.parseReader(reader) instanceof JsonObject object)) {
                throw new NotebookException(name + " holds JSON but no notebook; expected an object with cells");
            }
            // Strict reading fails here on anything that follows.
            reader.peek();
            return object;
        } catch (JsonParseException | IOException e) {
            Matcher place = PLACE.matcher(String.valueOf(e.getMessage()));
            throw new NotebookException(
                    name + " is not valid JSON"
                            + (place.find() ? " (line " + place.group(1) + ", column " + place.group(2) + ")" : ""),
                    e);
        }
    }

    private static void checkDepth(String text, String name) throws NotebookException {
        int depth = 0;
        boolean quoted = false;
        for (int i = 0; i < text.length(); i++) {
            char c = text.charAt(i);
            if (quoted) {
                if (c == '\\') {
                    i++;
                } else if (c == '"') {
                    quoted = false;
                }
            } else if (c == '"') {
                quoted = true;
            } else if (c == '{' || c == '[') {
                depth++;
                if (depth > DEEPEST) {
                    throw new NotebookException(name + " is nested deeper than " + DEEPEST + " brackets");
                }
            } else if (c == '}' || c == ']') {
                depth--;
            }
        }
    }

    /**
     * Writes a text beside the file first and moves it into place; a link is followed, the permissions are kept.
     *
     * @throws IOException also for a file that is there and must not be written
     */
    static void write(Path file, String text) throws IOException {
        boolean replaces = Files.exists(file);
        Path target = replaces ? file.toRealPath() : file.toAbsolutePath();
        if (replaces && !Files.isWritable(target)) {
            throw new AccessDeniedException(file.toString());
        }
        String part = "." + target.getFileName() + "." + Long.toHexString(System.nanoTime()) + ".part";
        Path fresh = target.resolveSibling(part);
        try {
            Files.write(fresh, text.getBytes(StandardCharsets.UTF_8), StandardOpenOption.CREATE_NEW);
            if (replaces && Files.getFileStore(target).supportsFileAttributeView("posix")) {
                Files.setPosixFilePermissions(fresh, Files.getPosixFilePermissions(target));
            }
            try {
                Files.move(fresh, target, StandardCopyOption.ATOMIC_MOVE);
            } catch (AtomicMoveNotSupportedException e) {
                Files.move(fresh, target, StandardCopyOption.REPLACE_EXISTING);
            }
        } finally {
            Files.deleteIfExists(fresh);
        }
    }

    /** What an exception of the file system says, without the class name. */
    static String reason(Throwable e) {
        String message = e.getMessage();
        return message == null ? e.getClass().getSimpleName() : message;
    }
}
