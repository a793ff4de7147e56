/**
 * The invented hatchery's water and the gateway that reports it: a seeded bay, tanks fed from it, instruments with
 * their noise, and a client that posts what they read over HTTP as any gateway would. Sees the core alone; to the
 * service it is a stranger with a key.
 */
@NullMarked
package org.hingeline.demo;

import org.jspecify.annotations.NullMarked;
