package org.hingeline.hatchery;

import java.time.Duration;
import org.jspecify.annotations.Nullable;

/**
 * A monitoring point: where water is measured.
 *
 * @param position order along the water's path, smallest first
 * @param feedsFrom code of the point the water comes from, if any
 * @param volumeL volume of the water held there in litres, above 0 and at most 10,000,000, if it is a tank
 * @param maxGap longest time without a usable value before the point counts as silent
 */
public record Point(
        long id,
        long siteId,
        String code,
        String name,
        PointKind kind,
        int position,
        @Nullable String feedsFrom,
        @Nullable Double volumeL,
        Duration maxGap) {

    public static final double MAX_VOLUME_L = 10_000_000;

    public Point {
        Codes.check("point code", code);
        Codes.checkName("point name", name);
        if (volumeL != null && !(volumeL > 0 && volumeL <= MAX_VOLUME_L)) {
            throw new IllegalArgumentException("volumeL " + volumeL + " must be above 0 and at most " + MAX_VOLUME_L);
        }
        if (maxGap.isNegative() || maxGap.isZero() || maxGap.compareTo(Duration.ofDays(31)) > 0) {
            throw new IllegalArgumentException(
                    "maxGapMin " + maxGap.toSeconds() / 60.0 + " must be above 0 and at most 44640 (31 days)");
        }
    }
}
