/** Quick estimate of the field from curvatures, gaps and body sizes. */
package org.edgefield.field.estimate;
