package org.hingeline.dosing;

import java.util.List;
import java.util.Objects;
import org.hingeline.seawater.CarbonateResult;
import org.hingeline.seawater.InputUncertainty;
import org.jspecify.annotations.Nullable;

/**
 * A question to {@link DosePlanner}. Numbers are not judged here: what the planner cannot stand on, it refuses with a
 * reason.
 *
 * @param water the water as solved from its inputs; null when inputs are missing altogether
 * @param uncertainty standard uncertainties of the inputs
 * @param inputNotes what is wrong with the inputs; empty when nothing is
 * @param receiver what receives the dose
 * @param target what it is to reach
 * @param agent the chemical
 * @param form its hydration, read from the label
 * @param assayPercent g of that form in 100 g of what is weighed, 1 to 100
 * @param bounds what the plan may not cross
 * @param stockGramsPerLitre strength of the stock solution, g of what is weighed per L; null when none is given
 * @param aerationPco2Atm what aeration reaches, atm
 */
public record DoseRequest(
        @Nullable CarbonateResult water,
        InputUncertainty uncertainty,
        List<InputNote> inputNotes,
        Receiver receiver,
        Target target,
        Agent agent,
        Agent.Form form,
        double assayPercent,
        Bounds bounds,
        @Nullable Double stockGramsPerLitre,
        double aerationPco2Atm) {
    /** 420 µatm, today's air. */
    public static final double AIR_PCO2_ATM = 420e-6;

    public DoseRequest {
        Objects.requireNonNull(uncertainty, "uncertainty");
        inputNotes = List.copyOf(inputNotes);
        Objects.requireNonNull(receiver, "receiver");
        Objects.requireNonNull(target, "target");
        Objects.requireNonNull(agent, "agent");
        Objects.requireNonNull(form, "form");
        Objects.requireNonNull(bounds, "bounds");
        if (!agent.forms().contains(form)) {
            throw new IllegalArgumentException(agent.words() + " has no form \"" + form.code() + "\"");
        }
    }

    /** Sound inputs, pure anhydrous sodium carbonate, default bounds, no stock given, aeration to today's air. */
    public static DoseRequest ofSodiumCarbonate(
            CarbonateResult water, InputUncertainty uncertainty, double volumeL, Target target) {
        Agent agent = Agent.SODIUM_CARBONATE;
        return new DoseRequest(
                water,
                uncertainty,
                List.of(),
                new Receiver.Tank(volumeL),
                target,
                agent,
                agent.forms().get(0),
                100,
                Bounds.DEFAULTS,
                null,
                AIR_PCO2_ATM);
    }
}
