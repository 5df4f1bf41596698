/** Conductors in a uniform ambient field. */
package org.edgefield.models.exact.ambient;
