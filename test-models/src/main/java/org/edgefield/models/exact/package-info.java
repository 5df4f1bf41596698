/** Exact solutions of electrostatic problems, one class each, with equation, range and source. */
package org.edgefield.models.exact;
