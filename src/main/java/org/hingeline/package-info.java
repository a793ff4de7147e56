/** The composition root and its commands: the only package that sees all others. */
@NullMarked
package org.hingeline;

import org.jspecify.annotations.NullMarked;
