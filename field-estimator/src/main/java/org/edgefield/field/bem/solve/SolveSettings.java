package org.edgefield.field.bem.solve;

/**
 * What a solve may cost and must reach.
 *
 * @param accuracy relative accuracy of the peak fields, 0.01 = 1 %
 * @param time_s wall time to spend, seconds
 * @param memory_bytes memory to spend
 * @param threads threads to use
 */
public record SolveSettings(double accuracy, double time_s, long memory_bytes, int threads) {}
