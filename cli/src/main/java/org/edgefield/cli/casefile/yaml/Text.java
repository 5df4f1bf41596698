package org.edgefield.cli.casefile.yaml;

/**
 * A text of the case file and where it stands.
 *
 * @param value the text
 * @param place its first character
 */
public record Text(String value, Place place) {}
