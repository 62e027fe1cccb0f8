package ladderwell.kernel.notebook;

import com.google.gson.Gson;
import com.google.gson.JsonArray;
import com.google.gson.JsonObject;
import com.google.gson.JsonParseException;
import com.google.gson.JsonParser;
import com.google.gson.JsonPrimitive;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import ladderwell.kernel.cell.CellEnd;
import ladderwell.kernel.cell.CellOutput;
import ladderwell.kernel.cell.MimeBundle;

/**
 * Stores what cells say as outputs of a notebook, as a Jupyter client does: pieces of one stream that follow each other
 * become one output, a display is replaced wherever its id was shown, a waiting clear happens at the next output. Every
 * change holds the notebook's lock, so that the file can be written while a cell still runs.
 */
final class OutputStore {
    private static final Gson GSON = new Gson();

    private final Notebook notebook;
    /** Outputs shown under an id; an update changes them in place, in whatever cell they stand. */
    private final Map<String, List<JsonObject>> displays = new HashMap<>();

    OutputStore(Notebook notebook) {
        this.notebook = notebook;
    }

    /** Where one cell says what it has to say. */
    OfCell of(Cell cell) {
        return new OfCell(cell);
    }

    private static JsonObject error(String name, String message, List<String> traceback) {
        JsonObject error = new JsonObject();
        error.addProperty("output_type", "error");
        error.addProperty("ename", name);
        error.addProperty("evalue", message);
        error.add("traceback", GSON.toJsonTree(traceback));
        return error;
    }

    private static JsonObject output(MimeBundle bundle, String type) {
        JsonObject output = new JsonObject();
        output.addProperty("output_type", type);
        fill(output, bundle);
        return output;
    }

    private static void fill(JsonObject output, MimeBundle bundle) {
        JsonObject data = new JsonObject();
        bundle.data().forEach((type, text) -> {
            if (type.equals("application/json") || type.startsWith("application/") && type.endsWith("+json")) {
                try {
                    data.add(type, JsonParser.parseString(text));
                } catch (JsonParseException e) {
                    data.add(type, new JsonPrimitive(text));
                }
            } else {
                data.addProperty(type, text);
            }
        });
        output.add("data", data);
        output.add("metadata", GSON.toJsonTree(bundle.metadata()));
    }

    /** The output of one cell. */
    final class OfCell implements CellOutput {
        private final Cell cell;
        private boolean clearWaits;

        private OfCell(Cell cell) {
            this.cell = cell;
        }

        @Override
        public void stdout(String text) {
            stream("stdout", text);
        }

        @Override
        public void stderr(String text) {
            stream("stderr", text);
        }

        private void stream(String name, String text) {
            if (text.isEmpty()) {
                return;
            }
            synchronized (notebook) {
                clearIfWaiting();
                JsonArray outputs = cell.outputs();
                JsonObject last = outputs.isEmpty()
                        ? new JsonObject()
                        : outputs.get(outputs.size() - 1).getAsJsonObject();
                if (last.has("name") && last.get("name").getAsString().equals(name)) {
                    last.addProperty("text", last.get("text").getAsString() + text);
                } else {
                    JsonObject stream = new JsonObject();
                    stream.addProperty("output_type", "stream");
                    stream.addProperty("name", name);
                    stream.addProperty("text", text);
                    outputs.add(stream);
                }
            }
        }

        @Override
        public void display(MimeBundle bundle, Optional<String> displayId) {
            synchronized (notebook) {
                JsonObject output = output(bundle, "display_data");
                displayId.ifPresent(id -> {
                    update(bundle, id);
                    displays.computeIfAbsent(id, key -> new ArrayList<>()).add(output);
                });
                add(output);
            }
        }

        @Override
        public void update(MimeBundle bundle, String displayId) {
            synchronized (notebook) {
                displays.getOrDefault(displayId, List.of()).forEach(output -> fill(output, bundle));
            }
        }

        @Override
        public void clear(boolean wait) {
            synchronized (notebook) {
                clearWaits = wait;
                if (!wait) {
                    clearNow();
                }
            }
        }

        /** Stores how the cell ended. */
        void end(int count, CellEnd end) {
            if (end instanceof CellEnd.Done done) {
                done.result().ifPresent(bundle -> {
                    JsonObject result = output(bundle, "execute_result");
                    result.addProperty("execution_count", count);
                    add(result);
                });
            } else if (end instanceof CellEnd.Failed failed) {
                add(error(failed.name(), failed.message(), failed.traceback()));
            } else if (end instanceof CellEnd.Interrupted interrupted) {
                add(error("Interrupted", "the cell was interrupted", interrupted.traceback()));
            }
        }

        private void add(JsonObject output) {
            synchronized (notebook) {
                clearIfWaiting();
                cell.outputs().add(output);
            }
        }

        private void clearIfWaiting() {
            if (clearWaits) {
                clearWaits = false;
                clearNow();
            }
        }

        private void clearNow() {
            while (!cell.outputs().isEmpty()) {
                cell.outputs().remove(cell.outputs().size() - 1);
            }
        }
    }
}
