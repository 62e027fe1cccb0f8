package ladderwell.kernel.notebook;

import com.google.gson.JsonElement;
import java.io.IOException;
import java.net.URLDecoder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.Base64;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.regex.Pattern;

/**
 * The pictures of a Markdown cell: attached to the cell, or image files in the folder of the notebook and below. A file
 * elsewhere, or one that is no image, is never put into the page, whatever the notebook asks for.
 *
 * @param cell the cell
 * @param folder the folder of the notebook
 */
record NotebookPictures(Cell cell, Path folder) implements MarkdownText.Pictures {
    private static final long LARGEST = 16L << 20;

    private static final Map<String, String> TYPES = Map.of(
            "png",
            "image/png",
            "jpg",
            "image/jpeg",
            "jpeg",
            "image/jpeg",
            "gif",
            "image/gif",
            "webp",
            "image/webp",
            "svg",
            "image/svg+xml");

    private static final Pattern DATA =
            Pattern.compile("data:image/(?:png|jpeg|gif|webp|svg\\+xml);base64,[A-Za-z0-9+/=\\s]*");

    @Override
    public Optional<String> embedded(String address) {
        if (address.startsWith("attachment:")) {
            return attached(decoded(address.substring("attachment:".length())));
        }
        if (DATA.matcher(address).matches()) {
            return Optional.of(address);
        }
        return file(decoded(address));
    }

    private Optional<String> attached(String name) {
        return cell.attachment(name)
                .flatMap(bundle -> bundle.entrySet().stream()
                        .filter(entry -> TYPES.containsValue(entry.getKey()))
                        .map(entry -> data(entry.getKey(), entry.getValue()))
                        .flatMap(Optional::stream)
                        .findFirst());
    }

    /** The address of an image as notebooks store it: base64, or text for SVG. */
    static Optional<String> data(String type, JsonElement stored) {
        String text = Lines.joined(stored);
        if (text == null) {
            return Optional.empty();
        }
        String base64 = type.equals("image/svg+xml")
                ? Base64.getEncoder().encodeToString(text.getBytes(StandardCharsets.UTF_8))
                : text.replaceAll("[^A-Za-z0-9+/=]", "");
        return Optional.of("data:" + type + ";base64," + base64);
    }

    private Optional<String> file(String name) {
        int dot = name.lastIndexOf('.');
        String type = TYPES.get(name.substring(dot + 1).toLowerCase(Locale.ROOT));
        if (type == null) {
            return Optional.empty();
        }
        try {
            Path root = folder.toRealPath();
            Path file = root.resolve(name).toRealPath();
            if (!file.startsWith(root) || !Files.isRegularFile(file) || Files.size(file) > LARGEST) {
                return Optional.empty();
            }
            byte[] bytes = Files.readAllBytes(file);
            return looksLike(type, bytes)
                    ? Optional.of(
                            "data:" + type + ";base64," + Base64.getEncoder().encodeToString(bytes))
                    : Optional.empty();
        } catch (IOException | InvalidPathException e) {
            // No such picture: the page says so in its place.
            return Optional.empty();
        }
    }

    private static boolean looksLike(String type, byte[] bytes) {
        String head = new String(bytes, 0, Math.min(bytes.length, 512), StandardCharsets.ISO_8859_1);
        return switch (type) {
            case "image/png" -> head.startsWith("\u0089PNG");
            case "image/jpeg" -> head.startsWith("\u00ff\u00d8\u00ff");
            case "image/gif" -> head.startsWith("GIF8");
            case "image/webp" -> head.startsWith("RIFF") && head.startsWith("WEBP", 8);
            default -> head.contains("<svg");
        };
    }

    private static String decoded(String address) {
        try {
            return URLDecoder.decode(address.replace("+", "%2B"), StandardCharsets.UTF_8);
        } catch (IllegalArgumentException e) {
            return address;
        }
    }
}
