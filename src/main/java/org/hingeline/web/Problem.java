package org.hingeline.web;

import com.fasterxml.jackson.annotation.JsonInclude;
import java.util.List;
import org.hingeline.monitor.FieldFaultsException;
import org.jspecify.annotations.Nullable;

/**
 * An error as the API tells it, {@code application/problem+json} (RFC 9457).
 *
 * @param errors fields at fault, with what would be accepted
 */
@JsonInclude(JsonInclude.Include.NON_NULL)
record Problem(
        String type,
        String title,
        int status,
        String detail,
        @Nullable List<FieldError> errors) {

    /** A field at fault: where it stands (JSON pointer, RFC 6901) and what is wrong with it. */
    record FieldError(String pointer, String detail) {}

    static Problem of(int status, String title, String detail) {
        return new Problem("about:blank", title, status, detail, null);
    }

    static Problem ofFields(int status, String title, String detail, List<FieldError> errors) {
        return new Problem("about:blank", title, status, detail, List.copyOf(errors));
    }

    /** Fields that were read but cannot be taken. */
    static Problem of(FieldFaultsException e) {
        return ofFields(
                422,
                "Wrong fields",
                String.valueOf(e.getMessage()),
                e.faults().stream()
                        .map(fault ->
                                new FieldError(fault.field().isEmpty() ? "" : "/" + fault.field(), fault.detail()))
                        .toList());
    }
}
