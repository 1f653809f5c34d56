/**
 * What a file may be. The limits are far above any recorder's export and there to stop a file made
 * to exhaust the machine; every one of them is named in the error it causes.
 */

/** Longest line, bytes: 256 cells of 64 characters. */
export const maxLineBytes = 16 * 1024;

/** Comment lines, blank lines and the header row together, bytes. */
export const maxPreambleBytes = 32 * 1024;

/** The separator and the decimal mark are decided on this many bytes, or the whole of a shorter file. */
export const headBytes = 64 * 1024;

export const maxColumns = 256;

/** Rows of samples; a caller may ask for fewer. */
export const maxRows = 16_777_216;

/** Samples of all channels together (256 MiB as 64-bit numbers). */
export const maxSamples = 33_554_432;

/** Fewer samples than this are no waveform but a fragment. */
export const minSamples = 8;

/**
 * Largest magnitude of a sample. Accelerations in g, displacements in µm and raw counts of a 32-bit
 * converter stay below 1e10; 1e308 is finite and yet no measurement, and its square is infinite.
 */
export const maxSampleMagnitude = 1e12;

/** Largest magnitude of a time as written: nanoseconds since 1970 are 2e18. */
export const maxTimeMagnitude = 1e19;

/** Largest told sampling rate, Hz. */
export const maxSampleRateHz = 1e8;

/** Largest told speed, r/min: above any machine with rolling bearings. */
export const maxSpeedRpm = 1e6;
