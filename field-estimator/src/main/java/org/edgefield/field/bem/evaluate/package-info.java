/** Potential and field around the conductors. */
package org.edgefield.field.bem.evaluate;
