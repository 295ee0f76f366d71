/** Distances take the peer so long that one sample in twenty is timed, and the time scaled up. */
export const STRIDE = 20;
