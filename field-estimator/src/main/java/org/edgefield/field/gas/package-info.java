/** What the gas withstands. */
package org.edgefield.field.gas;
