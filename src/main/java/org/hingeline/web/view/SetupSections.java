package org.hingeline.web.view;

import java.util.List;
import org.hingeline.web.view.SetupView.Field;
import org.hingeline.web.view.SetupView.Row;
import org.hingeline.web.view.SetupView.Section;

/** The sections of the setup page, each with the fields its form sends. */
public final class SetupSections {
    private SetupSections() {}

    /** Points: code, name, place, volumeL, maxGapMin. */
    public static Section points(List<Row> rows, Form form) {
        return new Section(
                "points",
                "Points",
                "Where the water is watched, in the order it flows. Adding a code that is there already changes that point.",
                rows,
                List.of(
                        text("code", "Code", "lower case, as gateways send it: larval-3"),
                        text("name", "Name", "as people call it: Larval 3"),
                        select("place", "Where on the water’s way", PLACES),
                        number("volumeL", "Volume, litres", "for tanks; needed to plan a dose", false),
                        number(
                                "maxGapMin",
                                "Silent after, minutes",
                                "an alert is raised when nothing arrives for this long",
                                true)),
                "Add point",
                form);
    }

    /** Sensors: code, point, quantity, unit, phScale, standardUncertainty; {@code points} are the points to choose from. */
    public static Section sensors(List<Row> rows, List<Choice> points, Form form) {
        return new Section(
                "sensors",
                "Sensors",
                "What measures one quantity at a point, in which unit and how surely. A code that is there already is changed.",
                rows,
                List.of(
                        text("code", "Code", "as gateways send it: ph-3"),
                        select("point", "Point", points),
                        select("quantity", "Quantity", QUANTITIES),
                        optional("unit", "Unit", "UCUM, as Cel, umol/kg, meq/L, [pH]; empty for the usual one"),
                        select("phScale", "pH scale", PH_SCALES),
                        number(
                                "standardUncertainty",
                                "Standard uncertainty",
                                "in the same unit; pH electrodes rarely do better than 0.02",
                                false)),
                "Add sensor",
                form);
    }

    /** Gateway keys: name. */
    public static Section gatewayKeys(List<Row> rows, Form form) {
        return new Section(
                "gateway-keys",
                "Gateway keys",
                "A gateway signs its readings in with a key. A key is shown once, when it is made.",
                rows,
                List.of(text("name", "Gateway", "where it stands: pump house")),
                "Make key",
                form);
    }

    /** Access tokens: name, role. */
    public static Section accessTokens(List<Row> rows, Form form) {
        return new Section(
                "access-tokens",
                "Access tokens",
                "For scripts that read or change this site. A token is shown once, when it is made.",
                rows,
                List.of(text("name", "For what", "nightly export"), select("role", "May act as", ROLES)),
                "Make token",
                form);
    }

    /** People: name, role, password. */
    public static Section people(List<Row> rows, Form form) {
        return new Section(
                "people",
                "People",
                "Who may sign in. Viewers look, operators acknowledge, dose and set limits, managers also set up. A name that is "
                        + "there already gets the new role and password.",
                rows,
                List.of(
                        text("name", "Name to sign in with", "small letters, digits and hyphens: ana"),
                        select("role", "Role", ROLES),
                        new Field("password", "First password", "password", "at least 10 characters", true, List.of())),
                "Add person",
                form);
    }

    /** Subscribers: name, email, priority (the lowest they are told about). */
    public static Section subscribers(List<Row> rows, Form form) {
        return new Section(
                "subscribers",
                "Subscribers",
                "Who is told about alerts, by e-mail.",
                rows,
                List.of(
                        text("name", "Name", ""),
                        new Field("email", "E-mail", "email", "", true, List.of()),
                        select(
                                "priority",
                                "Is told about",
                                List.of(
                                        new Choice("high", "high priority only"),
                                        new Choice("medium", "high and medium"),
                                        new Choice("low", "everything")))),
                "Add subscriber",
                form);
    }

    private static final List<Choice> PLACES = List.of(
            new Choice("intake", "intake"),
            new Choice("storage", "storage"),
            new Choice("header", "header"),
            new Choice("larval", "larval tank"),
            new Choice("discharge", "discharge"));

    private static final List<Choice> QUANTITIES = List.of(
            new Choice("ph", "pH"),
            new Choice("temperature", "temperature"),
            new Choice("salinity", "salinity"),
            new Choice("conductivity", "conductivity"),
            new Choice("totalAlkalinity", "total alkalinity"),
            new Choice("dic", "dissolved inorganic carbon"),
            new Choice("pco2", "pCO₂"),
            new Choice("calcium", "calcium"),
            new Choice("dissolvedOxygen", "dissolved oxygen"),
            new Choice("flow", "flow"),
            new Choice("level", "level"),
            new Choice("ammonia", "total ammonia nitrogen"));

    private static final List<Choice> PH_SCALES = List.of(
            new Choice("", "not a pH sensor"),
            new Choice("total", "total"),
            new Choice("seawater", "seawater"),
            new Choice("free", "free"),
            new Choice("nbs", "NBS (most buffers sold)"));

    private static final List<Choice> ROLES = List.of(
            new Choice("viewer", "viewer"), new Choice("operator", "operator"), new Choice("manager", "manager"));

    private static Field text(String name, String label, String hint) {
        return new Field(name, label, "text", hint, true, List.of());
    }

    private static Field optional(String name, String label, String hint) {
        return new Field(name, label, "text", hint, false, List.of());
    }

    private static Field number(String name, String label, String hint, boolean required) {
        return new Field(name, label, "number", hint, required, List.of());
    }

    private static Field select(String name, String label, List<Choice> choices) {
        return new Field(name, label, "select", "", true, choices);
    }
}
