/** Test fixtures that the tests of several packages share: worked cases and open data sets. */
@NullMarked
package sojourn;

import org.jspecify.annotations.NullMarked;
