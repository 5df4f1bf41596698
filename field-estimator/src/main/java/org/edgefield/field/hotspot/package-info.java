/** Regions of high utilisation, their cause and their cure. */
package org.edgefield.field.hotspot;
