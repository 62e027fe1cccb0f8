package ladderwell.kernel.picture;

import java.io.ByteArrayOutputStream;
import java.nio.ByteBuffer;
import java.nio.charset.StandardCharsets;
import java.util.Base64;
import java.util.function.DoubleBinaryOperator;
import java.util.zip.CRC32;
import java.util.zip.Deflater;

/**
 * A signed field as a small PNG image that stands on any page: zero is clear, positive values are teal, negative ones vermilion with stripes, so that
 * the sign reads in grey too.
 */
final class Raster {
    private static final int STEPS = 120;
    private static final int TEAL = 0x0F7A78;
    private static final int RED = 0xD1495B;

    /** Pixels from one stripe to the next. */
    private static final int STRIPE = 6;

    private Raster() {}

    /**
     * An image element's source.
     *
     * @param field values between −1 and 1 at places 0 … 1 across and 0 … 1 upwards
     */
    static String source(int width, int height, DoubleBinaryOperator field) {
        byte[] rows = new byte[height * (width + 1)];
        for (int v = 0; v < height; v++) {
            for (int u = 0; u < width; u++) {
                double value = field.applyAsDouble((u + 0.5) / width, 1 - (v + 0.5) / height);
                int step = (int) Math.round(STEPS * Math.max(-1, Math.min(1, value)));
                if (step < 0 && (u + v) % STRIPE < STRIPE / 3) {
                    step = step / 3;
                }
                rows[v * (width + 1) + 1 + u] = (byte) (STEPS + step);
            }
        }
        ByteArrayOutputStream png = new ByteArrayOutputStream(rows.length / 3);
        png.writeBytes(new byte[] {(byte) 0x89, 'P', 'N', 'G', '\r', '\n', 0x1A, '\n'});
        chunk(
                png,
                "IHDR",
                ByteBuffer.allocate(13)
                        .putInt(width)
                        .putInt(height)
                        .put((byte) 8)
                        .put((byte) 3)
                        .array());
        int colours = 2 * STEPS + 1;
        byte[] palette = new byte[3 * colours];
        byte[] clearness = new byte[colours];
        for (int i = 0; i < colours; i++) {
            int rgb = i < STEPS ? RED : TEAL;
            palette[3 * i] = (byte) (rgb >> 16);
            palette[3 * i + 1] = (byte) (rgb >> 8);
            palette[3 * i + 2] = (byte) rgb;
            double size = Math.abs(i - STEPS) / (double) STEPS;
            // A little more ink for small values: fringes are what one looks for.
            clearness[i] = (byte) Math.round(245 * Math.pow(size, 0.75));
        }
        chunk(png, "PLTE", palette);
        chunk(png, "tRNS", clearness);
        chunk(png, "IDAT", packed(rows));
        chunk(png, "IEND", new byte[0]);
        return "data:image/png;base64," + Base64.getEncoder().encodeToString(png.toByteArray());
    }

    private static byte[] packed(byte[] rows) {
        Deflater deflater = new Deflater(9);
        deflater.setInput(rows);
        deflater.finish();
        ByteArrayOutputStream out = new ByteArrayOutputStream(rows.length / 3);
        byte[] part = new byte[8192];
        while (!deflater.finished()) {
            out.write(part, 0, deflater.deflate(part));
        }
        deflater.end();
        return out.toByteArray();
    }

    private static void chunk(ByteArrayOutputStream png, String name, byte[] content) {
        byte[] type = name.getBytes(StandardCharsets.US_ASCII);
        CRC32 check = new CRC32();
        check.update(type);
        check.update(content);
        png.writeBytes(ByteBuffer.allocate(4).putInt(content.length).array());
        png.writeBytes(type);
        png.writeBytes(content);
        png.writeBytes(ByteBuffer.allocate(4).putInt((int) check.getValue()).array());
    }
}
