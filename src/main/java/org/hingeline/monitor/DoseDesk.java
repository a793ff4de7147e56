package org.hingeline.monitor;

import java.time.Duration;
import java.util.Optional;
import org.hingeline.dosing.Agent;
import org.hingeline.dosing.Bounds;
import org.hingeline.dosing.DosePlan;
import org.hingeline.dosing.DosePlanner;
import org.hingeline.dosing.DoseRequest;
import org.hingeline.dosing.Product;
import org.hingeline.dosing.Receiver;
import org.hingeline.dosing.Stock;
import org.hingeline.dosing.Target;
import org.hingeline.hatchery.Point;
import org.hingeline.hatchery.PointKind;
import org.hingeline.hatchery.Site;
import org.hingeline.measure.Quantity;
import org.hingeline.seawater.CarbonateResult;
import org.hingeline.seawater.CarbonateResult.Solved;
import org.hingeline.seawater.Caution;
import org.jspecify.annotations.Nullable;

/** Suggests doses. Stores nothing and does nothing: a person confirms, a person doses. */
public final class DoseDesk {

    /**
     * What holds where a request says nothing.
     *
     * @param aerateToUatm partial pressure of CO2 that aeration brings the water to, µatm
     */
    public record Defaults(
            double phTotalMax,
            double omegaAragoniteMax,
            double phPerHourMax,
            double aerateToUatm,
            double stockGramsPerLitre) {}

    private final StatusBoard board;
    private final DoseWaters waters;
    private final Defaults defaults;
    private final WaterCalculator calculator = new WaterCalculator();

    public DoseDesk(StatusBoard board, DoseWaters waters, Defaults defaults) {
        this.board = board;
        this.waters = waters;
        this.defaults = defaults;
    }

    public Defaults defaults() {
        return defaults;
    }

    /**
     * A suggestion, or why there is none.
     *
     * @throws FieldFaultsException when the request itself cannot be taken
     */
    public DosePlan plan(Site site, DoseWish wish) {
        FieldFaults faults = new FieldFaults();
        if ((wish.point() == null) == (wish.water() == null)) {
            faults.add(
                    "point",
                    "exactly one of point and water is needed, got " + (wish.point() == null ? "neither" : "both"));
        }
        Optional<PointStatus> status = Optional.ofNullable(wish.point()).flatMap(code -> board.point(site, code));
        if (wish.point() != null && status.isEmpty()) {
            faults.add("point", "point \"" + wish.point() + "\" is not known at this site");
        }
        Double volumeL = wish.volumeL() != null
                ? wish.volumeL()
                : status.map(PointStatus::point).map(Point::volumeL).orElse(null);
        if (volumeL == null) {
            faults.add(
                    "volumeL",
                    "volumeL is missing: the point has no volume set, so the request must say it, in litres");
        } else if (!Double.isFinite(volumeL)) {
            faults.add("volumeL", "volumeL " + volumeL + " must be a finite number, in litres");
        }
        Target target = target(wish.target(), faults);
        Agent agent = agent(wish.agent(), faults);
        Agent.Form form = form(wish.agent(), agent, faults);
        double assay = number(
                "agent/assayPercent", wish.agent() == null ? null : wish.agent().assayPercent(), 100, faults);
        Bounds bounds = bounds(wish.bounds(), faults);
        double stock = number("stockGramsPerLitre", wish.stockGramsPerLitre(), defaults.stockGramsPerLitre(), faults);
        Double stockC = wish.stockTemperatureC();
        if (stockC != null && !(stockC >= 0 && stockC <= 40)) {
            faults.add("stockTemperatureC", "stockTemperatureC " + stockC + " must be 0 to 40 °C");
        }
        double air = number("aerateToUatm", wish.aerateToUatm(), defaults.aerateToUatm(), faults);
        if (!(air >= 100 && air <= 5000)) {
            faults.add("aerateToUatm", "aerateToUatm " + air + " must be 100 to 5000 \u00b5atm");
        }
        DoseWaters.Water water = status.isPresent()
                ? waters.of(status.get())
                : wish.water() != null ? calculator.toDose(wish.water(), "water", faults) : null;
        faults.throwIfAny();
        if (water == null || target == null || agent == null || form == null || bounds == null || volumeL == null) {
            throw new IllegalStateException("a fault was not told");
        }
        Product product = new Product(agent, form, assay);
        DosePlan plan =
                DosePlanner.plan(DoseRequest.of(water.result(), water.uncertainty(), new Receiver.Tank(volumeL), target)
                        .inputNotes(water.notes())
                        .product(product)
                        .bounds(bounds)
                        .stock(stock(wish, product, stock, stockC, water.result()))
                        .aerationPco2Atm(air * 1e-6)
                        .larvae(larvae(wish, status))
                        .build());
        if (plan.outcome() != DosePlan.Outcome.PLAN) {
            return plan;
        }
        for (Caution caution : water.cautions()) {
            plan = plan.withCaution(caution);
        }
        return status.flatMap(DoseDesk::aboutAlkalinity).map(plan::withCaution).orElse(plan);
    }

    /** As wished; the setting is for soda ash, and what dissolves less takes the strongest stock that stays dissolved. */
    private static Stock stock(
            DoseWish wish,
            Product product,
            double gramsPerLitre,
            @Nullable Double temperatureC,
            @Nullable CarbonateResult water) {
        if (wish.stockGramsPerLitre() != null || !(water instanceof Solved solved)) {
            return new Stock(gramsPerLitre, temperatureC);
        }
        double most = product.strongestStockGramsPerLitre(
                temperatureC == null ? solved.state().conditions().temperatureC() : temperatureC);
        return new Stock(Math.min(gramsPerLitre, most), temperatureC);
    }

    /** Of a larval tank nobody has to say that larvae are in it; that there are none, somebody has. */
    private static boolean larvae(DoseWish wish, Optional<PointStatus> status) {
        Boolean said = wish.larvaeInWater();
        return said != null
                ? said
                : status.map(s -> s.batch().isPresent() || s.point().kind() == PointKind.LARVAL)
                        .orElse(false);
    }

    /** The plan stands on an alkalinity that a dose or an exchange of water since then has changed. */
    private static Optional<Caution> aboutAlkalinity(PointStatus status) {
        WaterState state = status.newest();
        return state == null
                ? Optional.empty()
                : state.inputs().stream()
                        .filter(input -> input.quantity() == Quantity.TOTAL_ALKALINITY)
                        .findFirst()
                        .map(
                                input -> new Caution(
                                        "alkalinity-age",
                                        "The alkalinity this stands on was measured "
                                                + Wording.length(Duration.between(input.at(), status.now()))
                                                + " ago. If anything was dosed or water was exchanged since, measure it again first."));
    }

    private static @Nullable Target target(DoseWish.@Nullable Target wish, FieldFaults faults) {
        if (wish == null) {
            faults.add("target", "target is missing; give one of omegaAragonite, phTotal, totalAlkalinityUmolKg");
            return null;
        }
        Double omega = wish.omegaAragonite();
        Double ph = wish.phTotal();
        Double alkalinity = wish.totalAlkalinityUmolKg();
        int given = (omega == null ? 0 : 1) + (ph == null ? 0 : 1) + (alkalinity == null ? 0 : 1);
        if (given != 1) {
            faults.add(
                    "target",
                    "target needs exactly one of omegaAragonite, phTotal, totalAlkalinityUmolKg; it has " + given);
            return null;
        }
        if (omega != null) {
            return within("target/omegaAragonite", omega, 0, 10, faults) ? new Target.OmegaAragonite(omega) : null;
        }
        if (ph != null) {
            return within("target/phTotal", ph, 6, 9.5, faults) ? new Target.PhTotal(ph) : null;
        }
        return alkalinity != null && within("target/totalAlkalinityUmolKg", alkalinity, 0, 6000, faults)
                ? new Target.TotalAlkalinity(alkalinity * 1e-6)
                : null;
    }

    private static boolean within(String field, double value, double above, double most, FieldFaults faults) {
        boolean good = value > above && value <= most;
        if (!good) {
            faults.add(field, field + " " + value + " must be above " + above + " and at most " + most);
        }
        return good;
    }

    private static @Nullable Agent agent(DoseWish.@Nullable Agent wish, FieldFaults faults) {
        String code = wish == null || wish.code() == null ? Agent.SODIUM_CARBONATE.code() : wish.code();
        Optional<Agent> agent = Agent.ofCode(code);
        if (agent.isEmpty()) {
            faults.add(
                    "agent/code",
                    "agent \"" + code + "\" cannot be planned; accepted: "
                            + String.join(
                                    ", ", Agent.all().stream().map(Agent::code).toList()));
        }
        return agent.orElse(null);
    }

    private static Agent.@Nullable Form form(DoseWish.@Nullable Agent wish, @Nullable Agent agent, FieldFaults faults) {
        if (agent == null) {
            return null;
        }
        String accepted =
                String.join(", ", agent.forms().stream().map(Agent.Form::code).toList());
        String hydration = wish == null ? null : wish.hydration();
        if (hydration == null && agent.forms().size() == 1) {
            return agent.forms().get(0);
        }
        if (hydration == null) {
            faults.add(
                    "agent/hydration",
                    "hydration is missing: "
                            + (agent.equals(Agent.SODIUM_CARBONATE)
                                    ? "decahydrate taken for anhydrous gives 2.7 times too little. "
                                    : "")
                            + "Read the label; accepted: " + accepted);
            return null;
        }
        Optional<Agent.Form> form = agent.form(hydration);
        if (form.isEmpty()) {
            faults.add("agent/hydration", "hydration \"" + hydration + "\" is not known; accepted: " + accepted);
        }
        return form.orElse(null);
    }

    private static double number(String field, @Nullable Double value, double otherwise, FieldFaults faults) {
        if (value != null && !Double.isFinite(value)) {
            faults.add(field, field + " " + value + " must be a finite number");
        }
        return value == null ? otherwise : value;
    }

    private @Nullable Bounds bounds(DoseWish.@Nullable Bounds wish, FieldFaults faults) {
        try {
            return new Bounds(
                    wish == null || wish.phTotalMax() == null ? defaults.phTotalMax() : wish.phTotalMax(),
                    wish == null || wish.omegaAragoniteMax() == null
                            ? defaults.omegaAragoniteMax()
                            : wish.omegaAragoniteMax(),
                    wish == null || wish.phPerHourMax() == null ? defaults.phPerHourMax() : wish.phPerHourMax());
        } catch (IllegalArgumentException e) {
            String detail = String.valueOf(e.getMessage());
            faults.add("bounds/" + detail.split(" ", 2)[0], detail);
            return null;
        }
    }
}
