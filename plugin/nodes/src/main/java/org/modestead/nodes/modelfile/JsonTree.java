package org.modestead.nodes.modelfile;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonGenerator;
import com.fasterxml.jackson.core.JsonParser;
import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.core.JsonToken;
import com.fasterxml.jackson.core.StreamReadConstraints;
import com.fasterxml.jackson.core.StreamReadFeature;
import com.fasterxml.jackson.core.StreamWriteFeature;
import com.fasterxml.jackson.core.json.JsonWriteFeature;
import com.fasterxml.jackson.core.util.DefaultIndenter;
import com.fasterxml.jackson.core.util.DefaultPrettyPrinter;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.modestead.engine.modelfile.ModelFileFault;
import org.modestead.engine.modelfile.Stored;

/**
 * The tree without its arrays as JSON: ASCII, two spaces, numbers with the fewest digits that give the same number back, so that the bytes
 * are the same in every Java. NaN and the infinities stand as texts, for JSON has no numbers for them.
 */
final class JsonTree {

    private static final int DEEPEST = 60;
    private static final int LONGEST_NAME = 200;

    private static final JsonFactory FACTORY = JsonFactory.builder()
            .enable(StreamWriteFeature.USE_FAST_DOUBLE_WRITER)
            .enable(JsonWriteFeature.ESCAPE_NON_ASCII)
            .enable(StreamReadFeature.STRICT_DUPLICATE_DETECTION)
            .streamReadConstraints(StreamReadConstraints.builder().maxNestingDepth(DEEPEST).maxNameLength(LONGEST_NAME).build())
            .build();

    private JsonTree() {}

    static byte[] write(Stored.Fields tree) {
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        try (JsonGenerator generator = FACTORY.createGenerator(out)) {
            generator.setPrettyPrinter(new DefaultPrettyPrinter().withObjectIndenter(new DefaultIndenter("  ", "\n")));
            write(tree, generator);
        } catch (IOException impossible) {
            throw new UncheckedIOException("memory does not fail", impossible);
        }
        out.write('\n');
        return out.toByteArray();
    }

    private static void write(Stored value, JsonGenerator out) throws IOException {
        if (value instanceof Stored.Fields fields) {
            out.writeStartObject();
            for (Map.Entry<String, Stored> field : fields.byName().entrySet()) {
                out.writeFieldName(field.getKey());
                write(field.getValue(), out);
            }
            out.writeEndObject();
        } else if (value instanceof Stored.Items list) {
            out.writeStartArray();
            for (Stored item : list.items()) {
                write(item, out);
            }
            out.writeEndArray();
        } else if (value instanceof Stored.Text text) {
            out.writeString(text.value());
        } else if (value instanceof Stored.Flag flag) {
            out.writeBoolean(flag.value());
        } else if (value instanceof Stored.Whole whole) {
            out.writeNumber(whole.value());
        } else if (value instanceof Stored.Number number) {
            write(number.value(), out);
        } else {
            throw new IllegalArgumentException("an array has an entry of its own");
        }
    }

    private static void write(double number, JsonGenerator out) throws IOException {
        if (Double.isFinite(number)) {
            out.writeNumber(number);
        } else {
            out.writeString(Double.toString(number));
        }
    }

    /** @throws ModelFileFault if the bytes are not JSON of fields by name, or nested too deep */
    static Stored.Fields read(byte[] json) {
        try (JsonParser parser = FACTORY.createParser(json)) {
            if (parser.nextToken() != JsonToken.START_OBJECT) {
                throw broken("fields by name are expected");
            }
            Stored.Fields out = fields(parser);
            if (parser.nextToken() != null) {
                throw broken("something follows the closing bracket");
            }
            return out;
        } catch (JsonProcessingException wrong) {
            throw broken("line " + (wrong.getLocation() == null ? 0 : wrong.getLocation().getLineNr()) + ": " + ModelFile.shortened(
                    String.valueOf(wrong.getOriginalMessage()).lines().findFirst().orElse("")));
        } catch (IOException unreadable) {
            throw broken(String.valueOf(unreadable.getMessage()));
        }
    }

    private static ModelFileFault broken(String seen) {
        return new ModelFileFault("model file, " + ModelFile.INDEX, "it is not the JSON that is expected (" + seen + ")",
                "take a file that was not changed");
    }

    private static Stored.Fields fields(JsonParser parser) throws IOException {
        Map<String, Stored> out = new LinkedHashMap<>();
        while (parser.nextToken() != JsonToken.END_OBJECT) {
            String name = parser.currentName();
            parser.nextToken();
            out.put(name, value(parser));
        }
        return new Stored.Fields(out);
    }

    private static Stored.Items items(JsonParser parser) throws IOException {
        List<Stored> out = new ArrayList<>();
        while (parser.nextToken() != JsonToken.END_ARRAY) {
            out.add(value(parser));
        }
        return new Stored.Items(out);
    }

    private static Stored value(JsonParser parser) throws IOException {
        return switch (parser.currentToken()) {
            case START_OBJECT -> fields(parser);
            case START_ARRAY -> items(parser);
            case VALUE_STRING -> new Stored.Text(parser.getText());
            case VALUE_TRUE -> new Stored.Flag(true);
            case VALUE_FALSE -> new Stored.Flag(false);
            case VALUE_NUMBER_INT -> new Stored.Whole(parser.getLongValue());
            case VALUE_NUMBER_FLOAT -> new Stored.Number(parser.getDoubleValue());
            default -> throw broken("line " + parser.currentLocation().getLineNr() + ": " + parser.currentToken());
        };
    }
}
