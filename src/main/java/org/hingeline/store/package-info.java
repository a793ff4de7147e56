/**
 * The database: Jdbi over H2 (embedded) or PostgreSQL, the same SQL on both. H2 is written through one serialised lane,
 * see {@link org.hingeline.store.WriteLane}.
 */
@NullMarked
package org.hingeline.store;

import org.jspecify.annotations.NullMarked;
