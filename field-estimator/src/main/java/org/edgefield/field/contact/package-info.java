/** Bodies inside or against each other. */
package org.edgefield.field.contact;
