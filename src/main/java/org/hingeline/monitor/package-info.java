/**
 * The use cases: take in readings, assess the water, raise alerts, plan doses, look after the place and its people; and
 * the interfaces they need from the outside.
 */
@NullMarked
package org.hingeline.monitor;

import org.jspecify.annotations.NullMarked;
