/**
 * The carbonate system of seawater: composition, equilibrium constants (one class per published fit), the solver and
 * its uncertainty.
 *
 * <p>Amounts are in mol per kg of seawater, salinity is practical (PSS-78), temperature is °C (ITS-90) at the public
 * edge and kelvin inside, pH is on the total scale unless a {@link org.hingeline.seawater.PhScale} says otherwise, and
 * the pressure is 1 atm: intake lines and tanks are shallow, so no pressure correction is made.
 *
 * <p>A fit used outside its published range still computes, with a {@link org.hingeline.seawater.Caution} that names
 * the fit and its range. What no fit covers is a typed refusal
 * ({@link org.hingeline.seawater.CarbonateResult.Unsolvable}), never a number.
 */
@NullMarked
package org.hingeline.seawater;

import org.jspecify.annotations.NullMarked;
