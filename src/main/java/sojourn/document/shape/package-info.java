/**
 * How one kind of value is read, written out and described: a class for each of the shapes that
 * {@link sojourn.document.Shapes} gives. A node of the tree goes in; a typed value or a problem comes out, and the JSON Schema of
 * what would have been right. Nobody but {@link sojourn.document} starts here.
 */
@NullMarked
package sojourn.document.shape;

import org.jspecify.annotations.NullMarked;
