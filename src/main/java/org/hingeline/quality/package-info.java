/** Quality of readings: the flags of the QARTOD manuals and, one small class per check, the tests that give them. */
@NullMarked
package org.hingeline.quality;

import org.jspecify.annotations.NullMarked;
