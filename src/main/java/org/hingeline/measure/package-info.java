/**
 * Quantities, their units and the conversion between them. Ground floor of the core: everything above speaks in the
 * canonical units fixed here, and conversion happens once, at the edge.
 */
@NullMarked
package org.hingeline.measure;

import org.jspecify.annotations.NullMarked;
