package org.hingeline.web;

import java.time.Duration;
import java.time.Instant;
import java.time.ZoneId;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.hingeline.web.view.AlertsView;
import org.hingeline.web.view.DoseView;
import org.hingeline.web.view.Form;
import org.hingeline.web.view.LayoutView;
import org.hingeline.web.view.LayoutView.Role;
import org.hingeline.web.view.LimitRow;
import org.hingeline.web.view.MessagesView;
import org.hingeline.web.view.Moment;
import org.hingeline.web.view.OpenAlert;
import org.hingeline.web.view.PathPoint;
import org.hingeline.web.view.Place;
import org.hingeline.web.view.PointView;
import org.hingeline.web.view.SetupSections;
import org.hingeline.web.view.SetupView;
import org.hingeline.web.view.SiteChoice;
import org.hingeline.web.view.Standing;
import org.hingeline.web.view.StatusView;
import org.hingeline.web.view.TideStrip;
import org.hingeline.web.view.Undo;

/** Invented water to try the pages on: an ordinary night, a bad one, and nothing known at all. */
final class LookSamples {
    private static final ZoneId ZONE = ZoneId.of("Europe/Lisbon");
    private static final String CLOSE = "Close the intake valve; draw from storage.";

    private final Instant now;

    LookSamples(Instant now) {
        this.now = now;
    }

    Moment ago(long minutes) {
        return Moment.of(now.minus(Duration.ofMinutes(minutes)), now, ZONE);
    }

    LayoutView layout(String current) {
        return layout(current, Role.MANAGER, List.of(new SiteChoice("vale", "Ria Cove", true)));
    }

    LayoutView layout(String current, Role role, List<SiteChoice> sites) {
        return new LayoutView(
                "Ria Cove", "vale", sites, "Ana Reis", role, "token-1", ZONE.getId(), ago(0), current, "");
    }

    LayoutView twoSites(String current) {
        return layout(
                current,
                Role.OPERATOR,
                List.of(new SiteChoice("vale", "Ria Cove", true), new SiteChoice("norte", "Norte & Filhos", false)));
    }

    PathPoint fit(String code, String name, Place place, String omega) {
        return new PathPoint(
                code,
                name,
                place,
                Standing.FIT,
                "fit",
                omega,
                "0.12",
                "your limit is 1.80",
                ago(2),
                List.of(),
                "",
                "",
                List.of(),
                place == Place.TANK,
                true,
                0);
    }

    PathPoint larval3() {
        return new PathPoint(
                "larval-3",
                "Larval 3",
                Place.TANK,
                Standing.SHORT,
                "short of carbonate",
                "1.62",
                "0.11",
                "under your 1.80 for 12 min",
                ago(2),
                List.of("The pH sensor is suspect: it has not moved for 70 min."),
                CLOSE,
                "C. gigas, 31 h after spawn: first shell",
                List.of(new OpenAlert("41", "Ω below 1.80", ago(2), "")),
                true,
                true,
                3);
    }

    PathPoint dark(String code, String name, Place place) {
        return new PathPoint(
                code,
                name,
                place,
                Standing.UNKNOWN,
                "not known",
                "",
                "",
                "",
                ago(3),
                List.of("Alkalinity 80 h old, older than the 72 h allowed."),
                "",
                "",
                List.of(),
                place == Place.TANK,
                true,
                0);
    }

    TideStrip strip(boolean tide, Standing end) {
        Instant from = now.minus(Duration.ofHours(24));
        List<TideStrip.Level> levels = new ArrayList<>();
        for (int minute = 0; tide && minute <= 24 * 60; minute += 10) {
            double hours = minute / 60.0;
            levels.add(new TideStrip.Level(
                    from.plus(Duration.ofMinutes(minute)),
                    1.4 * Math.cos(2 * Math.PI * hours / 12.42 + 1) + 0.3 * Math.cos(2 * Math.PI * hours / 24)));
        }
        return TideStrip.draw(
                "Intake, last 24 h",
                from,
                now,
                ZONE,
                List.of(
                        new TideStrip.Stretch(from, from.plus(Duration.ofMinutes(520)), Standing.FIT),
                        new TideStrip.Stretch(
                                from.plus(Duration.ofMinutes(520)), from.plus(Duration.ofMinutes(815)), Standing.SHORT),
                        new TideStrip.Stretch(
                                from.plus(Duration.ofMinutes(965)), from.plus(Duration.ofMinutes(1330)), Standing.FIT),
                        new TideStrip.Stretch(from.plus(Duration.ofMinutes(1330)), now, end)),
                levels);
    }

    StatusView ordinary() {
        return new StatusView(
                strip(true, Standing.FIT),
                List.of(
                        fit("intake", "Intake", Place.INTAKE, "2.31"),
                        fit("storage", "Storage", Place.STORAGE, "2.62"),
                        fit("header", "Header", Place.HEADER, "2.44"),
                        fit("larval-1", "Larval 1", Place.TANK, "2.40"),
                        fit("larval-2", "Larval 2", Place.TANK, "2.43"),
                        larval3()));
    }

    StatusView allFit() {
        return new StatusView(
                strip(false, Standing.FIT),
                List.of(
                        fit("intake", "Intake", Place.INTAKE, "2.31"),
                        fit("storage", "Storage", Place.STORAGE, "2.62"),
                        fit("larval-1", "Larval 1", Place.TANK, "2.40"),
                        fit("larval-2", "Larval 2", Place.TANK, "2.43"),
                        fit("discharge", "Discharge", Place.DISCHARGE, "2.02")));
    }

    StatusView badNight() {
        List<PathPoint> path = new ArrayList<>();
        path.add(new PathPoint(
                "intake",
                "Intake at the old mill jetty, deep line",
                Place.INTAKE,
                Standing.SHORT,
                "short of carbonate",
                "1.31",
                "0.14",
                "under your 1.80 for 2 h 40 min",
                ago(1),
                List.of(),
                CLOSE,
                "",
                List.of(
                        new OpenAlert("38", "Ω below 1.80", ago(160), "Ana Reis took it on at 01:05: valve closed"),
                        new OpenAlert("40", "temperature below 11 °C", ago(14), "")),
                false,
                true,
                2));
        path.add(dark("storage", "Storage", Place.STORAGE));
        path.add(fit("header", "Header", Place.HEADER, "1.84"));
        for (int tank = 1; tank <= 12; tank++) {
            path.add(
                    tank == 3
                            ? larval3()
                            : tank == 7
                                    ? dark("larval-7", "Larval 7", Place.TANK)
                                    : fit("larval-" + tank, "Larval " + tank, Place.TANK, "2.1" + tank % 10));
        }
        path.add(fit("discharge", "Discharge", Place.DISCHARGE, "1.90"));
        return new StatusView(strip(true, Standing.SHORT), path);
    }

    StatusView nothingKnown() {
        return new StatusView(
                TideStrip.draw("Intake, last 24 h", now.minus(Duration.ofHours(24)), now, ZONE, List.of(), List.of()),
                List.of(unmeasured("intake", "Intake", Place.INTAKE), unmeasured("larval-1", "Larval 1", Place.TANK)));
    }

    private PathPoint unmeasured(String code, String name, Place place) {
        return new PathPoint(
                code,
                name,
                place,
                Standing.UNKNOWN,
                "not known",
                "",
                "",
                "",
                Moment.never(),
                List.of("No pH was ever sent.", "No temperature was ever sent."),
                "",
                "",
                List.of(),
                false,
                true,
                0);
    }

    PointView point(boolean refused) {
        Map<String, String> values = Map.of(
                "name",
                "first shell",
                "quantity",
                "omegaAragonite",
                "below",
                "1.80",
                "deadband",
                refused ? "a bit" : "0.05",
                "onDelayMin",
                "10",
                "offDelayMin",
                "10",
                "priority",
                "high",
                "action",
                CLOSE);
        Form form = new Form(
                values,
                refused ? Map.of("deadband", "“a bit” is not a number; 0.05 would be.") : Map.<String, String>of());
        return new PointView(
                larval3(),
                List.of(
                        new PointView.StateLine("Ω aragonite", "1.62", "0.11", ""),
                        new PointView.StateLine("Ω calcite", "2.51", "0.17", ""),
                        new PointView.StateLine("pH (total scale)", "7.71", "0.02", ""),
                        new PointView.StateLine("pCO₂", "912", "48", "µatm"),
                        new PointView.StateLine("Dissolved inorganic carbon", "2 041", "11", "µmol/kg"),
                        new PointView.StateLine("Total alkalinity", "2 180", "10", "µmol/kg"),
                        new PointView.StateLine("Carbonate", "101", "6", "µmol/kg"),
                        new PointView.StateLine("Temperature", "21.9", "0.1", "°C"),
                        new PointView.StateLine("Salinity", "30.1", "0.1", "")),
                List.of(
                        new PointView.InputLine("pH", "7.71", "sensor ph-3", ago(2), "suspect: flat for 70 min"),
                        new PointView.InputLine("temperature", "21.9 °C", "sensor t-3", ago(2), "passed"),
                        new PointView.InputLine("salinity", "30.1", "sensor s-header", ago(7), "passed"),
                        new PointView.InputLine("alkalinity", "2 180 µmol/kg", "bottle sample", ago(60 * 31), "")),
                List.of("Half of the uncertainty comes from pH: a check against a fresh buffer would halve it."),
                "Lowest Ω in the last 48 h: 1.58 at 03:02.",
                "2026-05-14T02:02:00Z",
                List.of(
                        new LimitRow(
                                "first shell",
                                "Ω aragonite below 1.80 for 10 min; ends above 1.85 for 10 min",
                                "high",
                                CLOSE,
                                "omegaAragonite",
                                "1.8",
                                "",
                                form),
                        new LimitRow(
                                "too warm",
                                "Temperature above 26.0 °C for 20 min; ends below 25.5 °C for 10 min",
                                "medium",
                                "Turn the heater down.",
                                "temperatureC",
                                "",
                                "26",
                                Form.of(Map.of("name", "too warm", "quantity", "temperatureC", "above", "26")))),
                Form.of(Map.of(
                        "quantity", "omegaAragonite", "deadband", "0.05", "onDelayMin", "10", "offDelayMin", "10")),
                new Undo(
                        "Limit “low salinity” was removed.",
                        "low salinity",
                        Map.of("quantity", "salinity", "below", "25")));
    }

    AlertsView alerts() {
        List<AlertsView.Told> told = List.of(
                new AlertsView.Told("Ana Reis", "e-mail", "raised", "sent 03:01"),
                new AlertsView.Told("Rui Matos", "e-mail", "raised", "being retried, next try 03:20"));
        return new AlertsView(
                List.of(
                        new AlertsView.Entry(
                                "41",
                                "larval-3",
                                "Larval 3",
                                "Ω 1.62 ±0.11, under your 1.80",
                                "high",
                                ago(2),
                                "",
                                Moment.never(),
                                CLOSE,
                                true,
                                told),
                        new AlertsView.Entry(
                                "38",
                                "intake",
                                "Intake",
                                "Ω 1.31 ±0.14, under your 1.80",
                                "high",
                                ago(160),
                                "Ana Reis at 01:05: valve closed",
                                Moment.never(),
                                CLOSE,
                                true,
                                told)),
                List.of(new AlertsView.Entry(
                        "35",
                        "storage",
                        "Storage",
                        "silent for more than 30 min",
                        "medium",
                        ago(1500),
                        "",
                        ago(1460),
                        "Look at the gateway in the pump house.",
                        false,
                        List.of())));
    }

    DoseView dose(DoseView.Outcome outcome) {
        Form form = Form.of(Map.of(
                "targetOmega",
                "2.5",
                "volume",
                "4000",
                "volumeUnit",
                "L",
                "hydration",
                "anhydrous",
                "assayPercent",
                "99.2",
                "stockGramsPerLitre",
                "50",
                "phTotalMax",
                "8.4",
                "omegaAragoniteMax",
                "4.5",
                "phPerHourMax",
                "0.15"));
        List<String> remedies = List.of(
                "Draw from Storage: its Ω is 2.62.",
                "Aerate to 420 µatm CO₂: Ω would rise to 2.71 without any chemical; allow 6 to 12 h.");
        DoseView.Result result = switch (outcome) {
            case PLAN ->
                new DoseView.Result(
                        outcome,
                        "160 g of anhydrous sodium carbonate in 3 steps would bring Ω to 2.50.",
                        "160 g",
                        "142 g",
                        "179 g",
                        List.of(
                                new DoseView.Step("at once", "54 g", "1 080 mL", "7.80", "1.94"),
                                new DoseView.Step("after 40 min", "53 g", "1 060 mL", "7.88", "2.23"),
                                new DoseView.Step("after 80 min", "53 g", "1 060 mL", "7.94", "2.50")),
                        List.of(
                                new DoseView.WaterLine("Ω aragonite", "1.62", "2.50", "2.92"),
                                new DoseView.WaterLine("pH", "7.71", "7.94", "8.04"),
                                new DoseView.WaterLine("pCO₂, µatm", "912", "540", "420"),
                                new DoseView.WaterLine("Alkalinity, µmol/kg", "2 180", "2 925", "2 925")),
                        remedies,
                        List.of(
                                "Dissolve fully in fresh water before adding; never put powder into the tank.",
                                "Goggles and gloves: the stock burns eyes.",
                                "With ammonia in the tank, raising pH makes it more toxic: measure it first."),
                        List.of());
            case NOT_NEEDED ->
                new DoseView.Result(
                        outcome,
                        "No dose is needed: Ω is 2.62 already.",
                        "",
                        "",
                        "",
                        List.of(),
                        List.of(),
                        List.of(),
                        List.of(),
                        List.of());
            case REFUSED ->
                new DoseView.Result(
                        outcome,
                        "No dose can be suggested for this water.",
                        "",
                        "",
                        "",
                        List.of(),
                        List.of(),
                        remedies,
                        List.of(),
                        List.of(new DoseView.Reason(
                                "Alkalinity is 80 h old, older than the 72 h allowed.",
                                "Titrate a bottle sample of this tank and enter it.")));
        };
        return new DoseView(
                "larval-3", "Larval 3", "Ω 1.62 ±0.11, pH 7.71, 21.9 °C, 2 min ago", ago(2).iso(), form, result);
    }

    MessagesView messages() {
        return new MessagesView(List.of(
                new MessagesView.Entry(
                        "Rui Matos, rui@hatchery.example",
                        "e-mail",
                        ago(2),
                        MessagesView.State.RETRYING,
                        "second try failed at 03:09: connection refused; next try 03:20",
                        "Larval 3: Ω 1.62 under 1.80",
                        "Larval 3 is short of carbonate.\nΩ 1.62 ±0.11, under your 1.80 for 12 min.\n\nDo: " + CLOSE),
                new MessagesView.Entry(
                        "Ana Reis, ana@hatchery.example",
                        "e-mail",
                        ago(2),
                        MessagesView.State.SENT,
                        "at 03:01",
                        "Larval 3: Ω 1.62 under 1.80",
                        "Larval 3 is short of carbonate."),
                new MessagesView.Entry(
                        "The owner, owner@hatchery.example",
                        "e-mail",
                        ago(5000),
                        MessagesView.State.GIVEN_UP,
                        "no such mailbox",
                        "Storage: silent",
                        "Storage has sent nothing for 30 min.")));
    }

    SetupView setup(boolean shown) {
        return new SetupView(
                List.of(
                        SetupSections.points(
                                List.of(
                                        new SetupView.Row("Intake", "intake, code intake, silent after 30 min", "", ""),
                                        new SetupView.Row(
                                                "Larval 3",
                                                "larval tank, code larval-3, 4 000 L, silent after 30 min",
                                                "",
                                                "")),
                                new Form(
                                        Map.of("code", "Larval 3"),
                                        Map.of("code", "“Larval 3” has a blank; larval-3 would do."))),
                        SetupSections.sensors(List.of(), List.of(), Form.empty()),
                        SetupSections.gatewayKeys(
                                List.of(new SetupView.Row(
                                        "pump house", "made 2 May, last used 2 min ago", "7", "Withdraw")),
                                Form.empty()),
                        SetupSections.accessTokens(List.of(), Form.empty()),
                        SetupSections.people(
                                List.of(new SetupView.Row("Ana Reis", "manager", "1", "Remove")), Form.empty()),
                        SetupSections.subscribers(List.of(), Form.empty())),
                shown
                        ? new SetupView.ShownOnce(
                                "gateway-keys", "Gateway key “pump house”", "hgk_3q9vXK2bUZ7sR0yPmD5wTnA8eLcF1jHg")
                        : null);
    }
}
