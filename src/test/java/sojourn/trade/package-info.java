/** Tests of fills, costs and books. */
@NullMarked
package sojourn.trade;

import org.jspecify.annotations.NullMarked;
