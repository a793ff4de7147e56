/** Pages looked at as a person sees them, in a real browser. */
@NullMarked
package org.hingeline.browser;

import org.jspecify.annotations.NullMarked;
