/**
 * What do people read? Results go in; tables and plain sentences for a terminal come out, risk before return, the caution above every
 * figure. Figures are only formatted here, never computed. Start with {@link sojourn.report.ComparisonText}.
 */
@NullMarked
package sojourn.report;

import org.jspecify.annotations.NullMarked;
