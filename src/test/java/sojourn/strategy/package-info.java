/** Tests of reading strategy files: good ones, broken ones, and what is written out of them. */
@NullMarked
package sojourn.strategy;

import org.jspecify.annotations.NullMarked;
