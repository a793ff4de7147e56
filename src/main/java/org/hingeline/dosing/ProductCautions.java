package org.hingeline.dosing;

import java.util.ArrayList;
import java.util.List;
import org.hingeline.seawater.Caution;
import org.jspecify.annotations.Nullable;

/** How to handle a product: its hazards, what to wear, how to dissolve it. */
final class ProductCautions {
    private static final double KJ_PER_LITRE_AND_K = 4.18;
    private static final double USUAL_STOCK_GRAMS_PER_LITRE = 50;

    private final Agent agent;
    private final List<Caution> cautions = new ArrayList<>();

    private ProductCautions(Agent agent) {
        this.agent = agent;
    }

    static List<Caution> of(Product product, @Nullable Stock stock) {
        ProductCautions all = new ProductCautions(product.agent());
        all.handling();
        all.dissolving(product, stock == null ? USUAL_STOCK_GRAMS_PER_LITRE : stock.gramsPerLitre());
        return all.cautions;
    }

    private void handling() {
        for (Hazard hazard : agent.hazards()) {
            add("hazard-" + hazard.code(), agent.words() + ", " + hazard.code() + ": " + hazard.words());
        }
        if (agent.corrosive()) {
            add(
                    "protection",
                    "Wear sealed goggles and a face shield, gloves that resist alkali, an apron and closed shoes, and"
                            + " against dust a mask; have running water for eyes and skin at hand, and do not work"
                            + " alone.");
            add(
                    "corrosive",
                    agent.words() + " is labelled corrosive: never into water with larvae in it, away from metal"
                            + " (aluminium, zinc) and acids, and only by people trained for it.");
            add(
                    "permit",
                    "The site's discharge permit may have to list " + agent.words() + ": ask before its first use.");
        } else {
            add("protection", "Wear goggles and gloves.");
        }
        add(
                "safety-data-sheet",
                "Read the safety data sheet of the product and follow local rules for storing and handling it; where"
                        + " they differ from this plan, or treating the water needs a licensed person, they go first.");
    }

    private void dissolving(Product product, double gramsPerLitre) {
        add(
                "product",
                "Check " + (agent.forms().size() == 1 ? "name" : "hydrate")
                        + " and assay on the label: this plan is for " + product.words() + "." + confusion());
        add("dissolve-first", "Dissolve it completely first; never add dry powder to the tank by hand.");
        if (agent.heatReleasedKjPerMol() > 0) {
            double riseK = gramsPerLitre * product.molPerGram() * agent.heatReleasedKjPerMol() / KJ_PER_LITRE_AND_K;
            add(
                    "heat-of-solution",
                    "Dissolving heats the stock, by about " + Words.number(riseK, 0) + " °C at "
                            + Words.number(gramsPerLitre, 0)
                            + " g/L, and it can boil and spit: cold water first, then the " + agent.words()
                            + " in small portions while stirring, never water onto it. Let it cool before use.");
        }
        if (agent.calciumPerMol() > 0) {
            add(
                    "lime-settles",
                    "Lime hardly dissolves, and less when warm. Let the stock settle and add only the clear liquid:"
                            + " its particles start precipitation in sea water. Keep it covered, air turns it to chalk.");
        }
    }

    private String confusion() {
        if (agent.equals(Agent.SODIUM_CARBONATE)) {
            return " Decahydrate taken for anhydrous under-doses 2.7 times.";
        }
        if (agent.equals(Agent.SODIUM_BICARBONATE)) {
            return " Baking soda is not washing soda, and baking powder is neither.";
        }
        return agent.equals(Agent.CALCIUM_HYDROXIDE)
                ? " Hydrated lime is not quicklime (calcium oxide), which burns with water, nor limestone."
                : " Drain cleaner is not pure and must not be used.";
    }

    private void add(String code, String detail) {
        cautions.add(new Caution(code, detail));
    }
}
