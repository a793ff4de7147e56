/**
 * Settings: read from YAML once at the start, checked as a whole, then frozen. Nothing else in the program reads the
 * file, and nobody but the composition root sees this package.
 */
@NullMarked
package org.hingeline.config;

import org.jspecify.annotations.NullMarked;
