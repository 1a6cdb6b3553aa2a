package sojourn.cli;

import picocli.CommandLine.ITypeConverter;
import picocli.CommandLine.TypeConversionException;
import sojourn.compare.WhichPaths;

/** Reads {@code all}, {@code best:N} or {@code none}. */
final class PathChoice implements ITypeConverter<WhichPaths> {
    @Override
    public WhichPaths convert(String text) {
        if (text.isEmpty()) {
            return WhichPaths.byDefault();
        }
        if (text.equals("all")) {
            return WhichPaths.all();
        }
        if (text.equals("none")) {
            return WhichPaths.best(0);
        }
        if (text.matches("best:[1-9][0-9]{0,6}")) {
            return WhichPaths.best(Integer.parseInt(text.substring("best:".length())));
        }
        throw new TypeConversionException("'" + text + "' is none of all, best:N (N from 1), none");
    }
}
