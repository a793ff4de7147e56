package org.hingeline.dosing;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import java.util.Optional;
import org.hingeline.seawater.CarbonateResult.Solved;
import org.hingeline.seawater.CarbonateState;
import org.hingeline.seawater.ConstantUncertainty;
import org.hingeline.seawater.InputUncertainty;
import org.hingeline.seawater.Treatment;
import org.hingeline.seawater.Uncertainty;

/**
 * What helps without a chemical: hold the intake, blend, aerate, warm, from the least invasive to the most. Those that
 * reach the target come first, then those that fall short of it, then those that cannot work. A dose, which is more than
 * any of them, is the plan itself.
 */
final class Remedies {
    private final CarbonateState before;
    private final Uncertainty uncertainty;
    private final Target target;

    private Remedies(CarbonateState before, InputUncertainty inputs, Target target) {
        this.before = before;
        this.uncertainty = Uncertainty.ofMeasured(before, inputs, ConstantUncertainty.ORR_2018);
        this.target = target;
    }

    static List<Remedy> of(DoseRequest request, CarbonateState before) {
        Remedies all = new Remedies(before, request.uncertainty(), request.target());
        List<Remedy> remedies = new ArrayList<>();
        Surroundings around = request.surroundings();
        if (around != null) {
            SourceRemedies sources = new SourceRemedies(request, around, before, all.uncertainty);
            remedies.add(sources.hold());
            remedies.add(sources.blend());
        }
        remedies.add(all.aerate(request.aerationPco2Atm()));
        if (around != null && around.kind() != WaterKind.TANK) {
            remedies.add(all.warm(around));
        }
        remedies.sort(Comparator.comparing((Remedy r) -> !r.reachesTarget()).thenComparing(r -> r.reaches() == null));
        return remedies;
    }

    private Remedy aerate(double pco2Atm) {
        String air = Words.number(pco2Atm * 1e6, 0) + " µatm";
        String needs = "Air at " + air + " of CO2, and time until pH no longer moves.";
        if (!(before.pco2Atm() > pco2Atm)) {
            return Remedy.cannot(
                    "aerate",
                    needs,
                    "Aeration cannot help: the water is at " + Words.number(before.pco2Atm() * 1e6, 0)
                            + " µatm, and air of " + air + " would bring CO2 in.");
        }
        return Treatment.equilibrated(before, pco2Atm) instanceof Solved aerated
                ? to(
                        "aerate",
                        "Aeration to " + air + " alone brings the water from " + Words.water(before) + " to",
                        needs,
                        aerated.state())
                : Remedy.cannot("aerate", needs, "Aeration to " + air + " leads to no water that can be solved.");
    }

    /** What comes in will be warmer, and so better, in the tank: how much of the want that makes good. */
    private Remedy warm(Surroundings around) {
        String needs = "The temperature of the tank it goes to.";
        Optional<OtherWater> tank = around.others().stream()
                .filter(o -> o.kind() == WaterKind.TANK)
                .max(Comparator.comparingDouble(o -> o.state().conditions().temperatureC()));
        if (tank.isEmpty()) {
            return Remedy.cannot("warm", needs, "Warming cannot be foretold: no tank's water is known at present.");
        }
        double temperatureC = tank.get().state().conditions().temperatureC();
        String there = Words.number(temperatureC, 1) + " °C of " + tank.get().name();
        if (temperatureC <= before.conditions().temperatureC()) {
            return Remedy.cannot("warm", needs, "Warming does not apply: at the " + there + " it would not be warmer.");
        }
        return Treatment.atTemperature(before, temperatureC) instanceof Solved warmed
                ? to(
                        "warm",
                        "Warmed to the " + there + ", closed to the air, the water goes from " + Words.water(before)
                                + " to",
                        "Heat, and a way for the gas that warming drives out.",
                        warmed.state())
                : Remedy.cannot("warm", needs, "Warming to the " + there + " leads to no water that can be solved.");
    }

    private Remedy to(String code, String doing, String needs, CarbonateState reaches) {
        return Remedy.to(
                code,
                doing,
                needs,
                null,
                null,
                reaches,
                uncertainty.carriedTo(reaches).ofState(),
                target);
    }
}
