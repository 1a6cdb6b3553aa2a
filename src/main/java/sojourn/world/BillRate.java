package sojourn.world;

import java.time.LocalDate;

/**
 * A published bill rate.
 *
 * @param date from when it holds
 * @param percentPerYear the rate, percent a year
 */
public record BillRate(LocalDate date, double percentPerYear) {}
