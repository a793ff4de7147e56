package org.hingeline.web;

import io.javalin.config.RoutesConfig;
import io.javalin.http.Context;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.hingeline.hatchery.Point;
import org.hingeline.hatchery.Site;
import org.hingeline.monitor.Accounts;
import org.hingeline.monitor.FieldFaultsException;
import org.hingeline.monitor.PlaceDesk;
import org.hingeline.monitor.PlacePlan;
import org.hingeline.web.view.Choice;
import org.hingeline.web.view.Form;
import org.hingeline.web.view.SetupSections;
import org.hingeline.web.view.SetupView;
import org.hingeline.web.view.SetupView.Section;
import org.hingeline.web.view.SetupView.ShownOnce;
import org.jspecify.annotations.Nullable;

/** Setting the site up: points, sensors, keys, tokens, people, subscribers. For managers. */
final class SetupPages {
    private final PlaceDesk place;
    private final Accounts accounts;
    private final PageMaker pages;
    private final SetupRows rows;

    SetupPages(PlaceDesk place, Accounts accounts, PageMaker pages) {
        this.place = place;
        this.accounts = accounts;
        this.pages = pages;
        this.rows = new SetupRows(place, accounts, pages);
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
                SetupSections.points(
                        rows.pointRows(points), form(section, "points", refused, Map.of("maxGapMin", "15"))),
                SetupSections.sensors(
                        rows.sensorRows(site, points), pointChoices, form(section, "sensors", refused, Map.of())),
                SetupSections.gatewayKeys(rows.keyRows(site), form(section, "gateway-keys", refused, Map.of())),
                SetupSections.subscribers(rows.subscriberRows(site), form(section, "subscribers", refused, Map.of())),
                SetupSections.people(rows.peopleRows(site), form(section, "people", refused, Map.of())),
                SetupSections.accessTokens(rows.tokenRows(site), form(section, "access-tokens", refused, Map.of())));
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
            case "points" -> place.savePoint(site, SetupForms.point(ctx, place.points(site)), who);
            case "sensors" -> place.saveSensor(site, SetupForms.sensor(ctx), who);
            case "subscribers" -> place.saveSubscriber(site, SetupForms.subscriber(ctx), true, who);
            case "people" -> {
                String name = Forms.text(ctx, "name");
                String password = Optional.ofNullable(ctx.formParam("password")).orElse("");
                accounts.savePerson(site, name, name, password, SetupForms.role(ctx), who);
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
                        accounts.makeAccessToken(site, name, SetupForms.role(ctx), who));
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
}
