/**
 * What can be done about a water: the remedies that need no chemical first, then the suggestion of a dose, with its
 * bounds, steps and cautions. A plan is a suggestion; a person confirms it.
 */
@NullMarked
package org.hingeline.dosing;

import org.jspecify.annotations.NullMarked;
