/** Electrodes over an earthed plane. */
package org.edgefield.models.exact.plane;
