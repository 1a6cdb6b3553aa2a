package sojourn.market;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.CharBuffer;
import java.nio.charset.CharsetDecoder;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.InvalidPathException;
import java.nio.file.Path;
import java.util.Locale;
import java.util.Optional;
import sojourn.document.Problem;

/**
 * The text of a file in UTF-8, without a byte order mark. The only place of this package that touches files.
 *
 * @param file the file as the strategy file names it
 * @param text its characters
 * @param sha256 of its bytes, hexadecimal
 */
record TextFile(String file, String text, String sha256) {
    private static final long LARGEST = 512L << 20;
    private static final String SAVE_AS_TEXT = "save the table as a text file in UTF-8, cells separated by commas";

    /** Reads {@code file}, found from the folder {@code base}; empty, and one fault, if that cannot be done. */
    static Optional<TextFile> read(Path base, String file, Faults faults) {
        return read(base, file, "a path is taken from the folder of the strategy file", faults);
    }

    /** The same of a file that the command line names. */
    static Optional<TextFile> readFromHere(Path file, Faults faults) {
        return read(
                Path.of("").toAbsolutePath(),
                file.toString(),
                "a path on the command line is taken from the folder that the command runs in",
                faults);
    }

    private static Optional<TextFile> read(Path base, String file, String from, Faults faults) {
        try {
            Path path = base.resolve(file);
            Optional<Problem> obstacle = obstacle(file, path, from);
            if (obstacle.isPresent()) {
                faults.add(obstacle.get());
                return Optional.empty();
            }
            return decoded(file, Files.readAllBytes(path), faults);
        } catch (InvalidPathException e) {
            faults.add(new Problem(file, 0, 0, "this is no path: " + e.getReason(), "name a file"));
        } catch (IOException e) {
            faults.add(new Problem(
                    file,
                    0,
                    0,
                    "the file cannot be read: " + e.getMessage(),
                    "close programs that hold it, then try again"));
        }
        return Optional.empty();
    }

    private static Optional<Problem> obstacle(String file, Path path, String from) throws IOException {
        if (!Files.exists(path)) {
            return Optional.of(new Problem(
                    file, 0, 0, "there is no such file", "it was sought as " + path.normalize() + ": " + from));
        }
        if (Files.isDirectory(path)) {
            return Optional.of(new Problem(file, 0, 0, "this is a folder, not a file", "name a file in it"));
        }
        if (!Files.isRegularFile(path)) {
            return Optional.of(new Problem(file, 0, 0, "this is a device, not a file", "name a file"));
        }
        if (!Files.isReadable(path)) {
            return Optional.of(
                    new Problem(file, 0, 0, "the file may not be read", "give yourself the right to read it"));
        }
        if (Files.size(path) > LARGEST) {
            return Optional.of(new Problem(
                    file,
                    0,
                    0,
                    "the file has " + Files.size(path) + " bytes, more than 512 MiB",
                    "keep only the columns and dates that are needed"));
        }
        return Optional.empty();
    }

    /** Decodes {@code bytes}; a fault for bytes that are no text in UTF-8. Not modified. */
    static Optional<TextFile> decoded(String file, byte[] bytes, Faults faults) {
        CharsetDecoder decoder = StandardCharsets.UTF_8.newDecoder();
        ByteBuffer in = ByteBuffer.wrap(bytes);
        CharBuffer out = CharBuffer.allocate(bytes.length);
        boolean malformed = decoder.decode(in, out, true).isError();
        String decoded = out.flip().toString();
        String text = decoded.startsWith("\ufeff") ? decoded.substring(1) : decoded;
        int control = firstControl(text);
        if (control < text.length()) {
            String code = String.format(Locale.ROOT, "0x%02x", (int) text.charAt(control));
            faults.add(at(file, text.substring(0, control), "the file holds the byte " + code + ", which is no text"));
            return Optional.empty();
        }
        if (malformed) {
            String code = String.format(Locale.ROOT, "0x%02x", bytes[in.position()]);
            faults.add(at(file, text, "the byte " + code + " is not UTF-8"));
            return Optional.empty();
        }
        return Optional.of(new TextFile(file, text, Digest.ofFile(bytes)));
    }

    private static int firstControl(String text) {
        int i = 0;
        while (i < text.length() && (text.charAt(i) >= ' ' || "\t\n\r".indexOf(text.charAt(i)) >= 0)) {
            i++;
        }
        return i;
    }

    /** A fault right after {@code before}. */
    private static Problem at(String file, String before, String what) {
        int line = 1 + (int) before.chars().filter(c -> c == '\n').count();
        int column = before.length() - before.lastIndexOf('\n');
        return new Problem(file, line, column, what, SAVE_AS_TEXT);
    }
}
