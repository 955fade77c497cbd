/** CODATA 2018, exact in the 2019 SI (checks.csv const-F). */
export const FARADAY = 96485.33212; // C/mol
export const GAS_CONSTANT = 8.31446261815324; // J/(mol K)
export const LN10 = Math.LN10;
/** Reference temperature of the tables. */
export const T_REFERENCE = 298.15; // K
