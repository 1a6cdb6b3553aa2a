/** Tests of tables, digests and result folders. */
@NullMarked
package sojourn.archive;

import org.jspecify.annotations.NullMarked;
