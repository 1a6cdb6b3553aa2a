package sojourn.archive;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.util.Properties;

/** The version of this program, as the build wrote it down. */
public final class ProgramVersion {
    private ProgramVersion() {}

    /** For example {@code 0.1.0}. */
    public static String current() {
        Properties properties = new Properties();
        try (InputStream in = ProgramVersion.class.getResourceAsStream("/sojourn/version.properties")) {
            if (in == null) {
                throw new IllegalStateException("the build left out sojourn/version.properties");
            }
            properties.load(in);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        return properties.getProperty("version");
    }
}
