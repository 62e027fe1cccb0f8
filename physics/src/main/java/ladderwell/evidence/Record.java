package ladderwell.evidence;

import java.nio.charset.StandardCharsets;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import ladderwell.quantity.Constants;
import ladderwell.quantity.Quantity;

/**
 * How a result came about: what was asked, by which method, at which sizes, with which versions, and how sure it is.
 *
 * <p>Immutable. Its text is canonical JSON (RFC 8785), so the same content has the same bytes whatever the machine, the
 * locale, the Java version or the order in which it was put together. Two records with the same {@link #hash} asked the
 * same question.
 *
 * <p>Values may be texts, booleans, finite numbers (whole ones up to 2⁵³), {@link Quantity}, {@link Bound},
 * {@link Tolerance}, and lists and string-keyed maps of these. A quantity reads {"unit":"MHz","value":1.2}, a bound
 * {"kind":"g","size":1e-9} (size "unknown" if infinite), a tolerance {"kind":"absolute","name":"state","unit":"","value":1e-9}.
 */
@SuppressWarnings("JavaLangClash") // the trade's word; java.lang.Record is never named in this code base
public final class Record {

    private static final long FORMAT = 1;
    private static final List<String> SECTIONS = List.of("asked", "bounds", "method", "sizes", "versions");

    private final Map<String, Object> sections;
    private final String json;
    private final String hash;

    private Record(Map<String, Object> sections) {
        this.sections = sections;
        this.json = CanonicalJson.write(sections);
        this.hash = sha256(CanonicalJson.write(section("asked")));
    }

    /** An empty record to fill; versions already name Ladderwell, the constants and the format. */
    public static Builder builder() {
        return new Builder();
    }

    /**
     * Reads a record back; the text need not be canonical.
     *
     * @throws IllegalArgumentException if the text is not JSON, not a record, or of a format this version does not know
     */
    public static Record parse(String json) {
        if (!(CanonicalJson.read(json) instanceof Map<?, ?> root)) {
            throw new IllegalArgumentException("a record is a JSON object with the sections " + SECTIONS);
        }
        Map<String, Object> sections = new TreeMap<>();
        for (String name : SECTIONS) {
            if (!(root.get(name) instanceof Map<?, ?> section)) {
                throw new IllegalArgumentException(
                        "a record has the sections " + SECTIONS + "; '" + name + "' is missing");
            }
            sections.put(name, section);
        }
        for (Object name : root.keySet()) {
            if (!sections.containsKey(String.valueOf(name))) {
                throw new IllegalArgumentException(
                        "a record has the sections " + SECTIONS + ", and not '" + name + "'");
            }
        }
        Object format = root.get("versions") instanceof Map<?, ?> versions ? versions.get("record") : null;
        if (!(format instanceof Double number) || number != FORMAT) {
            throw new IllegalArgumentException("this record is of format " + format + "; version " + Version.current()
                    + " reads format " + FORMAT);
        }
        return new Record(Map.copyOf(sections));
    }

    /** The canonical text. */
    public String json() {
        return json;
    }

    /** The canonical text as UTF-8, a fresh array. */
    public byte[] bytes() {
        return json.getBytes(StandardCharsets.UTF_8);
    }

    /** SHA-256 of the canonical text of what was asked, 64 hexadecimal digits. */
    public String hash() {
        return hash;
    }

    /** The first 12 digits of {@link #hash}, to print. */
    public String shortHash() {
        return hash.substring(0, 12);
    }

    /** What was asked; numbers as Double, texts, booleans, lists and maps. Unmodifiable. */
    public Map<String, Object> asked() {
        return section("asked");
    }

    /** Which method ran and why. Unmodifiable. */
    public Map<String, Object> method() {
        return section("method");
    }

    /** Sizes that were chosen: levels, points, steps. Unmodifiable. */
    public Map<String, Object> sizes() {
        return section("sizes");
    }

    /** Versions of the tool, the constants and the format. Unmodifiable. */
    public Map<String, Object> versions() {
        return section("versions");
    }

    /** The bounds by name, as written. Unmodifiable. */
    public Map<String, Object> bounds() {
        return section("bounds");
    }

    /**
     * The bound of one name.
     *
     * @throws IllegalArgumentException if the record has none of this name
     */
    public Bound bound(String name) {
        Object written = bounds().get(name);
        if (written instanceof Map<?, ?> fields && fields.get("kind") instanceof String letter) {
            Object size = fields.get("size");
            for (Certainty kind : Certainty.values()) {
                if (kind.letter().equals(letter)) {
                    if (size instanceof Double number) {
                        return new Bound(kind, number);
                    }
                    if ("unknown".equals(size)) {
                        return new Bound(kind, Double.POSITIVE_INFINITY);
                    }
                }
            }
        }
        throw new IllegalArgumentException(
                "the record has no bound '" + name + "'; it has " + new TreeMap<>(bounds()).keySet());
    }

    @SuppressWarnings("unchecked") // every section was frozen as a map with text keys
    private Map<String, Object> section(String name) {
        return (Map<String, Object>) sections.getOrDefault(name, Map.of());
    }

    /** Same content. */
    @Override
    public boolean equals(Object other) {
        return other instanceof Record record && record.json.equals(json);
    }

    @Override
    public int hashCode() {
        return json.hashCode();
    }

    /** The canonical text. */
    @Override
    public String toString() {
        return json;
    }

    private static String sha256(String text) {
        try {
            return HexFormat.of()
                    .formatHex(MessageDigest.getInstance("SHA-256").digest(text.getBytes(StandardCharsets.UTF_8)));
        } catch (NoSuchAlgorithmException e) {
            throw new IllegalStateException("every Java platform must offer SHA-256", e);
        }
    }

    /** Collects a record; the order of calls does not matter, and a key is given once. */
    public static final class Builder {

        private final Map<String, Map<String, Object>> sections = new TreeMap<>();

        private Builder() {
            SECTIONS.forEach(name -> sections.put(name, new TreeMap<>()));
            version("ladderwell", Version.current().number());
            version("constants", Constants.EDITION);
            put("versions", "record", FORMAT);
        }

        /**
         * One item of what was asked.
         *
         * @throws IllegalArgumentException for a value no record can hold, or a key that is there already
         */
        public Builder asked(String key, Object value) {
            return put("asked", key, value);
        }

        /**
         * One item about the method.
         *
         * @throws IllegalArgumentException for a value no record can hold, or a key that is there already
         */
        public Builder method(String key, Object value) {
            return put("method", key, value);
        }

        /** One chosen size. */
        public Builder size(String key, long value) {
            return put("sizes", key, value);
        }

        /** One chosen size that is not a whole number, such as a step or an extent. */
        public Builder size(String key, Quantity value) {
            return put("sizes", key, value);
        }

        /** The bound of one named number. */
        public Builder bound(String key, Bound value) {
            return put("bounds", key, value);
        }

        /** The version of something else that the result rests on. */
        public Builder version(String key, String value) {
            return put("versions", key, value);
        }

        private Builder put(String section, String key, Object value) {
            Map<String, Object> entries = sections.get(section);
            if (entries == null) {
                throw new IllegalStateException("no section " + section);
            }
            String path = section + "." + key;
            if (entries.putIfAbsent(CanonicalJson.text(path, key), CanonicalJson.freeze(path, value)) != null) {
                throw new IllegalArgumentException("'" + path + "' is already in the record");
            }
            return this;
        }

        /** The record so far; the builder may go on. */
        public Record build() {
            Map<String, Object> copy = new TreeMap<>();
            sections.forEach((name, entries) -> copy.put(name, Map.copyOf(entries)));
            return new Record(Map.copyOf(copy));
        }
    }
}
