package org.hingeline.web;

import io.javalin.http.Context;
import java.time.Duration;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.format.DateTimeParseException;
import java.util.List;

/** Times and spans of time in a query. */
final class Times {
    private Times() {}

    static Instant query(Context ctx, String name, Instant otherwise) {
        String text = ctx.queryParam(name);
        if (text == null || text.isBlank()) {
            return otherwise;
        }
        try {
            return OffsetDateTime.parse(text).toInstant();
        } catch (DateTimeParseException e) {
            throw wrong(
                    name, name + " \"" + text + "\" is not an ISO 8601 time with offset such as 2026-05-14T03:20:00Z");
        }
    }

    /** A step such as {@code PT10M}, at least a second and at most ten days; zero when absent. */
    static Duration step(Context ctx) {
        String text = ctx.queryParam("step");
        if (text == null || text.isBlank()) {
            return Duration.ZERO;
        }
        try {
            Duration step = Duration.parse(text);
            if (step.compareTo(Duration.ofSeconds(1)) >= 0 && step.compareTo(Duration.ofDays(10)) <= 0) {
                return step;
            }
        } catch (DateTimeParseException e) {
            // told below with what would be accepted
        }
        throw wrong("step", "step \"" + text + "\" is not an ISO 8601 duration from PT1S to P10D such as PT10M");
    }

    static void requireOrder(Instant from, Instant to) {
        if (!from.isBefore(to)) {
            throw wrong("from", "from " + from + " must be before to " + to);
        }
    }

    private static ProblemException wrong(String name, String detail) {
        return new ProblemException(Problem.ofFields(
                400, "Wrong query", detail, List.of(new Problem.FieldError("/query/" + name, detail))));
    }
}
