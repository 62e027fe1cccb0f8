package ladderwell.kernel.session;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.DataInputStream;
import java.io.DataOutputStream;
import java.io.IOException;
import java.util.HashMap;
import java.util.Map;

/**
 * Keeps {@code System.exit} in a cell from ending the kernel with all its values. Cells run in the kernel's own process,
 * and Java has no longer a way to refuse the call, so the cell's classes are made to call {@link #exit} instead. Calls
 * from libraries, and {@code Runtime.halt}, do end the process.
 */
public final class Exit {
    private static final int UTF8 = 1;
    private static final int CLASS = 7;
    private static final int METHOD = 10;
    private static final int NAME_AND_TYPE = 12;

    private Exit() {}

    /** Stands in for {@code System.exit} in cells. */
    public static void exit(int status) {
        throw new IllegalStateException(
                "System.exit(" + status + ") is not carried out in a cell; shut the kernel down in the client instead");
    }

    /** The class file with calls of {@code System.exit} turned into calls of {@link #exit}. */
    static byte[] replaced(byte[] classFile) {
        try {
            return new Pool(classFile).withExitReplaced();
        } catch (IOException e) {
            throw new IllegalArgumentException("not a class file", e);
        }
    }

    /** The constant pool of a class file, read as far as needed to find method references. */
    private static final class Pool {
        private final byte[] file;
        private final int count;
        private final int end;
        private final Map<Integer, String> texts = new HashMap<>();
        private final Map<Integer, Integer> classes = new HashMap<>();
        private final Map<Integer, int[]> namesAndTypes = new HashMap<>();
        /** For each method reference, where its class index stands in the file, its class and its name and type. */
        private final Map<Integer, int[]> methods = new HashMap<>();

        Pool(byte[] file) throws IOException {
            this.file = file;
            ByteArrayInputStream bytes = new ByteArrayInputStream(file);
            DataInputStream in = new DataInputStream(bytes);
            in.skipNBytes(8);
            count = in.readUnsignedShort();
            for (int i = 1; i < count; i++) {
                int tag = in.readUnsignedByte();
                int at = file.length - bytes.available();
                switch (tag) {
                    case UTF8 -> texts.put(i, in.readUTF());
                    case CLASS -> classes.put(i, in.readUnsignedShort());
                    case METHOD -> methods.put(i, new int[] {at, in.readUnsignedShort(), in.readUnsignedShort()});
                    case NAME_AND_TYPE ->
                        namesAndTypes.put(i, new int[] {in.readUnsignedShort(), in.readUnsignedShort()});
                    case 5, 6 -> { // long and double, which take two places
                        in.skipNBytes(8);
                        i++;
                    }
                    case 3, 4, 9, 11, 17, 18 -> in.skipNBytes(4); // numbers, fields, interface methods, dynamic
                    case 15 -> in.skipNBytes(3); // method handle
                    case 8, 16, 19, 20 -> in.skipNBytes(2); // string, method type, module, package
                    default -> throw new IOException("constant of kind " + tag);
                }
            }
            end = file.length - bytes.available();
        }

        byte[] withExitReplaced() throws IOException {
            byte[] head = file.clone();
            boolean found = false;
            for (int[] method : methods.values()) {
                if (isExit(method)) {
                    // The class entry to be added behind the last constant.
                    head[method[0]] = (byte) (count + 1 >> 8);
                    head[method[0] + 1] = (byte) (count + 1);
                    found = true;
                }
            }
            if (!found) {
                return file;
            }
            head[8] = (byte) (count + 2 >> 8);
            head[9] = (byte) (count + 2);
            ByteArrayOutputStream bytes = new ByteArrayOutputStream(file.length + 64);
            DataOutputStream out = new DataOutputStream(bytes);
            out.write(head, 0, end);
            out.writeByte(UTF8);
            out.writeUTF(Exit.class.getName().replace('.', '/'));
            out.writeByte(CLASS);
            out.writeShort(count);
            out.write(head, end, head.length - end);
            return bytes.toByteArray();
        }

        private boolean isExit(int[] method) {
            int[] nameAndType = namesAndTypes.getOrDefault(method[2], new int[] {0, 0});
            return "java/lang/System".equals(texts.get(classes.get(method[1])))
                    && "exit".equals(texts.get(nameAndType[0]))
                    && "(I)V".equals(texts.get(nameAndType[1]));
        }
    }
}
