package org.hingeline.dosing;

import java.util.List;
import org.hingeline.seawater.CarbonateState;

/**
 * A body of water and what one product, or two in a fixed proportion, make of it, closed to the air: alkalinity, inorganic
 * carbon and calcium add up, all else follows. The water of the stock solution is not counted.
 */
final class DosedWater {
    private final CarbonateState before;
    private final List<Product> products;
    private final double[] molPerAlkalinity;
    private final double kilograms;
    private final double aerationPco2Atm;

    /** With the first product alone. */
    DosedWater(CarbonateState before, DoseRequest request) {
        this(before, request, List.of(request.product()), Mix.OF_FIRST);
    }

    DosedWater(CarbonateState before, DoseRequest request, List<Product> products, Mix mix) {
        this.before = before;
        this.products = List.copyOf(products);
        this.kilograms = request.receiver().litresDosed() / 1000 * before.densityKgM3();
        this.aerationPco2Atm = request.aerationPco2Atm();
        this.molPerAlkalinity = new double[products.size()];
        double alkalinity = 0;
        for (int i = 0; i < molPerAlkalinity.length; i++) {
            alkalinity += mix.of(i) * products.get(i).agent().alkalinityPerMol();
        }
        for (int i = 0; i < molPerAlkalinity.length; i++) {
            molPerAlkalinity[i] = mix.of(i) / alkalinity;
        }
    }

    CarbonateState before() {
        return before;
    }

    List<Product> products() {
        return products;
    }

    /** The mass in g of a product when all add that much alkalinity, mol/kg-seawater. */
    double massOf(int product, double alkalinity) {
        return alkalinity
                * molPerAlkalinity[product]
                * kilograms
                / products.get(product).molPerGram();
    }

    /** The water with that much alkalinity added, mol/kg-seawater. */
    CarbonateState with(double alkalinity) {
        return closed(mols(alkalinity));
    }

    /** The water with that much alkalinity added, then aerated. */
    CarbonateState aeratedWith(double alkalinity) {
        return aerated(mols(alkalinity));
    }

    /** The water with a mass of each product, g. */
    CarbonateState withMasses(double... grams) {
        return closed(molsOf(grams));
    }

    /** The water with a mass of each product, g, then aerated. */
    CarbonateState aeratedWithMasses(double... grams) {
        return aerated(molsOf(grams));
    }

    private double[] mols(double alkalinity) {
        double[] mols = molPerAlkalinity.clone();
        for (int i = 0; i < mols.length; i++) {
            mols[i] *= alkalinity;
        }
        return mols;
    }

    private double[] molsOf(double... grams) {
        double[] mols = grams.clone();
        for (int i = 0; i < mols.length; i++) {
            mols[i] *= products.get(i).molPerGram() / kilograms;
        }
        return mols;
    }

    private CarbonateState closed(double[] mols) {
        return added(mols).to(before).orElseThrow();
    }

    private CarbonateState aerated(double[] mols) {
        return added(mols).toAerated(before, aerationPco2Atm).orElseThrow();
    }

    private AddedMatter added(double[] mols) {
        AddedMatter all = AddedMatter.NOTHING;
        for (int i = 0; i < mols.length; i++) {
            all = all.and(AddedMatter.of(products.get(i).agent(), mols[i]));
        }
        return all;
    }
}
