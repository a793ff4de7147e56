package org.hingeline.web;

import io.javalin.http.Context;
import java.time.Duration;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.hingeline.alert.Priority;
import org.hingeline.hatchery.Point;
import org.hingeline.hatchery.PointKind;
import org.hingeline.measure.Quantity;
import org.hingeline.measure.UnitChoice;
import org.hingeline.measure.Units;
import org.hingeline.monitor.FieldFaults;
import org.hingeline.monitor.FieldFaultsException;
import org.hingeline.monitor.PlacePlan;
import org.hingeline.monitor.Role;
import org.hingeline.seawater.PhScale;

/** What the forms of the setup page say, each fault beside its field. */
final class SetupForms {
    private SetupForms() {}

    static PlacePlan.PointPlan point(Context ctx, List<Point> known) {
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

    static PlacePlan.SensorPlan sensor(Context ctx) {
        FieldFaults faults = new FieldFaults();
        Optional<Quantity> quantity = Quantity.ofCode(Forms.text(ctx, "quantity"));
        if (quantity.isEmpty()) {
            faults.add("quantity", "choose one of " + Quantity.measuredCodes());
        }
        String scale = Forms.text(ctx, "phScale");
        Double uncertainty = Forms.number(ctx, "standardUncertainty", faults);
        faults.throwIfAny();
        Quantity measured = quantity.orElseThrow();
        String unit = Forms.text(ctx, "unit").isEmpty() ? measured.unit().ucum() : Forms.text(ctx, "unit");
        return new PlacePlan.SensorPlan(
                Forms.text(ctx, "point"),
                Forms.text(ctx, "code"),
                measured,
                unit,
                PhScale.fromWireName(scale).orElse(null),
                uncertainty == null ? standardUncertainty(measured) : canonical(measured, unit, uncertainty),
                null);
    }

    /** The form asks for it in the sensor's own unit. */
    private static double canonical(Quantity quantity, String unit, double uncertainty) {
        return Units.find(quantity, unit)
                .orElseThrow(() -> new FieldFaultsException(
                        "unit", "\u201c" + unit + "\u201d is not one of " + Units.codes(quantity)))
                .conversion(UnitChoice.TYPICAL_DENSITY_KG_M3)
                .uncertaintyToCanonical(uncertainty);
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

    static PlacePlan.SubscriberPlan subscriber(Context ctx) {
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

    static Role role(Context ctx) {
        return Role.ofCode(Forms.text(ctx, "role"))
                .orElseThrow(() -> new FieldFaultsException("role", "choose one of " + Role.codes()));
    }
}
