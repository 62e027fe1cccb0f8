package ladderwell.kernel.notebook;

import com.google.gson.JsonArray;
import com.google.gson.JsonElement;
import com.google.gson.JsonObject;
import com.google.gson.JsonPrimitive;
import java.util.HashSet;
import java.util.Set;
import java.util.regex.Pattern;
import org.jspecify.annotations.Nullable;

/**
 * Cell ids, which nbformat asks for from 4.5 on: 1 to 64 letters, digits, {@code -} and {@code _}, each once in a
 * notebook. A missing one is made from the place and text of the cell rather than by chance, so that the same notebook
 * always gives the same file.
 */
final class CellIds {
    private static final Pattern VALID = Pattern.compile("[a-zA-Z0-9_-]{1,64}");

    private CellIds() {}

    static void complete(JsonArray cells) {
        Set<String> taken = new HashSet<>();
        Set<Integer> missing = new HashSet<>();
        for (int i = 0; i < cells.size(); i++) {
            String id = own(cells.get(i).getAsJsonObject());
            if (id == null || !taken.add(id)) {
                missing.add(i);
            }
        }
        for (int i = 0; i < cells.size(); i++) {
            if (missing.contains(i)) {
                JsonObject cell = cells.get(i).getAsJsonObject();
                int seed = 31 * i + String.valueOf(cell.get("source")).hashCode();
                String id = String.format("%08x", seed);
                while (!taken.add(id)) {
                    seed++;
                    id = String.format("%08x", seed);
                }
                cell.addProperty("id", id);
            }
        }
    }

    private static @Nullable String own(JsonObject cell) {
        JsonElement id = cell.get("id");
        return id instanceof JsonPrimitive text
                        && text.isString()
                        && VALID.matcher(text.getAsString()).matches()
                ? text.getAsString()
                : null;
    }
}
