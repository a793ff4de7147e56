package org.hingeline.dosing;

/**
 * How to make up the stock of a dose.
 *
 * @param gramsPerLitre strength, g of what is weighed per L
 * @param temperatureC the temperature that its solubility is taken at, °C
 * @param strongestGramsPerLitre the strongest that stays dissolved there
 * @param litres how much of it the dose takes, L; of a steady injection, in a day
 */
public record StockRecipe(double gramsPerLitre, double temperatureC, double strongestGramsPerLitre, double litres) {}
