/**
 * The field at edges drawn sharp: how strongly the solved potential bends around them, and what
 * peak that gives at the radius as made.
 */
package org.edgefield.field.bem.edge;
