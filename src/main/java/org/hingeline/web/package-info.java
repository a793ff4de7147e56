/** Over HTTP: one routes class per resource, for programs under {@code /api/v1} and for people as pages. */
@NullMarked
package org.hingeline.web;

import org.jspecify.annotations.NullMarked;
