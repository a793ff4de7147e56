package org.hingeline.web.view;

import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
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

    /**
     * How the site stands: short as soon as one point is, else not known as soon as one is. A point without a limit alone
     * makes nothing unknown, unless there are only such.
     */
    public Standing standing() {
        if (count(Standing.SHORT) > 0) {
            return Standing.SHORT;
        }
        return count(Standing.FIT) > 0 && dark().isEmpty() ? Standing.FIT : Standing.UNKNOWN;
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
        List<PathPoint> dark = dark();
        List<PathPoint> unjudged = unjudged();
        if (bad.size() == 1) {
            words.append(bad.get(0).name())
                    .append(" is ")
                    .append(bad.get(0).verdict())
                    .append(". ");
        } else if (bad.size() > 1) {
            boolean alike = bad.stream().map(PathPoint::verdict).distinct().count() == 1;
            words.append(names(bad))
                    .append(" are ")
                    .append(alike ? bad.get(0).verdict() : "past your limits")
                    .append(". ");
        }
        if (dark.size() == path.size()) {
            return "Not known at any point.";
        }
        if (unjudged.size() == path.size()) {
            return "No limit is set at any point: nothing is judged and nobody is told.";
        }
        if (!dark.isEmpty()) {
            words.append("Not known at ").append(names(dark)).append(". ");
        }
        long fit = count(Standing.FIT);
        words.append(
                fit == 0
                        ? "The water is known to be fit nowhere."
                        : "Water fit at " + fit + " of " + path.size() + " points.");
        if (!unjudged.isEmpty()) {
            words.append(" No limit is set at ").append(names(unjudged)).append(".");
        }
        return words.toString();
    }

    /** Something to do now, and the points at which. */
    public record Call(String action, List<PathPoint> points) {
        public Call {
            points = List.copyOf(points);
        }
    }

    /** What is to be done now, most urgent first; the same at several points is said once. */
    public List<Call> calls() {
        Map<String, List<PathPoint>> byAction = path.stream()
                .filter(p -> !p.action().isEmpty())
                .sorted(Comparator.comparingInt(PathPoint::urgency).reversed())
                .collect(Collectors.groupingBy(PathPoint::action, LinkedHashMap::new, Collectors.toList()));
        return byAction.entrySet().stream()
                .map(e -> new Call(e.getKey(), e.getValue()))
                .toList();
    }

    private List<PathPoint> dark() {
        return path.stream()
                .filter(p -> p.standing() == Standing.UNKNOWN && !unjudged(p))
                .toList();
    }

    private List<PathPoint> unjudged() {
        return path.stream().filter(StatusView::unjudged).toList();
    }

    /** Known well enough, yet nothing to hold it against. */
    private static boolean unjudged(PathPoint point) {
        return point.standing() == Standing.UNKNOWN
                && !point.judged()
                && !point.omega().isEmpty();
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
