/** The records of the place: sites, points, sensors and batches. */
@NullMarked
package org.hingeline.hatchery;

import org.jspecify.annotations.NullMarked;
