package org.edgefield.cli.gltf;

import java.time.LocalDate;

/**
 * What a heatmap says of its own making.
 *
 * @param toolVersion version of edgefield
 * @param date day of the computation
 */
public record HeatmapStamp(String toolVersion, LocalDate date) {}
