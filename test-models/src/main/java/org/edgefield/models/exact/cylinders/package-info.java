/** Pairs of long cylinders. */
package org.edgefield.models.exact.cylinders;
