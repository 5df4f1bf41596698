/** Field on edges that a drawing shows sharp and the shop makes with a radius. */
package org.edgefield.field.edge;
