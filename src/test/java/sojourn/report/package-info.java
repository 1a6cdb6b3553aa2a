@NullMarked
package sojourn.report;

import org.jspecify.annotations.NullMarked;
