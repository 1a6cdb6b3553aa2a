package sojourn.document.shape;

import java.util.Map;
import sojourn.document.Field;
import sojourn.document.Fields;

/** The values of a map's fields; every declared field has one. */
record ReadFields(String name, Map<Field<?>, Object> values) implements Fields {
    @Override
    @SuppressWarnings("unchecked") // a field's value was read by the field's own shape
    public <T> T get(Field<T> field) {
        Object value = values.get(field);
        if (value == null) {
            throw new IllegalArgumentException(name + " does not declare key '" + field.key() + "'");
        }
        return (T) value;
    }
}
