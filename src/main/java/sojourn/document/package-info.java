/**
 * What is written where? YAML text goes in; a tree comes out in which every key and value knows its line and column.
 * A {@link sojourn.document.Shape} reads a tree into a typed value, writes it out resolved (defaults filled in), and
 * emits its JSON Schema, all from one declaration; {@link sojourn.document.Problems} collects every fault of the user's
 * input, so that all are told in one go. {@link sojourn.document.YamlText}, {@link sojourn.document.JsonText} and
 * {@link sojourn.document.SchemaText} write trees and schemas, the same bytes everywhere. What a setting means is left to
 * the package that acts on it. Start with {@link sojourn.document.Document} and {@link sojourn.document.Shapes}.
 */
@NullMarked
package sojourn.document;

import org.jspecify.annotations.NullMarked;
