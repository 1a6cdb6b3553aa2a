package sojourn.document;

/**
 * Why a value that has the right shape is refused all the same.
 *
 * @param key the key of the node at whose value the fault stands; empty for the node itself
 * @param what what is wrong, with the value
 * @param remedy what to do
 */
public record Refusal(String key, String what, String remedy) {}
