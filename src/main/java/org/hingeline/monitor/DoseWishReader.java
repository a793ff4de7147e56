package org.hingeline.monitor;

import org.hingeline.dosing.Agent;
import org.hingeline.dosing.Bounds;
import org.hingeline.dosing.Hold;
import org.hingeline.dosing.Product;
import org.hingeline.dosing.Receiver;
import org.hingeline.dosing.Target;
import org.jspecify.annotations.Nullable;

/** Reads the parts of a {@link DoseWish} that stand for themselves; null where a fault was told. */
final class DoseWishReader {
    private final FieldFaults faults;

    DoseWishReader(FieldFaults faults) {
        this.faults = faults;
    }

    /** A tank, a flow, or a tank with a flow through it. */
    @Nullable
    Receiver receiver(@Nullable Double volumeL, @Nullable Double flowLMin) {
        boolean finite = finite("volumeL", volumeL, "in litres") & finite("flowLMin", flowLMin, "in litres per minute");
        if (!finite) {
            return null;
        }
        if (volumeL != null) {
            return flowLMin == null ? new Receiver.Tank(volumeL) : new Receiver.FlowThrough(volumeL, flowLMin);
        }
        if (flowLMin != null) {
            return new Receiver.Flow(flowLMin);
        }
        faults.add(
                "volumeL",
                "volumeL is missing: the point has no volume set, so the request must say it, in litres; flowLMin alone"
                        + " plans a steady injection");
        return null;
    }

    private boolean finite(String field, @Nullable Double value, String unit) {
        boolean finite = value == null || Double.isFinite(value);
        if (!finite) {
            faults.add(field, field + " " + value + " must be a finite number, " + unit);
        }
        return finite;
    }

    @Nullable
    Target target(DoseWish.@Nullable Target wish) {
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
            return within("target/omegaAragonite", omega, 0, 10) ? new Target.OmegaAragonite(omega) : null;
        }
        if (ph != null) {
            return within("target/phTotal", ph, 6, 9.5) ? new Target.PhTotal(ph) : null;
        }
        return alkalinity != null && within("target/totalAlkalinityUmolKg", alkalinity, 0, 6000)
                ? new Target.TotalAlkalinity(alkalinity * 1e-6)
                : null;
    }

    private boolean within(String field, double value, double above, double most) {
        boolean good = value > above && value <= most;
        if (!good) {
            faults.add(field, field + " " + value + " must be above " + above + " and at most " + most);
        }
        return good;
    }

    /** What is weighed; the agent that is meant where none is named. */
    @Nullable
    Product product(String field, DoseWish.@Nullable Agent wish, Agent otherwise) {
        String code = wish == null ? null : wish.code();
        Agent agent = code == null ? otherwise : Agent.ofCode(code).orElse(null);
        double assay = number(field + "/assayPercent", wish == null ? null : wish.assayPercent(), 100);
        if (agent == null) {
            faults.add(
                    field + "/code",
                    "agent \"" + code + "\" cannot be planned; accepted: "
                            + String.join(
                                    ", ", Agent.all().stream().map(Agent::code).toList()));
            return null;
        }
        Agent.Form form = form(field, wish == null ? null : wish.hydration(), agent);
        return form == null ? null : new Product(agent, form, assay);
    }

    private Agent.@Nullable Form form(String field, @Nullable String hydration, Agent agent) {
        if (hydration == null && agent.forms().size() == 1) {
            return agent.forms().get(0);
        }
        String accepted =
                String.join(", ", agent.forms().stream().map(Agent.Form::code).toList());
        if (hydration == null) {
            faults.add(
                    field + "/hydration",
                    "hydration is missing: "
                            + (agent.equals(Agent.SODIUM_CARBONATE)
                                    ? "decahydrate taken for anhydrous gives 2.7 times too little. "
                                    : "")
                            + "Read the label; accepted: " + accepted);
            return null;
        }
        Agent.Form form = agent.form(hydration).orElse(null);
        if (form == null) {
            faults.add(field + "/hydration", "hydration \"" + hydration + "\" is not known; accepted: " + accepted);
        }
        return form;
    }

    /** What two agents hold; null as well when none is asked for. */
    @Nullable
    Hold hold(DoseWish.@Nullable Hold wish) {
        if (wish == null) {
            return null;
        }
        Double ph = wish.phTotalMax();
        Double pco2 = wish.pco2Uatm();
        if ((ph == null) == (pco2 == null)) {
            faults.add("hold", "hold needs exactly one of phTotalMax, pco2Uatm; it has " + (ph == null ? 0 : 2));
            return null;
        }
        if (ph != null) {
            return within("hold/phTotalMax", ph, 6, 9) ? new Hold.PhAtMost(ph) : null;
        }
        return pco2 != null && within("hold/pco2Uatm", pco2, 99.9, 10_000) ? new Hold.Pco2(pco2 * 1e-6) : null;
    }

    double number(String field, @Nullable Double value, double otherwise) {
        if (value != null && !Double.isFinite(value)) {
            faults.add(field, field + " " + value + " must be a finite number");
        }
        return value == null ? otherwise : value;
    }

    @Nullable
    Bounds bounds(DoseWish.@Nullable Bounds wish, DoseDesk.Defaults defaults) {
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
