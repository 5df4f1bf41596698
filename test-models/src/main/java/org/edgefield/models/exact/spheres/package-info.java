/** Pairs of spheres. */
package org.edgefield.models.exact.spheres;
