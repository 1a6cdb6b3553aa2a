package sojourn.market;

import java.time.LocalDate;

/**
 * One file that went in.
 *
 * @param role the asset's name, {@code cash} or {@link GivenColumns#ROLE}
 * @param file the file as the strategy file names it
 * @param sha256 of its bytes, hexadecimal
 * @param rows rows that count (those with a price or a rate)
 * @param first the first of their dates
 * @param last the last of their dates
 * @param contentDigest of the dates and numbers read from it, hexadecimal, whatever the file's format and place
 */
public record InputFile(
        String role, String file, String sha256, int rows, LocalDate first, LocalDate last, String contentDigest) {}
