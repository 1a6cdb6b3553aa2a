/**
 * What did the user ask for? Strategy files go in; strategies come out, assembled from the sections that the packages above own,
 * with every fault told at its place. What a section means is left to its owner. Start with
 * {@link sojourn.strategy.StrategyReader}.
 */
@NullMarked
package sojourn.strategy;

import org.jspecify.annotations.NullMarked;
