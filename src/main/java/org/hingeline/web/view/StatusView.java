package org.hingeline.web.view;

import java.util.List;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;

/**
 * The water of a whole site.
 *
 * @param strip the intake over the last day; null when the site has no intake
 * @param path every point in the order the water takes: intake, storage, header, tanks, discharge
 */
public record StatusView(@Nullable TideStrip strip, List<PathPoint> path) {
    public StatusView {
        path = List.copyOf(path);
    }

    /** How the site stands: short as soon as one point is, else not known as soon as one is. */
    public Standing standing() {
        if (count(Standing.SHORT) > 0) {
            return Standing.SHORT;
        }
        return path.isEmpty() || count(Standing.UNKNOWN) > 0 ? Standing.UNKNOWN : Standing.FIT;
    }

    /** The site in one or two sentences: "Larval 3 is short of carbonate. Water fit at 5 of 6 points." */
    public String headline() {
        if (path.isEmpty()) {
            return "No points are set up yet.";
        }
        if (count(Standing.FIT) == path.size()) {
            return path.size() == 1 ? "The water is fit." : "The water is fit at all " + path.size() + " points.";
        }
        StringBuilder words = new StringBuilder();
        List<PathPoint> bad =
                path.stream().filter(p -> p.standing() == Standing.SHORT).toList();
        List<PathPoint> dark =
                path.stream().filter(p -> p.standing() == Standing.UNKNOWN).toList();
        if (bad.size() == 1) {
            words.append(bad.get(0).name())
                    .append(" is ")
                    .append(bad.get(0).verdict())
                    .append(". ");
        } else if (bad.size() > 1) {
            words.append(names(bad)).append(" are past your limits. ");
        }
        if (dark.size() == path.size()) {
            return "Not known at any point.";
        }
        if (!dark.isEmpty()) {
            words.append("Not known at ").append(names(dark)).append(". ");
        }
        long fit = count(Standing.FIT);
        return words.append(
                        fit == 0
                                ? "The water is fit nowhere."
                                : "Water fit at " + fit + " of " + path.size() + " points.")
                .toString();
    }

    /** The points at which something is to be done now. */
    public List<PathPoint> toDo() {
        return path.stream().filter(p -> !p.action().isEmpty()).toList();
    }

    private long count(Standing standing) {
        return path.stream().filter(p -> p.standing() == standing).count();
    }

    private static String names(List<PathPoint> points) {
        if (points.size() > 3) {
            return points.size() + " points";
        }
        List<String> names = points.stream().map(PathPoint::name).toList();
        int last = names.size() - 1;
        return last == 0
                ? names.get(0)
                : names.stream().limit(last).collect(Collectors.joining(", ")) + " and " + names.get(last);
    }
}
