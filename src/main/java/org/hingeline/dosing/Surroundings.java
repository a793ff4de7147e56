package org.hingeline.dosing;

import java.util.List;
import java.util.Objects;
import java.util.Optional;
import org.jspecify.annotations.Nullable;

/**
 * Where the water is that a dose is asked for, and the other waters of the site.
 *
 * @param kind what it is itself
 * @param feedsFrom code of the point that its water comes from; null when that is not known
 * @param others waters of the other points, as far as they are known from fresh inputs
 */
public record Surroundings(WaterKind kind, @Nullable String feedsFrom, List<OtherWater> others) {
    public Surroundings {
        Objects.requireNonNull(kind, "kind");
        others = List.copyOf(others);
    }

    /** What it is fed from, or else the intake, if that is known. */
    Optional<OtherWater> feed() {
        return others.stream()
                .filter(o -> o.code().equals(feedsFrom))
                .findFirst()
                .or(() -> others.stream()
                        .filter(o -> feedsFrom == null && o.kind() == WaterKind.INTAKE)
                        .findFirst());
    }

    /** Waters that may be drawn from. */
    List<OtherWater> sources() {
        return others.stream().filter(o -> o.kind() != WaterKind.TANK).toList();
    }
}
