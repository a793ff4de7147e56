package org.hingeline.monitor;

import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.hingeline.dosing.Agent;
import org.hingeline.dosing.Bounds;
import org.hingeline.dosing.Companion;
import org.hingeline.dosing.DosePlan;
import org.hingeline.dosing.DosePlanner;
import org.hingeline.dosing.DoseRequest;
import org.hingeline.dosing.Hold;
import org.hingeline.dosing.OtherWater;
import org.hingeline.dosing.Product;
import org.hingeline.dosing.Receiver;
import org.hingeline.dosing.Stock;
import org.hingeline.dosing.Surroundings;
import org.hingeline.dosing.Target;
import org.hingeline.dosing.WaterKind;
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
        DoseWishReader reader = new DoseWishReader(faults);
        Double volumeL = wish.volumeL() != null
                ? wish.volumeL()
                : status.map(PointStatus::point).map(Point::volumeL).orElse(null);
        Receiver receiver = reader.receiver(volumeL, wish.flowLMin());
        Target target = reader.target(wish.target());
        Product product = reader.product("agent", wish.agent(), Agent.SODIUM_CARBONATE);
        Hold hold = reader.hold(wish.hold());
        Product second = wish.secondAgent() == null && wish.hold() == null
                ? null
                : reader.product("secondAgent", wish.secondAgent(), Agent.SODIUM_BICARBONATE);
        if (wish.secondAgent() != null && wish.hold() == null) {
            faults.add("hold", "hold is missing: say what the second agent is for, phTotalMax or pco2Uatm");
        }
        Bounds bounds = reader.bounds(wish.bounds(), defaults);
        reader.number("stockGramsPerLitre", wish.stockGramsPerLitre(), defaults.stockGramsPerLitre());
        if (wish.secondAgent() != null) {
            reader.number("secondAgent/stockGramsPerLitre", wish.secondAgent().stockGramsPerLitre(), 0);
        }
        Double stockC = wish.stockTemperatureC();
        if (stockC != null && !(stockC >= 0 && stockC <= 40)) {
            faults.add("stockTemperatureC", "stockTemperatureC " + stockC + " must be 0 to 40 °C");
        }
        Double ammonia = wish.ammoniaMgL();
        if (ammonia != null && !(ammonia >= 0 && ammonia <= 100)) {
            faults.add("ammoniaMgL", "ammoniaMgL " + ammonia + " must be 0 to 100 mg/L as N");
        }
        double air = reader.number("aerateToUatm", wish.aerateToUatm(), defaults.aerateToUatm());
        if (!(air >= 100 && air <= 5000)) {
            faults.add("aerateToUatm", "aerateToUatm " + air + " must be 100 to 5000 \u00b5atm");
        }
        DoseWaters.Water water = status.isPresent()
                ? waters.of(status.get())
                : wish.water() != null ? calculator.toDose(wish.water(), "water", faults) : null;
        faults.throwIfAny();
        if (water == null || target == null || product == null || bounds == null || receiver == null) {
            throw new IllegalStateException("a fault was not told");
        }
        DoseWish.Agent secondWish = wish.secondAgent();
        DosePlan plan = DosePlanner.plan(DoseRequest.of(water.result(), water.uncertainty(), receiver, target)
                .inputNotes(water.notes())
                .product(product)
                .bounds(bounds)
                .stock(stock(wish.stockGramsPerLitre(), product, stockC, water.result()))
                .companion(
                        second == null || hold == null
                                ? null
                                : new Companion(
                                        second,
                                        stock(
                                                secondWish == null ? null : secondWish.stockGramsPerLitre(),
                                                second,
                                                stockC,
                                                water.result()),
                                        hold))
                .aerationPco2Atm(air * 1e-6)
                .larvae(larvae(wish, status))
                .ammoniaMgL(
                        ammonia != null
                                ? ammonia
                                : status.flatMap(waters::ammoniaMgL).orElse(null))
                .surroundings(status.map(s -> surroundings(site, s)).orElse(null))
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
    private Stock stock(
            @Nullable Double wished, Product product, @Nullable Double temperatureC, @Nullable CarbonateResult water) {
        if (wished != null || !(water instanceof Solved solved)) {
            return new Stock(wished == null ? defaults.stockGramsPerLitre() : wished, temperatureC);
        }
        double most = product.strongestStockGramsPerLitre(
                temperatureC == null ? solved.state().conditions().temperatureC() : temperatureC);
        return new Stock(Math.min(defaults.stockGramsPerLitre(), most), temperatureC);
    }

    /** The other points' waters, as far as a dose could be planned on them. */
    private Surroundings surroundings(Site site, PointStatus here) {
        List<OtherWater> others = new ArrayList<>();
        for (PointStatus other : board.points(site)) {
            if (other.point().id() != here.point().id() && other.point().kind() != PointKind.DISCHARGE) {
                DoseWaters.Water water = waters.of(other);
                if (water.notes().isEmpty() && water.result() instanceof Solved solved) {
                    others.add(new OtherWater(
                            other.point().code(),
                            other.point().name(),
                            kind(other.point()),
                            solved.state(),
                            water.uncertainty()));
                }
            }
        }
        return new Surroundings(kind(here.point()), here.point().feedsFrom(), others);
    }

    private static WaterKind kind(Point point) {
        return switch (point.kind()) {
            case INTAKE -> WaterKind.INTAKE;
            case STORAGE, HEADER -> WaterKind.STORE;
            case LARVAL, DISCHARGE -> WaterKind.TANK;
        };
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
}
