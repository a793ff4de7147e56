package org.hingeline.web;

import io.javalin.config.RoutesConfig;
import io.javalin.http.Context;
import java.time.Duration;
import java.time.Instant;
import java.time.ZoneId;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import org.hingeline.alert.Priority;
import org.hingeline.hatchery.Point;
import org.hingeline.hatchery.PointKind;
import org.hingeline.hatchery.Site;
import org.hingeline.measure.Quantity;
import org.hingeline.monitor.Accounts;
import org.hingeline.monitor.FieldFaults;
import org.hingeline.monitor.FieldFaultsException;
import org.hingeline.monitor.PeopleBook.Subscriber;
import org.hingeline.monitor.PlaceDesk;
import org.hingeline.monitor.PlacePlan;
import org.hingeline.monitor.Role;
import org.hingeline.seawater.PhScale;
import org.hingeline.web.view.Choice;
import org.hingeline.web.view.Form;
import org.hingeline.web.view.Moment;
import org.hingeline.web.view.SetupSections;
import org.hingeline.web.view.SetupView;
import org.hingeline.web.view.SetupView.Row;
import org.hingeline.web.view.SetupView.Section;
import org.hingeline.web.view.SetupView.ShownOnce;
import org.jspecify.annotations.Nullable;

/** Setting the site up: points, sensors, keys, tokens, people, subscribers. For managers. */
final class SetupPages {
    private final PlaceDesk place;
    private final Accounts accounts;
    private final PageMaker pages;

    SetupPages(PlaceDesk place, Accounts accounts, PageMaker pages) {
        this.place = place;
        this.accounts = accounts;
        this.pages = pages;
    }

    void addTo(RoutesConfig routes) {
        routes.get(
                "/setup",
                ctx -> page(ctx, 200, "", Form.empty(), null, Flash.take(ctx).notice()),
                Gate.MANAGER);
        routes.post("/setup/{section}", this::add, Gate.MANAGER);
        routes.post("/setup/{section}/{key}/removal", this::remove, Gate.MANAGER);
    }

    private void page(
            Context ctx, int status, String section, Form refused, @Nullable ShownOnce shownOnce, String notice) {
        Site site = Visit.of(ctx).site();
        List<Point> points = place.points(site);
        List<Choice> pointChoices =
                points.stream().map(p -> new Choice(p.code(), p.name())).toList();
        List<Section> sections = List.of(
                SetupSections.points(pointRows(points), form(section, "points", refused, Map.of("maxGapMin", "15"))),
                SetupSections.sensors(
                        sensorRows(site, points), pointChoices, form(section, "sensors", refused, Map.of())),
                SetupSections.gatewayKeys(keyRows(site), form(section, "gateway-keys", refused, Map.of())),
                SetupSections.subscribers(subscriberRows(site), form(section, "subscribers", refused, Map.of())),
                SetupSections.people(peopleRows(site), form(section, "people", refused, Map.of())),
                SetupSections.accessTokens(tokenRows(site), form(section, "access-tokens", refused, Map.of())));
        pages.show(ctx, status, "setup", "setup", new SetupView(sections, shownOnce), notice);
    }

    private static Form form(String refusedSection, String section, Form refused, Map<String, String> start) {
        return refusedSection.equals(section) ? refused : Form.of(start);
    }

    private void add(Context ctx) {
        String section = ctx.pathParam("section");
        try {
            ShownOnce shown = save(ctx, section);
            if (shown != null) {
                // not redirected: the secret is shown in this answer and nowhere else
                page(ctx, 200, "", Form.empty(), shown, "");
                return;
            }
            new Flash("Saved.", null).leave(ctx);
            ctx.redirect(pages.link(ctx, "/setup#" + section));
        } catch (FieldFaultsException e) {
            page(ctx, 422, section, Forms.refused(ctx, e), null, "");
        } catch (IllegalArgumentException e) {
            page(ctx, 422, section, Forms.refused(ctx, Forms.ofField(ctx, e)), null, "");
        }
    }

    private @Nullable ShownOnce save(Context ctx, String section) {
        Visit visit = Visit.of(ctx);
        Site site = visit.site();
        String who = visit.caller().name();
        switch (section) {
            case "points" -> place.savePoint(site, point(ctx, place.points(site)), who);
            case "sensors" -> place.saveSensor(site, sensor(ctx), who);
            case "subscribers" -> place.saveSubscriber(site, subscriber(ctx), true, who);
            case "people" -> {
                String name = Forms.text(ctx, "name");
                String password = Optional.ofNullable(ctx.formParam("password")).orElse("");
                accounts.savePerson(site, name, name, password, role(ctx), who);
            }
            case "gateway-keys" -> {
                String gateway = Forms.text(ctx, "name");
                requireNamed(gateway);
                return new ShownOnce(
                        section,
                        "Gateway key \u201c" + gateway + "\u201d",
                        accounts.makeGatewayKey(site, gateway, who));
            }
            case "access-tokens" -> {
                String name = Forms.text(ctx, "name");
                requireNamed(name);
                return new ShownOnce(
                        section,
                        "Access token \u201c" + name + "\u201d",
                        accounts.makeAccessToken(site, name, role(ctx), who));
            }
            default -> throw noSuchSection(section);
        }
        return null;
    }

    private void remove(Context ctx) {
        Visit visit = Visit.of(ctx);
        String section = ctx.pathParam("section");
        String key = ctx.pathParam("key");
        String who = visit.caller().name();
        switch (section) {
            case "gateway-keys" -> accounts.revokeGatewayKey(visit.site(), number(key), who);
            case "access-tokens" -> accounts.revokeAccessToken(visit.site(), number(key), who);
            case "subscribers" ->
                place.subscribers(visit.site()).stream()
                        .filter(s -> s.code().equals(key) && s.active())
                        .findFirst()
                        .ifPresent(s -> place.saveSubscriber(
                                visit.site(),
                                new PlacePlan.SubscriberPlan(s.code(), s.name(), s.email(), s.minPriority()),
                                false,
                                who));
            default -> throw noSuchSection(section);
        }
        new Flash("Done.", null).leave(ctx);
        ctx.redirect(pages.link(ctx, "/setup#" + section));
    }

    private static long number(String key) {
        try {
            return Long.parseLong(key);
        } catch (NumberFormatException e) {
            throw new ProblemException(404, "No such key", "there is no key " + key);
        }
    }

    private static ProblemException noSuchSection(String section) {
        return new ProblemException(404, "No such section", "there is nothing to set up called " + section);
    }

    private static void requireNamed(String name) {
        if (name.isEmpty() || name.length() > 80) {
            throw new FieldFaultsException("name", "a name of 1 to 80 characters is needed");
        }
    }

    private static PlacePlan.PointPlan point(Context ctx, List<Point> known) {
        FieldFaults faults = new FieldFaults();
        String code = Forms.text(ctx, "code");
        Optional<PointKind> kind = PointKind.ofCode(Forms.text(ctx, "place"));
        if (kind.isEmpty()) {
            faults.add("place", "choose one of " + PointKind.codes());
        }
        Double volumeL = Forms.number(ctx, "volumeL", faults);
        Double maxGapMin = Forms.number(ctx, "maxGapMin", faults);
        faults.throwIfAny();
        // a new point comes after the last of its kind, a known one stays where it is and fed as it was
        Optional<Point> before =
                known.stream().filter(p -> p.code().equals(code)).findFirst();
        int position = before.map(Point::position)
                .orElseGet(() -> known.stream()
                                .filter(p -> p.kind().compareTo(kind.orElseThrow()) <= 0)
                                .mapToInt(Point::position)
                                .max()
                                .orElse(0)
                        + 1);
        return new PlacePlan.PointPlan(
                code,
                Forms.text(ctx, "name"),
                kind.orElseThrow(),
                position,
                before.map(Point::feedsFrom).orElse(null),
                volumeL,
                Duration.ofSeconds(Math.round((maxGapMin == null ? 15 : maxGapMin) * 60)));
    }

    private static PlacePlan.SensorPlan sensor(Context ctx) {
        FieldFaults faults = new FieldFaults();
        Optional<Quantity> quantity = Quantity.ofCode(Forms.text(ctx, "quantity"));
        if (quantity.isEmpty()) {
            faults.add("quantity", "choose one of " + Quantity.measuredCodes());
        }
        String scale = Forms.text(ctx, "phScale");
        Double uncertainty = Forms.number(ctx, "standardUncertainty", faults);
        faults.throwIfAny();
        Quantity measured = quantity.orElseThrow();
        String unit = Forms.text(ctx, "unit");
        return new PlacePlan.SensorPlan(
                Forms.text(ctx, "point"),
                Forms.text(ctx, "code"),
                measured,
                unit.isEmpty() ? measured.unit().ucum() : unit,
                PhScale.fromWireName(scale).orElse(null),
                uncertainty == null ? standardUncertainty(measured) : uncertainty,
                null);
    }

    /** What is taken when nothing is said (Orr et al. 2018 for the inputs of a water state; else common practice). */
    private static double standardUncertainty(Quantity quantity) {
        return switch (quantity) {
            case PH -> 0.02;
            case TEMPERATURE, SALINITY, CONDUCTIVITY -> 0.1;
            case TOTAL_ALKALINITY, DIC, PCO2 -> 10;
            default -> 0.1;
        };
    }

    private static PlacePlan.SubscriberPlan subscriber(Context ctx) {
        String name = Forms.text(ctx, "name");
        String code =
                name.toLowerCase(Locale.ROOT).replaceAll("[^a-z0-9]+", "-").replaceAll("^-+|-+$", "");
        if (code.isEmpty()) {
            throw new FieldFaultsException("name", "a name with at least one letter a to z or digit is needed");
        }
        Priority priority = Priority.ofCode(Forms.text(ctx, "priority"))
                .orElseThrow(() -> new FieldFaultsException("priority", "choose one of " + Priority.codes()));
        if (!PlacePlan.SubscriberPlan.isAddress(Forms.text(ctx, "email"))) {
            throw new FieldFaultsException(
                    "email", "\u201c" + Forms.text(ctx, "email") + "\u201d is not an address such as ana@example.org");
        }
        return new PlacePlan.SubscriberPlan(
                code.length() > 40 ? code.substring(0, 40) : code, name, Forms.text(ctx, "email"), priority);
    }

    private static Role role(Context ctx) {
        return Role.ofCode(Forms.text(ctx, "role"))
                .orElseThrow(() -> new FieldFaultsException("role", "choose one of " + Role.codes()));
    }

    private static List<Row> pointRows(List<Point> points) {
        return points.stream()
                .map(p -> {
                    Double volumeL = p.volumeL();
                    return new Row(
                            p.name(),
                            "code " + p.code() + ", " + p.kind().words().toLowerCase(Locale.ROOT)
                                    + (volumeL == null ? "" : ", " + Words.number(volumeL, 0) + "\u00a0L")
                                    + ", silent after " + Moment.span(p.maxGap()),
                            "",
                            "");
                })
                .toList();
    }

    private List<Row> sensorRows(Site site, List<Point> points) {
        return place.sensors(site).stream()
                .map(s -> {
                    PhScale scale = s.phScale();
                    String point = points.stream()
                            .filter(p -> p.id() == s.pointId())
                            .map(Point::name)
                            .findFirst()
                            .orElse("");
                    return new Row(
                            s.code(),
                            s.quantity().words() + " at " + point + unit(s.unit())
                                    + (scale == null ? "" : ", " + scale.wireName() + " scale") + ", \u00b1"
                                    + Words.plain(s.standardUncertainty()),
                            "",
                            "");
                })
                .toList();
    }

    /** Unless it is a bare number, as of pH and salinity. */
    private static String unit(String unit) {
        return unit.equals("1") || unit.equals("[pH]") ? "" : ", in " + unit;
    }

    private List<Row> keyRows(Site site) {
        Instant now = pages.now();
        return accounts.gatewayKeys(site).stream()
                .map(key -> {
                    Instant heard = key.lastHeardAt();
                    boolean revoked = key.revokedAt() != null;
                    return new Row(
                            key.gateway(),
                            revoked
                                    ? "withdrawn"
                                    : heard == null
                                            ? "never heard"
                                            : "heard "
                                                    + Moment.of(heard, now, site.zone())
                                                            .age(),
                            revoked ? "" : String.valueOf(key.id()),
                            revoked ? "" : "Withdraw");
                })
                .toList();
    }

    private List<Row> tokenRows(Site site) {
        ZoneId zone = site.zone();
        return accounts.accessTokens(site).stream()
                .map(token -> {
                    boolean revoked = token.revokedAt() != null;
                    return new Row(
                            token.name(),
                            token.role().code() + ", made "
                                    + Moment.of(token.createdAt(), pages.now(), zone)
                                            .clock()
                                    + (revoked ? ", withdrawn" : ""),
                            revoked ? "" : String.valueOf(token.id()),
                            revoked ? "" : "Withdraw");
                })
                .toList();
    }

    private List<Row> peopleRows(Site site) {
        return accounts.people(site).stream()
                .map(p -> new Row(
                        p.person().displayName(),
                        p.person().name() + ", " + p.role().code(),
                        "",
                        ""))
                .toList();
    }

    private static String told(Priority least) {
        return switch (least) {
            case HIGH -> "high priority only";
            case MEDIUM -> "high and medium priority";
            case LOW -> "everything";
        };
    }

    private List<Row> subscriberRows(Site site) {
        List<Row> rows = new ArrayList<>();
        for (Subscriber s : place.subscribers(site)) {
            rows.add(new Row(
                    s.name(),
                    s.email() + ", " + (s.active() ? "is told about " + told(s.minPriority()) : "not told any more"),
                    s.active() ? s.code() : "",
                    s.active() ? "Stop telling" : ""));
        }
        return rows;
    }
}
