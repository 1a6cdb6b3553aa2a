package sojourn.document;

import static org.assertj.core.api.Assertions.assertThat;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class SchemaTextTest {
    private static void schemaIs(Shape<?> shape, String json) throws IOException {
        JsonNode expected = new ObjectMapper().readTree(json.replace('\'', '"'));
        JsonNode actual = new ObjectMapper().readTree(JsonText.compact(shape.schema()));
        assertThat(actual).isEqualTo(expected);
    }

    @Test
    void everyKindOfShapeHasItsSchema() throws IOException {
        schemaIs(Shapes.number(), "{'type':'number'}");
        schemaIs(Shapes.number().atLeast(0).below(0.5), "{'type':'number','minimum':0,'exclusiveMaximum':0.5}");
        schemaIs(Shapes.number().above(-1).atMost(1), "{'type':'number','exclusiveMinimum':-1,'maximum':1}");
        schemaIs(Shapes.integer().atLeast(1), "{'type':'integer','minimum':1,'maximum':2147483647}");
        schemaIs(
                Shapes.longInteger(),
                "{'type':'integer','minimum':-9223372036854775808,'maximum':9223372036854775807}");
        schemaIs(Shapes.flag(), "{'type':'boolean'}");
        schemaIs(Shapes.text(), "{'type':'string','minLength':1}");
        schemaIs(Shapes.textLike("[a-z]+", "letters"), "{'type':'string','pattern':'^(?:[a-z]+)$'}");
        schemaIs(Shapes.word(List.of("b", "a"), w -> w), "{'type':'string','enum':['b','a']}");
        schemaIs(
                Shapes.list(Shapes.flag(), 1, 2),
                "{'type':'array','items':{'type':'boolean'},'minItems':1,'maxItems':2}");
        schemaIs(Shapes.list(Shapes.flag(), 0, Integer.MAX_VALUE), "{'type':'array','items':{'type':'boolean'}}");
        schemaIs(
                Shapes.named(Shapes.textLike("[a-z]", "a letter"), Shapes.flag()),
                "{'type':'object','minProperties':1,'propertyNames':{'type':'string','pattern':'^(?:[a-z])$'},"
                        + "'additionalProperties':{'type':'boolean'}}");
        schemaIs(
                Shapes.either(Shapes.flag(), Shapes.text()),
                "{'anyOf':[{'type':'boolean'},{'type':'string','minLength':1}]}");
        Map<String, Shape<? extends Object>> variants = new LinkedHashMap<>();
        variants.put("a", Shapes.flag());
        variants.put("b", Shapes.text());
        schemaIs(
                Shapes.<Object>oneKey(variants),
                "{'type':'object','minProperties':1,'maxProperties':1,'properties':{'a':{'type':'boolean'},"
                        + "'b':{'type':'string','minLength':1}},'additionalProperties':false}");
    }

    @Test
    void fieldsCarryHelpDefaultAndWhetherTheyMustBeThere() throws IOException {
        Field<String> a = Field.required("a", Shapes.text(), "the first");
        Field<Integer> b = Field.defaulted("b", Shapes.integer().atLeast(1).atMost(9), "3", "the second");
        Field<Optional<Boolean>> c = Field.maybe("c", Shapes.flag(), "the third");
        schemaIs(
                Shapes.object("abc", f -> f.get(a) + f.get(b) + f.get(c), a, b, c),
                "{'type':'object','properties':{'a':{'description':'the first','type':'string','minLength':1},"
                        + "'b':{'description':'the second','type':'integer','minimum':1,'maximum':9,'default':3},"
                        + "'c':{'description':'the third','type':'boolean'}},"
                        + "'required':['a'],'additionalProperties':false}");
    }

    @Test
    void rulesAndConversionsDoNotShow() {
        Shape<Double> plain = Shapes.number();
        assertThat(plain.refuse(d -> Optional.of(new Refusal("", "no", "no")))
                        .as(d -> d * 2)
                        .schema())
                .isEqualTo(plain.schema());
    }

    @Test
    void aFilesSchemaSaysItsDraftAndTitle() {
        assertThat(SchemaText.of("A strategy", Shapes.flag())).isEqualTo("""
                        {
                          "$schema": "https://json-schema.org/draft/2020-12/schema",
                          "title": "A strategy",
                          "type": "boolean"
                        }
                        """);
    }
}
