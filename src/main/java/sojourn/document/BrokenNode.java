package sojourn.document;

/**
 * A value that was refused while the text was read (a type tag, say), whose fault is already told: shapes pass over it
 * without a second message.
 *
 * @param place where it stands
 */
public record BrokenNode(Place place) implements Node {}
