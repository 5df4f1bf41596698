/** Discharge inception along field lines that are traced in a solved field. */
package org.edgefield.field.bem.inception;
