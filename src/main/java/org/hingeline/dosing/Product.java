package org.hingeline.dosing;

import java.util.Objects;

/**
 * What is weighed: an agent as its label says it is. The assay is judged by the planner, not here.
 *
 * @param agent the chemical
 * @param form its hydration, read from the label
 * @param assayPercent g of that form in 100 g of what is weighed, 1 to 100
 */
public record Product(Agent agent, Agent.Form form, double assayPercent) {
    /** A stock is to stay clear of saturation by a fifth, or it falls out when it cools. */
    private static final double SOLUBILITY_SHARE = 0.8;

    public Product {
        Objects.requireNonNull(agent, "agent");
        Objects.requireNonNull(form, "form");
        if (!agent.forms().contains(form)) {
            throw new IllegalArgumentException(agent.words() + " has no form \"" + form.code() + "\"");
        }
    }

    /** The pure agent without water of crystallisation. */
    public static Product pure(Agent agent) {
        return new Product(agent, agent.forms().get(0), 100);
    }

    /** mol of the agent in a gram of what is weighed. */
    double molPerGram() {
        return assayPercent / 100 / form.gramsPerMol();
    }

    /**
     * The strongest stock that stays dissolved, g of what is weighed per L: four fifths of saturation, a litre of
     * solution counted as 1 kg, which it never falls below.
     *
     * @param temperatureC of the stock, °C
     */
    public double strongestStockGramsPerLitre(double temperatureC) {
        double in100GWater = agent.solubility().gramsPer100GWater(temperatureC);
        double saturated = 1000 * in100GWater / (100 + in100GWater);
        return SOLUBILITY_SHARE * saturated / agent.anhydrousShare(form);
    }

    /** "sodium carbonate, anhydrous, 99.2 %". */
    String words() {
        return agent.words() + (agent.forms().size() == 1 ? "" : ", " + form.code()) + ", "
                + Words.number(assayPercent, 1) + " %";
    }
}
