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
 * @param calciumPerMol mol of calcium per mol
 * @param heatReleasedKjPerMol heat that dissolving releases, kJ per mol, where it is worth a caution; 0 elsewhere
 * @param solubility in water
 * @param hazards GHS hazard statements
 */
public record Agent(
        String code,
        String words,
        List<Form> forms,
        double alkalinityPerMol,
        double dicPerMol,
        double calciumPerMol,
        double heatReleasedKjPerMol,
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
            0,
            0,
            new SolubilityTable(
                    List.of(new Row(0, 7), new Row(10, 12.2), new Row(20, 21.8), new Row(25, 29.4), new Row(30, 39.7))),
            List.of(new Hazard("H319", "Causes serious eye irritation.")));

    /** Baking soda; solubility from common safety data sheets, which class it as no hazard. */
    public static final Agent SODIUM_BICARBONATE = new Agent(
            "sodium-bicarbonate",
            "sodium bicarbonate",
            List.of(new Form("anhydrous", 84.01)),
            1,
            1,
            0,
            0,
            new SolubilityTable(List.of(new Row(0, 6.9), new Row(15, 8.85), new Row(20, 9.6), new Row(30, 11.1))),
            List.of());

    /**
     * Caustic soda; hazards from common safety data sheets, solubility (0 °C from memory) and heat of solution (44.5
     * kJ/mol, from memory) from common handbooks.
     */
    public static final Agent SODIUM_HYDROXIDE = new Agent(
            "sodium-hydroxide",
            "sodium hydroxide",
            List.of(new Form("anhydrous", 40.00), new Form("monohydrate", 58.01)),
            1,
            0,
            0,
            44.5,
            new SolubilityTable(List.of(new Row(0, 42), new Row(20, 109))),
            List.of(
                    new Hazard("H290", "May be corrosive to metals."),
                    new Hazard("H314", "Causes severe skin burns and eye damage.")));

    /**
     * Hydrated lime, whose solubility falls as it warms (above 20 °C from memory); hazards from common safety data sheets.
     */
    public static final Agent CALCIUM_HYDROXIDE = new Agent(
            "calcium-hydroxide",
            "calcium hydroxide",
            List.of(new Form("anhydrous", 74.09)),
            2,
            0,
            1,
            0,
            new SolubilityTable(List.of(new Row(0, 0.185), new Row(20, 0.165), new Row(30, 0.153), new Row(40, 0.141))),
            List.of(
                    new Hazard("H315", "Causes skin irritation."),
                    new Hazard("H318", "Causes serious eye damage."),
                    new Hazard("H335", "May cause respiratory irritation.")));

    private static final List<Agent> ALL =
            List.of(SODIUM_CARBONATE, SODIUM_BICARBONATE, SODIUM_HYDROXIDE, CALCIUM_HYDROXIDE);

    public Agent {
        forms = List.copyOf(forms);
        hazards = List.copyOf(hazards);
        if (forms.isEmpty() || !(alkalinityPerMol > 0) || !(dicPerMol >= 0) || !(calciumPerMol >= 0)) {
            throw new IllegalArgumentException("agent " + code + " needs a form, alkalinity above 0, carbon and calcium"
                    + " of at least 0, got " + forms + ", " + alkalinityPerMol + ", " + dicPerMol + ", "
                    + calciumPerMol);
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

    /** Whether it is labelled with the corrosion sign (GHS05): H290, H314 or H318. */
    public boolean corrosive() {
        return hazards.stream().anyMatch(Hazard::corrosive);
    }

    /** The anhydrous substance in one gram of a form, g. */
    double anhydrousShare(Form form) {
        return forms.get(0).gramsPerMol / form.gramsPerMol;
    }
}
