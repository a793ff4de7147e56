package org.hingeline.config;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import tools.jackson.core.JacksonException;
import tools.jackson.core.StreamReadFeature;
import tools.jackson.databind.DeserializationFeature;
import tools.jackson.databind.JsonNode;
import tools.jackson.dataformat.yaml.YAMLMapper;

/** YAML as the files of this program are read: one document, no key twice. */
final class YamlFile {
    private static final YAMLMapper YAML = YAMLMapper.builder()
            .enable(StreamReadFeature.STRICT_DUPLICATE_DETECTION)
            .enable(DeserializationFeature.FAIL_ON_TRAILING_TOKENS)
            .build();

    private YamlFile() {}

    /** @throws BadSettings when there is no such file, or it cannot be read */
    static String text(Path file) {
        try {
            return Files.readString(file);
        } catch (IOException unreadable) {
            throw new BadSettings(
                    file.toString(),
                    List.of("the file cannot be read (" + unreadable.getClass().getSimpleName()
                            + "); it must exist and be UTF-8 text"));
        }
    }

    /** @throws BadSettings when it is no YAML, or names a key twice; an empty text is no settings */
    static JsonNode parse(String source, String yaml) {
        try {
            JsonNode document = YAML.readTree(yaml);
            return document == null || document.isNull() || document.isMissingNode()
                    ? YAML.createObjectNode()
                    : document;
        } catch (JacksonException broken) {
            throw new BadSettings(source, List.of("this is not YAML: " + firstLineOf(broken)));
        }
    }

    /** The message without the piece of the source some parsers add to it, which may hold anything. */
    private static String firstLineOf(JacksonException broken) {
        String message =
                String.valueOf(broken.getOriginalMessage()).lines().findFirst().orElse("");
        return broken.getLocation() == null
                ? message
                : message + " (line " + broken.getLocation().getLineNr() + ")";
    }
}
