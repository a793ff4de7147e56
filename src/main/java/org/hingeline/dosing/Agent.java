package org.hingeline.dosing;

import java.util.List;
import java.util.Optional;
import org.hingeline.dosing.SolubilityTable.Row;

/**
 * A dosing chemical.
 *
 * @param code the name on the wire
 * @param words the name in a sentence
 * @param forms what it is sold as; the first is the anhydrous substance that the solubility counts in
 * @param alkalinityPerMol mol of total alkalinity per mol
 * @param dicPerMol mol of inorganic carbon per mol
 * @param solubility in water
 * @param hazards GHS hazard statements
 */
public record Agent(
        String code,
        String words,
        List<Form> forms,
        double alkalinityPerMol,
        double dicPerMol,
        SolubilityTable solubility,
        List<Hazard> hazards) {
    /**
     * A hydration of the agent.
     *
     * @param code the name on the wire
     * @param gramsPerMol molar mass with its water of crystallisation
     */
    public record Form(String code, double gramsPerMol) {
        public Form {
            if (!(gramsPerMol > 0)) {
                throw new IllegalArgumentException(
                        "the molar mass of " + code + " must be above 0, got " + gramsPerMol);
            }
        }
    }

    /** Soda ash; solubility and hazard from common safety data sheets. */
    public static final Agent SODIUM_CARBONATE = new Agent(
            "sodium-carbonate",
            "sodium carbonate",
            List.of(new Form("anhydrous", 105.99), new Form("monohydrate", 124.00), new Form("decahydrate", 286.14)),
            2,
            1,
            new SolubilityTable(
                    List.of(new Row(0, 7), new Row(10, 12.2), new Row(20, 21.8), new Row(25, 29.4), new Row(30, 39.7))),
            List.of(new Hazard("H319", "Causes serious eye irritation.")));

    private static final List<Agent> ALL = List.of(SODIUM_CARBONATE);

    public Agent {
        forms = List.copyOf(forms);
        hazards = List.copyOf(hazards);
        if (forms.isEmpty() || !(alkalinityPerMol > 0) || !(dicPerMol >= 0)) {
            throw new IllegalArgumentException("agent " + code + " needs a form, alkalinity above 0 and carbon of at"
                    + " least 0, got " + forms + ", " + alkalinityPerMol + ", " + dicPerMol);
        }
    }

    /** All agents that a plan can be asked for. */
    public static List<Agent> all() {
        return ALL;
    }

    /** The agent of that code, if there is one. */
    public static Optional<Agent> ofCode(String code) {
        return ALL.stream().filter(a -> a.code.equals(code)).findFirst();
    }

    /** The form of that code, if it is sold so. */
    public Optional<Form> form(String formCode) {
        return forms.stream().filter(f -> f.code.equals(formCode)).findFirst();
    }

    /** The anhydrous substance in one gram of a form, g. */
    double anhydrousShare(Form form) {
        return forms.get(0).gramsPerMol / form.gramsPerMol;
    }
}
