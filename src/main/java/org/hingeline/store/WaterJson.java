package org.hingeline.store;

import java.time.Duration;
import java.time.Instant;
import java.util.List;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.WaterState.InputUsed;
import org.hingeline.monitor.WaterState.MissingInput;
import org.hingeline.monitor.WaterState.Note;
import org.hingeline.quality.Flag;
import org.jspecify.annotations.Nullable;
import tools.jackson.core.type.TypeReference;
import tools.jackson.databind.json.JsonMapper;

/** The lists of a water state as they stand in its row. */
final class WaterJson {
    private static final JsonMapper MAPPER = JsonMapper.builder().build();

    private record Input(String q, double v, long at, String origin, String sensor, int flag) {}

    private record Missing(String q, @Nullable Long newestAt, long allowedS) {}

    private WaterJson() {}

    static String inputs(List<InputUsed> inputs) {
        return MAPPER.writeValueAsString(inputs.stream()
                .map(i -> new Input(
                        i.quantity().code(),
                        i.value(),
                        i.at().toEpochMilli(),
                        i.origin(),
                        i.sensor(),
                        i.flag().code()))
                .toList());
    }

    static List<InputUsed> inputs(String json) {
        return MAPPER.readValue(json, new TypeReference<List<Input>>() {}).stream()
                .map(i -> new InputUsed(
                        Quantity.ofCode(i.q()).orElseThrow(),
                        i.v(),
                        Instant.ofEpochMilli(i.at()),
                        i.origin(),
                        i.sensor(),
                        Flag.ofCode(i.flag())))
                .toList();
    }

    static String missing(List<MissingInput> missing) {
        return MAPPER.writeValueAsString(missing.stream()
                .map(m -> {
                    Instant newest = m.newestAt();
                    return new Missing(
                            m.quantity().code(),
                            newest == null ? null : newest.toEpochMilli(),
                            m.allowedAge().toSeconds());
                })
                .toList());
    }

    static List<MissingInput> missing(String json) {
        return MAPPER.readValue(json, new TypeReference<List<Missing>>() {}).stream()
                .map(m -> {
                    Long newest = m.newestAt();
                    return new MissingInput(
                            Quantity.ofCode(m.q()).orElseThrow(),
                            newest == null ? null : Instant.ofEpochMilli(newest),
                            Duration.ofSeconds(m.allowedS()));
                })
                .toList();
    }

    static String notes(List<Note> notes) {
        return notes.isEmpty() ? "[]" : MAPPER.writeValueAsString(notes);
    }

    static List<Note> notes(String json) {
        return json.equals("[]") ? List.of() : MAPPER.readValue(json, new TypeReference<List<Note>>() {});
    }
}
