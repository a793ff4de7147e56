/**
 * What the pages show: records of plain words, ready to print. Nothing here reads a database or a clock; whoever fills a view
 * passes the moment it is made at.
 */
@NullMarked
package org.hingeline.web.view;

import org.jspecify.annotations.NullMarked;
