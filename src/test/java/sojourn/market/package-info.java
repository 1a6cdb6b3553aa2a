/** Tests of reading prices and of what may be seen of them. */
@NullMarked
package sojourn.market;

import org.jspecify.annotations.NullMarked;
