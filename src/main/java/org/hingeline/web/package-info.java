/** The web: one routes class per resource, and the pages. */
@NullMarked
package org.hingeline.web;

import org.jspecify.annotations.NullMarked;
