/** Bodies alone in space, earth at infinity. */
package org.edgefield.models.exact.isolated;
