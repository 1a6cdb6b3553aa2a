package sojourn.market;

import java.util.OptionalDouble;
import java.util.OptionalInt;
import sojourn.document.Problem;
import sojourn.market.CsvTable.Row;
import sojourn.market.Faults.Kind;

/**
 * One column of a price file, by the key that the strategy file knows it by.
 *
 * @param key open, high, low, close, volume, dividend or split
 * @param index where the file has it, if it has it
 * @param bound what its numbers must keep to
 */
record PriceColumn(String key, OptionalInt index, Bound bound) {
    /** Ratios of any two numbers between these, and the squares of such ratios, stay within double precision. */
    private static final double LEAST = 1e-30;

    private static final double MOST = 1e30;

    /** What a number must keep to. */
    enum Bound {
        ANY("") {
            @Override
            boolean allows(double number) {
                return true;
            }
        },
        ABOVE_ZERO("is not above 0") {
            @Override
            boolean allows(double number) {
                return number > 0;
            }
        },
        NOT_BELOW_ZERO("is below 0") {
            @Override
            boolean allows(double number) {
                return number >= 0;
            }
        };

        private final String fault;

        Bound(String fault) {
            this.fault = fault;
        }

        abstract boolean allows(double number);
    }

    /** Whether the file has the column. */
    boolean present() {
        return index.isPresent();
    }

    /** The text of the column's cell; empty if the file has no such column. */
    String text(Row row) {
        return index.isPresent() ? row.cell(index.getAsInt()) : "";
    }

    /** The number in the column's cell; NaN if there is none; empty, and a fault, for what is no price or volume. */
    OptionalDouble read(Row row, Faults faults) {
        String text = text(row);
        if (text.isEmpty()) {
            return OptionalDouble.of(Double.NaN);
        }
        OptionalDouble number = Decimal.parse(text);
        if (number.isEmpty()) {
            Decimal.Meant meant = Decimal.meant(text);
            String what = key + " '" + text + "' is not a number";
            faults.add(at(row, what, Decimal.remedy(text)), kind(meant.name()), meant.remedy());
        } else if (Double.isInfinite(number.getAsDouble())) {
            String remedy = "mend the number";
            faults.add(at(row, key + " " + text + " is too large", remedy), kind("size"), remedy);
        } else if (number.getAsDouble() != 0
                && (Math.abs(number.getAsDouble()) < LEAST || Math.abs(number.getAsDouble()) > MOST)) {
            String remedy = "write prices and volumes between 1e-30 and 1e30, in another unit if need be";
            faults.add(at(row, key + " " + text + " is beyond any price or volume", remedy), kind("size"), remedy);
        } else if (!bound.allows(number.getAsDouble())) {
            String remedy = "mend it, or leave the cell empty if there is none" + ofLevels();
            faults.add(at(row, key + " " + text + " " + bound.fault, remedy), kind("bound"), remedy);
        } else {
            return number;
        }
        return OptionalDouble.empty();
    }

    /** A series counts as an asset, whose prices are above 0, if anything but its changes is asked for. */
    private String ofLevels() {
        return key.equals("close")
                ? "; a rate or a spread may be at or below 0 where only 'change' of it is observed and 'order-by' names another series"
                : "";
    }

    private Problem at(Row row, String what, String remedy) {
        return row.problem(index.orElse(0), what, remedy);
    }

    private Kind kind(String name) {
        return new Kind(name, index.orElse(0));
    }
}
