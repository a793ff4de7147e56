package org.hingeline.monitor;

import org.jspecify.annotations.Nullable;

/**
 * A dose as a person says that it was given.
 *
 * @param key made by the sender, 8 to 80 characters; the same key again records nothing new
 * @param point code of the tank
 * @param at when it was put in, ISO 8601 with offset; now when absent
 * @param agent what was in the bag; the agent's code is needed here
 * @param massG as weighed, g
 * @param lot as printed on the bag
 * @param volumeL water in the tank, L; the point's own when absent
 * @param followedPlan whether a dose plan was followed; not when absent
 */
public record DoseEntry(
        @Nullable String key,
        @Nullable String point,
        @Nullable String at,
        DoseWish.@Nullable Agent agent,
        @Nullable Double massG,
        @Nullable String lot,
        @Nullable Double volumeL,
        @Nullable String note,
        @Nullable Boolean followedPlan) {}
