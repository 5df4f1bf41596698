/** Validation cases as data: which model, at what voltages, what is exact, how near to come. */
package org.edgefield.models.cases;
