package org.hingeline.monitor;

import org.jspecify.annotations.Nullable;

/**
 * A row as a gateway sent it, read but not yet judged.
 *
 * @param index its place in the batch, from 0
 * @param value as sent, in {@code unit}
 * @param at as sent, ISO 8601 with offset
 * @param fault what already failed while reading the row, in words; then the other fields may be absent
 * @param text the row as sent, for the record of refused rows
 */
public record IncomingReading(
        int index,
        @Nullable String point,
        @Nullable String quantity,
        @Nullable Double value,
        @Nullable String at,
        @Nullable String unit,
        @Nullable String sensor,
        @Nullable String fault,
        String text) {}
