package sojourn.trade;

import java.util.OptionalInt;

/**
 * One movement of cash.
 *
 * @param asset index in the price table; empty for movements that belong to no asset
 * @param amount money; positive comes in
 */
public record LedgerEntry(int bar, LedgerKind kind, OptionalInt asset, double amount) {}
