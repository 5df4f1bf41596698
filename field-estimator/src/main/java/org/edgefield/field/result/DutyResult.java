package org.edgefield.field.result;

import java.util.List;

/**
 * Outcome of one duty.
 *
 * @param field node values
 * @param peak region of highest utilisation, present even where all is calm
 * @param hotSpots ranked regions above the amber limit
 */
public record DutyResult(DutyField field, HotSpot peak, List<HotSpot> hotSpots) {}
