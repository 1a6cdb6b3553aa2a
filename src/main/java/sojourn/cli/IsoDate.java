package sojourn.cli;

import java.time.LocalDate;
import java.time.format.DateTimeParseException;
import picocli.CommandLine.ITypeConverter;
import picocli.CommandLine.TypeConversionException;

/** Reads a date of the command line. */
final class IsoDate implements ITypeConverter<LocalDate> {
    @Override
    public LocalDate convert(String text) {
        try {
            return LocalDate.parse(text);
        } catch (DateTimeParseException e) {
            throw new TypeConversionException(
                    "'" + text + "' is no date of the calendar; write dates as yyyy-mm-dd, e.g. 2010-03-09");
        }
    }
}
